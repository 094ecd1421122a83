import type { Claim } from "../claim/claim.js";
import type { ClaimResult, PassageSeries } from "../result/result.js";
import { judge } from "../verdict/judge.js";
import { bestOf, intervalOf, referenceOf } from "./best.js";
import { evidenceOf } from "./evidence.js";
import { type AuditOptions, type Investigation, investigate } from "./investigate.js";
import type { Reading } from "./job.js";
import { ladderResult } from "./ladder-result.js";
import { ledgerOf } from "./ledger.js";
import { createPool, type JobPool } from "./pool.js";
import { type Prepared, prepare } from "./prepare.js";
import { provenance } from "./provenance.js";
import { roundingOf } from "./rounding.js";
import { setupOf } from "./setup.js";
import { claimedOf, undetermined } from "./undetermined.js";

/** Audits claims on a pool of workers. */
export interface Auditor {
  audit(claim: Claim, options?: AuditOptions): Promise<ClaimResult>;
  close(): Promise<void>;
}

/** @param workers threads to work on; 0 works in the calling one */
export async function createAuditor({ workers }: { readonly workers: number }): Promise<Auditor> {
  const pool = await createPool(workers);
  return {
    audit: (claim, options = {}) => auditClaim(claim, pool, options),
    close: () => pool.close(),
  };
}

/** Audits one claim on a pool. */
export async function auditClaim(claim: Claim, pool: JobPool, options: AuditOptions): Promise<ClaimResult> {
  const began = performance.now();
  const prepared = prepare(claim);
  if ("problem" in prepared) return undetermined(claim.file, prepared.problem, claim, claim);

  const investigation = await investigate(claim, prepared, pool, options);
  if ("problem" in investigation) return undetermined(claim.file, investigation.problem, claim, claim);
  const { unit, baseline } = claim.claimed;
  const { scenario } = prepared;
  const ladders = investigation.ladders.map((ladder) =>
    ladderResult(ladder, scenario, unit, investigation.plan.authors, baseline === "subtracted"),
  );
  const ledger = ledgerOf(investigation.extras);
  const crossReading = crossReadingOf(investigation, prepared, claim);
  const judgement = judge(evidenceOf(claim, prepared, investigation, ladders, ledger, crossReading));
  const best = bestOf(investigation);
  return {
    file: claim.file,
    title: claim.title,
    ...judgement,
    claimed: claimedOf(claim.claimed),
    crossReading,
    best: {
      value: best?.value ?? null,
      halfWidth: best?.halfWidth ?? null,
      from: best?.from ?? null,
      extrapolated: investigation.extrapolated && intervalOf(investigation.extrapolated),
      says: bestInWords(investigation, unit.text),
    },
    rounding: roundingOf(investigation.solution, claim.scenario.equations.form === "time"),
    reference: referenceOf(investigation, unit.text),
    ladders,
    ledger,
    setup: setupOf(claim, prepared),
    passages: passagesOf(investigation, unit.radians),
    provenance: provenance(claim, (performance.now() - began) / 1000),
  };
}

function crossReadingOf(
  { extras }: Investigation,
  { scenario }: Prepared,
  { claimed: { unit } }: Claim,
): ClaimResult["crossReading"] {
  const reading = extras?.secondReading ?? null;
  if (reading === null) return null;
  const size = (unit.per === "orbit" ? 1 : unit.per / scenario.period) / unit.radians;
  return { value: reading.perOrbit * size, halfWidth: reading.halfWidth * size };
}

function bestInWords({ extrapolated: best, reference }: Investigation, unit: string): string {
  if ("value" in reference) {
    const [carrier, other] = reference.methods;
    return `${carrier} in double-double; ${other} agrees to ${reference.apart.toPrecision(2)} ${unit}.`;
  }
  if (best === null) return "No witness's ladder bounds the figure.";
  if (best.second === null) return `The limit of ${best.carrier}'s ladder alone, with no second witness.`;
  const apart = `${best.apart!.toPrecision(2)} ${unit}`;
  return best.sound
    ? `The limit of ${best.carrier}'s ladder; that of ${best.second} is ${apart} away, within their uncertainties.`
    : `The limit of ${best.carrier}'s ladder; that of ${best.second} is ${apart} away, more than their uncertainties explain.`;
}

function passagesOf({ solution, plan }: Investigation, radians: number): ClaimResult["passages"] {
  if (solution === null || plan.authors === null) return null;
  const { on, off } = solution.runs.rungs[plan.authors]!;
  if (on === null || on.numbers.length === 0) return null;
  const series = ({ numbers, advances }: Reading): PassageSeries => ({
    number: numbers,
    angle: advances.map((angle) => angle / radians),
  });
  return { solution: series(on), null: off === null || off === on ? null : series(off) };
}
