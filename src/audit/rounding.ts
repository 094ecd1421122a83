import { spreadExponent } from "../convergence/spread.js";
import type { ClaimResult } from "../result/result.js";
import type { AnalysedLadder } from "./ladders.js";
import type { Ensemble } from "./method-runs.js";

/** Eight members tell an exponent to some two tenths. */
const NEAR = 0.3;
const WALK = 0.5;

/** How the apsides of an ensemble's members spread in time. */
function apsisGrowthOf({ on }: Ensemble): number | null {
  return spreadExponent(on.flatMap((reading) => (reading === null ? [] : [reading.advances])));
}

/** Exponent in the number of steps with which rounding grows: a half, unless it is seen to push one way. */
export function roundingGrowth(ensemble: Ensemble): number {
  const growth = apsisGrowthOf(ensemble) ?? WALK;
  return growth - WALK > NEAR ? Math.min(1, growth) : WALK;
}

/**
 * How rounding grows in the author's run, beside Brouwer's law.
 *
 * @param inTime false in angle form, where a passage has no time beside its angle
 */
export function roundingOf(solution: AnalysedLadder | null, inTime: boolean): ClaimResult["rounding"] {
  if (solution === null) return null;
  const { ensemble, arithmetic } = solution.runs;
  const times = ensemble.on.flatMap((reading) => (reading === null ? [] : [reading.times]));
  const apsisGrowth = apsisGrowthOf(ensemble);
  const phaseGrowth = inTime ? spreadExponent(times) : null;
  if (apsisGrowth === null) {
    return { apsisGrowth, phaseGrowth, says: "Too few passages to tell how rounding grows." };
  }
  const phase =
    phaseGrowth === null ? "" : `, with the power ${phaseGrowth.toFixed(2)} in the time of passage`;
  const law = phaseGrowth === null ? "0.5" : "0.5 and 1.5";
  return {
    apsisGrowth,
    phaseGrowth,
    says: `In ${arithmetic} precision, runs that differ in the last bits spread in the apsis with the power ${apsisGrowth.toFixed(2)} of time${phase}${judgement(apsisGrowth, law)}`,
  };
}

function judgement(growth: number, law: string): string {
  if (Math.abs(growth - WALK) <= NEAR) return `: a random walk, Brouwer's law for rounding (${law}).`;
  return growth > WALK
    ? `, faster than the random walk of Brouwer's law (${law}): rounding pushes one way.`
    : `: less than the random walk of Brouwer's law (${law}), so that what the starts differ by is most of it.`;
}
