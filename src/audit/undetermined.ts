import type { Claim } from "../claim/claim.js";
import { problemInWords } from "../claim/problem.js";
import type { ReadOutcome } from "../claim/read.js";
import type { ClaimResult } from "../result/result.js";
import { type Provenance, provenance } from "./provenance.js";

/** The result of a claim that could not be audited: an honest entry with the reason. */
export function undetermined(
  file: string,
  reason: string,
  origin: Provenance,
  claim: { readonly title: string; readonly claimed?: Claim["claimed"] } | null = null,
): ClaimResult {
  return {
    file,
    title: claim?.title ?? file,
    verdict: "undetermined",
    grade: null,
    digits: null,
    reason,
    gradeRule: "Nothing was run, so there is nothing to grade.",
    claimed: claim?.claimed === undefined ? null : claimedOf(claim.claimed),
    asSolved: { value: null, null: null, error: null, halfWidth: null },
    crossReading: null,
    best: { value: null, halfWidth: null, from: null, extrapolated: null, says: "Nothing was run." },
    reference: null,
    rounding: null,
    checks: [
      { name: "reproduces", outcome: "not-checked", figure: null, limit: null, unit: "", says: reason },
    ],
    budget: null,
    ladders: [],
    ledger: [],
    remedy: null,
    setup: null,
    passages: null,
    provenance: provenance(origin, 0),
  };
}

export function claimedOf(claimed: Claim["claimed"]): NonNullable<ClaimResult["claimed"]> {
  const { value, halfWidth, baseline, quantity, text, digits } = claimed;
  return { value, halfWidth, unit: claimed.unit.text, baseline, quantity, text, digits };
}

/** The entry of a file that holds no claim that can be read, with what is wrong with it. */
export function unreadable({
  file,
  problems,
  sha256,
  title,
}: Extract<ReadOutcome, { ok: false }>): ClaimResult {
  const reason = problems
    .map((problem) => (problem.line === null ? "" : `line ${problem.line}, `) + problemInWords(problem))
    .join("; ");
  return undetermined(
    file,
    `The claim could not be read: ${reason}.`,
    { file, sha256 },
    title === undefined ? null : { title },
  );
}
