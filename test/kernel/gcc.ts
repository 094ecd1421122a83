import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

/** Whether a C compiler is there. */
export function hasGcc(): boolean {
  try {
    execFileSync("gcc", ["--version"], { stdio: "ignore" });
    return true;
  } catch {
    return false;
  }
}

/** Compiles a C program as plainly as anybody would, runs it, and gives what it prints. */
export function runC(source: string, args: readonly string[] = []): string {
  const folder = mkdtempSync(join(tmpdir(), "twin-"));
  try {
    const file = join(folder, "twin.c");
    const program = join(folder, "twin");
    writeFileSync(file, source);
    execFileSync("gcc", ["-O2", "-ffp-contract=off", "-o", program, file, "-lm"]);
    return execFileSync(program, [...args], { encoding: "utf8", maxBuffer: 1 << 26 });
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
