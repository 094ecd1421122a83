import { readFileSync } from "node:fs";
import type { ClaimResult } from "../result/result.js";

/** Where a result comes from. */
export interface Provenance {
  readonly file: string;
  /** Of the claim's bytes; empty when they could not be read. */
  readonly sha256: string;
}

const { version } = JSON.parse(readFileSync(new URL("../../package.json", import.meta.url), "utf8")) as {
  version: string;
};

export function provenance({ file, sha256 }: Provenance, seconds: number): ClaimResult["provenance"] {
  return {
    version,
    claimSha256: sha256,
    node: process.version,
    command: `cupel audit ${/^[\w./-]+$/.test(file) ? file : `'${file.replaceAll("'", "'\\''")}'`}`,
    seconds,
  };
}
