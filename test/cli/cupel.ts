import { type ChildProcess, spawn } from "node:child_process";
import { mkdtempSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { afterAll } from "vitest";

/** The built program, as a shell runs it. */
export const MAIN = resolve("dist/cli/main.js");
export const CLAIMS = resolve("fixtures/claims");

export interface Ended {
  readonly code: number | null;
  readonly signal: NodeJS.Signals | null;
  readonly stdout: string;
  readonly stderr: string;
}

interface Call {
  readonly cwd?: string;
  readonly env?: Readonly<Record<string, string>>;
  /** What to do with it while it runs. */
  readonly meanwhile?: (child: ChildProcess) => void;
}

/** Runs the program and waits for its end. */
export function cupel(args: readonly string[], { cwd, env, meanwhile }: Call = {}): Promise<Ended> {
  return ended(
    spawn(process.execPath, [MAIN, ...args], { cwd, env: { ...process.env, NO_COLOR: "1", ...env } }),
    meanwhile,
  );
}

/** Runs a line of shell in which $CUPEL is the program. */
export function shell(line: string, { cwd, env, meanwhile }: Call = {}): Promise<Ended> {
  const CUPEL = `${process.execPath} ${MAIN}`;
  return ended(
    spawn("bash", ["-c", line], { cwd, env: { ...process.env, NO_COLOR: "1", CUPEL, ...env } }),
    meanwhile,
  );
}

function ended(child: ChildProcess, meanwhile?: (child: ChildProcess) => void): Promise<Ended> {
  let stdout = "";
  let stderr = "";
  child.stdout!.setEncoding("utf8").on("data", (text: string) => {
    stdout += text;
  });
  child.stderr!.setEncoding("utf8").on("data", (text: string) => {
    stderr += text;
  });
  meanwhile?.(child);
  return new Promise((done, fail) => {
    child.on("error", fail);
    child.on("close", (code, signal) => done({ code, signal, stdout, stderr }));
  });
}

/** A folder of its own for a test file, gone at the end. */
export function workshop(): {
  readonly path: string;
  write(name: string, text: string | Uint8Array): string;
} {
  const path = mkdtempSync(join(tmpdir(), "cupel-test-"));
  afterAll(() => rmSync(path, { recursive: true, force: true }));
  return {
    path,
    write(name, text) {
      const file = join(path, name);
      writeFileSync(file, text);
      return file;
    },
  };
}

/** Every file under a folder, hidden ones too. */
export const filesIn = (folder: string): string[] =>
  (readdirSync(folder, { recursive: true }) as string[]).sort();

interface Parts {
  readonly title?: string;
  readonly value?: string;
  readonly parameters?: string;
  readonly start?: string;
  readonly span?: string;
  readonly solution?: string;
  readonly more?: string;
}

/** A claim on a light orbit of an invented system, quick to audit, with parts exchanged. */
export function claim(parts: Parts = {}): string {
  return `cupel: claim/1
title: ${parts.title ?? "Invented test orbit"}
claimed:
  quantity: apsidal-advance
  value: ${parts.value ?? "0.0(1) arcsec/orbit"}
scenario:
  equations: newtonian
  parameters: { GM: ${parts.parameters ?? "1.1e20 m^3/s^2"} }
  start: ${parts.start ?? "{ periapsis: 0.21 au, apoapsis: 0.34 au }"}
  span: ${parts.span ?? "5 orbits"}
solution: ${parts.solution ?? "{ method: dormand-prince-8, steps-per-orbit: 128 }"}
${parts.more ?? ""}`;
}
