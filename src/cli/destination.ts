import { randomUUID } from "node:crypto";
import { rmSync } from "node:fs";
import { realpath, stat, writeFile } from "node:fs/promises";
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
  const target = await realpath(path).catch(() => path);
  const about = await stat(path).catch(() => null);
  if (about === null || about.isFile()) return asCallError(path, writeWhole(target, text));
  await writeFile(path, text).catch((error: NodeJS.ErrnoException) => {
    throw new CallError(`cannot write ${path}: ${error.code === "ENOSPC" ? "no space is left" : error.code}`);
  });
}

/** Finds out ahead of the work whether a file can be written; leaves nothing. @throws CallError */
export async function tryWriting(path: string): Promise<void> {
  const about = await stat(path).catch(() => null);
  if (about?.isDirectory()) {
    throw new CallError(`cannot write ${path}: a folder of that name is in the way`);
  }
  if (about !== null && !about.isFile()) return;
  const target = await realpath(path).catch(() => path);
  const trial = join(dirname(target), `.cupel-${randomUUID()}`);
  await asCallError(path, writeWhole(trial, ""), trial);
  rmSync(trial, { force: true });
}

/** An error in writing is told of the path that was asked for. */
export async function asCallError<T>(path: string, work: Promise<T>, written = path): Promise<T> {
  try {
    return await work;
  } catch (error) {
    throw error instanceof WriteError ? new CallError(error.message.replace(written, () => path)) : error;
  }
}
