import { fileURLToPath } from "node:url";
import { createAuditor } from "../../src/audit/audit.js";
import { unreadable } from "../../src/audit/undetermined.js";
import { readClaim } from "../../src/claim/read.js";
import type { ClaimResult } from "../../src/result/result.js";

const claims = new URL("../../fixtures/claims/", import.meta.url);

/** Real results of the sample claims, by name. */
export async function auditSamples(names: readonly string[]): Promise<Map<string, ClaimResult>> {
  const auditor = await createAuditor({ workers: 0 });
  try {
    const results = new Map<string, ClaimResult>();
    for (const name of names) {
      const outcome = await readClaim(fileURLToPath(new URL(name, claims)));
      if (!outcome.ok) throw new Error(`${name} is not a claim: ${JSON.stringify(outcome.problems)}`);
      const result = await auditor.audit({ ...outcome.claim, file: `fixtures/claims/${name}` });
      results.set(name.replace(/\.\w+$/, ""), result);
    }
    return results;
  } finally {
    await auditor.close();
  }
}

/** What there is of a file that is no claim at all. */
export async function unreadableResult(): Promise<ClaimResult> {
  const outcome = await readClaim(fileURLToPath(new URL("../../package.json", import.meta.url)));
  if (outcome.ok) throw new Error("package.json should not be a claim");
  return unreadable(outcome);
}

/** A result with only parts of it: everything that may be null is. */
export function bare(result: ClaimResult): ClaimResult {
  return {
    ...result,
    verdict: "undetermined",
    grade: null,
    digits: null,
    asSolved: { value: null, null: null, error: null, halfWidth: null },
    crossReading: null,
    best: {
      value: null,
      halfWidth: null,
      from: null,
      extrapolated: null,
      says: "No witness's ladder bounds the figure.",
    },
    budget: null,
    ladders: [],
    ledger: [],
    remedy: null,
    setup: null,
    passages: null,
  };
}
