import { randomUUID } from "node:crypto";
import { rmSync } from "node:fs";
import { mkdir, realpath, stat, writeFile } from "node:fs/promises";
import { dirname, join } from "node:path";
import { WriteError, writeWhole } from "../report/write.js";
import { CallError } from "./call-error.js";

/**
 * Writes a result to a file, whole or not at all; a link is followed. What is there already and is no file,
 * such as a device or a pipe, is written as it is: a rename would put a file in its place.
 *
 * @throws CallError
 */
export async function writeTo(path: string, text: string): Promise<void> {
  const about = await stat(path).catch(() => null);
  if (about !== null && !about.isFile()) return explained(path, writeFile(path, text));
  await explained(path, writeWhole(await realpath(path).catch(() => path), text));
}

/**
 * Finds out ahead of the work whether a file can be written; leaves nothing.
 *
 * @param spared files that are to be read, and must not be written over
 * @throws CallError
 */
export async function tryWriting(path: string, spared: readonly string[] = []): Promise<void> {
  const about = await stat(path).catch(() => null);
  if (about?.isDirectory()) throw new CallError(`cannot write ${path}: it is a folder`);
  if (about !== null && !about.isFile()) return;
  const target = await realpath(path).catch(() => path);
  for (const file of spared) {
    if ((await realpath(file).catch(() => file)) === target) {
      throw new CallError(`cannot write ${path}: it is one of the claims`);
    }
  }
  const trial = join(dirname(target), `.cupel-${randomUUID()}`);
  await explained(path, writeWhole(trial, ""), trial);
  rmSync(trial, { force: true });
}

/**
 * Makes a folder and those above it that are missing, outermost first. (Node's own recursive way never returns where a file system refuses folders
 * as if their parent were missing, as /proc does.)
 *
 * @throws CallError
 */
export async function makeFolders(path: string, missing: readonly string[]): Promise<void> {
  for (const folder of missing) await explained(path, mkdir(folder).catch(unlessThere));
  if ((await explained(path, stat(path))).isDirectory()) return;
  throw new CallError(`cannot write ${path}: it is a file, not a folder`);
}

/** Another run may have made it in the meantime. */
function unlessThere(error: NodeJS.ErrnoException): void {
  if (error.code !== "EEXIST") throw error;
}

const REASONS: Readonly<Record<string, string>> = {
  EACCES: "no permission",
  EPERM: "no permission",
  EROFS: "the file system is read-only",
  ENOSPC: "no space is left",
  ENOTDIR: "part of the path is a file, not a folder",
  ENOENT: "no folder can be made there",
  ENAMETOOLONG: "the name is too long",
};

/** An error in writing, told of the path that was asked for. */
async function explained<T>(path: string, work: Promise<T>, written = path): Promise<T> {
  try {
    return await work;
  } catch (error) {
    if (error instanceof WriteError) throw new CallError(error.message.replace(written, () => path));
    const { code } = error as NodeJS.ErrnoException;
    if (code === undefined) throw error;
    throw new CallError(`cannot write ${path}: ${REASONS[code] ?? code}`);
  }
}
