import { sampleStandardDeviation } from "simple-statistics";
import { fitLine } from "../statistics/line.js";

/** Fewer passages say nothing of how a spread grows; the first few are all start. */
const FEWEST = 12;
const FROM = 1 / 4;

/**
 * Exponent with which the members of an ensemble spread: of spread ~ k^exponent on the passage number k, over the
 * later three quarters. Rounding that is random makes the apsis and the energy walk as t^1/2 and the phase as
 * t^3/2 (D. Brouwer, A. J. 46, 149, 1937); rounding that pushes one way makes them 1 and 2.
 *
 * @param members a series each, all on the same passages, the first of them the start
 * @returns null where there are too few passages, or nothing spreads
 */
export function spreadExponent(members: readonly (readonly number[])[]): number | null {
  const length = Math.min(...members.map((series) => series.length));
  if (members.length < 3 || !(length >= FEWEST)) return null;
  const points: [number, number][] = [];
  for (let k = Math.ceil(length * FROM); k < length; k++) {
    const spread = sampleStandardDeviation(members.map((series) => series[k]! - series[0]!));
    if (spread > 0) points.push([Math.log(k), Math.log(spread)]);
  }
  if (points.length < FEWEST / 2) return null;
  // Evenly in log k: late passages are many and tell the same.
  const line = fitLine(
    points.map(([x]) => x),
    points.map(([, y]) => y),
    points.map(([x]) => Math.exp(-x)),
  );
  return line?.slope ?? null;
}
