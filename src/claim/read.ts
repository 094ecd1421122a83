import { createHash } from "node:crypto";
import { open } from "node:fs/promises";
import { buildClaim } from "./build.js";
import type { Claim } from "./claim.js";
import { parseDocument } from "./document.js";
import { takeLaterParts } from "./later.js";
import type { Problem } from "./problem.js";
import { Reporter } from "./reporter.js";
import { shapeOf } from "./shape.js";

/** A claim, or all that is wrong with its file. */
export type ReadOutcome =
  | { readonly ok: true; readonly claim: Claim }
  | {
      readonly ok: false;
      readonly file: string;
      /** In the order of the file. */
      readonly problems: readonly Problem[];
      /** Of the claim, where it has a good one in spite of the problems. */
      readonly title?: string;
      /** Of the file's bytes; empty when they could not be read. */
      readonly sha256: string;
    };

/** A claim is a page of text. */
const LARGEST = 1_000_000;

/** Reads and checks a claim file. Never throws for what is in the file, or for a file that cannot be read. */
export async function readClaim(path: string): Promise<ReadOutcome> {
  const file = path.replaceAll("\\", "/");
  const fail = (found: string, wanted: string): ReadOutcome => ({
    ok: false,
    file,
    problems: [{ file, line: null, column: null, path: "", found, wanted }],
    sha256: "",
  });
  try {
    const handle = await open(path, "r");
    try {
      const about = await handle.stat();
      if (about.isDirectory())
        return fail("a directory", `a claim file, or '${file.replace(/\/$/, "")}/**/*.yaml'`);
      if (about.size > LARGEST) return fail(`${about.size} bytes`, `a claim of at most ${LARGEST} bytes`);
      // A device or a pipe has no size: read no more than a claim may have.
      const buffer = Buffer.alloc(LARGEST + 1);
      let length = 0;
      for (;;) {
        const { bytesRead } = await handle.read(buffer, length, buffer.length - length);
        length += bytesRead;
        if (bytesRead === 0 || length > LARGEST) break;
      }
      if (length > LARGEST) return fail(`more than ${LARGEST} bytes`, `a claim of at most ${LARGEST} bytes`);
      return parseClaim(buffer.subarray(0, length), file);
    } finally {
      await handle.close();
    }
  } catch (error) {
    const code = (error as NodeJS.ErrnoException).code;
    if (code === undefined) throw error;
    return fail(REASONS[code] ?? `an error of the file system (${code})`, "a claim file that can be read");
  }
}

const REASONS: Readonly<Record<string, string>> = {
  ENOENT: "no such file",
  ENOTDIR: "no such file",
  EACCES: "a file without permission to read it",
  EISDIR: "a directory",
  ELOOP: "a circle of links",
  ENAMETOOLONG: "a name too long for a file",
  ERR_INVALID_ARG_VALUE: "a name that no file can have",
};

/** Checks the bytes of a claim file. */
export function parseClaim(bytes: Uint8Array, file: string): ReadOutcome {
  const sha256 = createHash("sha256").update(bytes).digest("hex");
  const fail = (problems: readonly Problem[], title?: string): ReadOutcome => ({
    ok: false,
    file,
    problems: inOrder(problems),
    sha256,
    ...(title === undefined ? {} : { title }),
  });
  const whole = (found: string, wanted: string) =>
    fail([{ file, line: null, column: null, path: "", found, wanted }]);

  if (bytes.length === 0) return whole("an empty file", "a claim: 'cupel: claim/1' and its keys");
  let text: string;
  try {
    text = new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return whole("bytes that are not UTF-8 text", "YAML or JSON");
  }
  if (text.includes("\0")) return whole("a binary file", "YAML or JSON");

  const parsed = parseDocument(text, file);
  if (!parsed.ok) return fail(parsed.problems);
  const { document } = parsed;
  const report = new Reporter(document, file);
  for (const part of takeLaterParts(document.data)) report.atKey(part.path, part);
  const shaped = shapeOf(document, report);
  const claim = buildClaim(shaped, { file, sha256 }, report);
  return claim === null ? fail(report.problems, shaped.title) : { ok: true, claim };
}

function inOrder(problems: readonly Problem[]): Problem[] {
  return [...problems].sort((a, b) => (a.line ?? 0) - (b.line ?? 0) || (a.column ?? 0) - (b.column ?? 0));
}
