import { rmSync } from "node:fs";
import { rename, rm, writeFile } from "node:fs/promises";
import { basename, dirname, join } from "node:path";

/** Temporary files under way: removed when the program is interrupted. */
const unfinished = new Set<string>();

/** A path that could not be written, and why. */
export class WriteError extends Error {
  override readonly name = "WriteError";
}

const REASONS: Readonly<Record<string, string>> = {
  EACCES: "no permission to write there",
  EPERM: "no permission to write there",
  EROFS: "the file system is read-only",
  ENOSPC: "no space is left",
  ENOTDIR: "part of the path is a file, not a folder",
  EEXIST: "a file of that name is in the way",
  EISDIR: "a folder of that name is in the way",
  ENOENT: "the folder does not exist",
  ENAMETOOLONG: "the name is too long",
};

async function orExplain<T>(path: string, work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === undefined) throw error;
    throw new WriteError(`cannot write ${path}: ${REASONS[code] ?? code}`);
  }
}

/** Writes a file whole or not at all: under another name in the same folder first. @throws WriteError */
export async function writeWhole(path: string, text: string): Promise<void> {
  const temporary = join(dirname(path), `.${basename(path)}.${process.pid}.part`);
  unfinished.add(temporary);
  try {
    await orExplain(path, writeFile(temporary, text));
    await orExplain(path, rename(temporary, path));
  } catch (error) {
    await rm(temporary, { force: true }).catch(() => {});
    throw error;
  } finally {
    unfinished.delete(temporary);
  }
}

/** For a signal handler: leaves no half file behind. */
export function removeUnfinished(): void {
  for (const path of unfinished) rmSync(path, { force: true });
}

/** Bytes of a stem: with number, ending and the dress of a temporary name it stays under the 255 of a name. */
const LONGEST = 180;

/**
 * File names for pages, one a claim: the claim's own name without its ending, with a number where two would
 * be the same, also on file systems that tell no case or composed letters apart.
 */
export function pageNames(files: readonly string[]): string[] {
  const taken = new Set(["index"]);
  return files.map((file) => {
    const stem =
      shortened(
        basename(file)
          .normalize("NFC")
          .replace(/\.(ya?ml|json)$/i, "")
          .replaceAll(/[^\p{L}\p{M}\p{N}._-]+/gu, "-")
          .replace(/^[.-]+/, ""),
      ) || "claim";
    let name = stem;
    for (let k = 2; taken.has(folded(name)); k++) name = `${stem}-${k}`;
    taken.add(folded(name));
    return `${name}.html`;
  });
}

const folded = (name: string): string => name.normalize("NFKC").toLowerCase();

function shortened(name: string): string {
  let kept = "";
  for (const character of name) {
    if (Buffer.byteLength(kept + character) > LONGEST) break;
    kept += character;
  }
  return kept;
}
