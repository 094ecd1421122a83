import { stat } from "node:fs/promises";
import { resolve } from "node:path";
import { echo } from "../claim/problem.js";
import { CallError } from "./call-error.js";

/**
 * Claim files named by paths and globs, each once, in the order given; a glob's own matches in the order of
 * their names. What exists under its literal name is never taken for a glob.
 *
 * @throws CallError that names everything wrong with the call, a line each
 */
export async function claimFiles(given: readonly string[]): Promise<string[]> {
  const files = new Map<string, string>();
  const wrong: string[] = [];
  for (const name of given) {
    const found = await filesOf(name);
    if (typeof found === "string") wrong.push(found);
    else for (const file of found) if (!files.has(resolve(file))) files.set(resolve(file), file);
  }
  if (wrong.length > 0) throw new CallError(wrong.join("\n"));
  return [...files.values()];
}

/** The files of one argument, or what is wrong with it. */
async function filesOf(name: string): Promise<string[] | string> {
  const shown = echo(name);
  if (name === "" || name.includes("\0")) return `found ${shown}; wanted the name of a claim file`;
  const about = await stat(name).catch(() => null);
  if (about?.isDirectory()) {
    return `found the directory ${shown}; wanted a file, or '${name.replace(/\/+$/, "")}/**/*.yaml'`;
  }
  if (about !== null) return [name];
  const { default: fastGlob } = await import("fast-glob");
  if (!fastGlob.isDynamicPattern(name)) return `found no file ${shown}; wanted a claim file that exists`;
  // Its library throws on patterns such as {1..1000000}.
  const matches = await fastGlob(name, { suppressErrors: true }).catch(() => null);
  if (matches === null) return `found the pattern ${shown}; wanted one that stands for fewer names`;
  return matches.length > 0 ? matches.sort() : `found no file that matches the pattern ${shown}`;
}
