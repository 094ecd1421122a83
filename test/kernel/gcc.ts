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

/** A C program compiled as plainly as anybody would, and ready to run. */
export interface Compiled {
  /** @returns what it prints */
  run(): string;
  remove(): void;
}

export function compileC(source: string, flags: readonly string[] = []): Compiled {
  const folder = mkdtempSync(join(tmpdir(), "twin-"));
  const file = join(folder, "twin.c");
  const program = join(folder, "twin");
  writeFileSync(file, source);
  execFileSync("gcc", ["-O2", "-ffp-contract=off", ...flags, "-o", program, file, "-lm"]);
  return {
    run: () => execFileSync(program, { encoding: "utf8", maxBuffer: 1 << 26 }),
    remove: () => rmSync(folder, { recursive: true, force: true }),
  };
}

/** Compiles a C program, runs it once, and gives what it prints. */
export function runC(source: string, flags: readonly string[] = []): string {
  const program = compileC(source, flags);
  try {
    return program.run();
  } finally {
    program.remove();
  }
}
