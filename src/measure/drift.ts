import type { DriftPattern } from "../result/result.js";
import type { Aspect } from "./aspects.js";
import { type Growth, growthOf } from "./growth.js";

/** What a conserved quantity does over a run; changes are relative. */
export interface Drift {
  readonly pattern: DriftPattern;
  /** Secular change an orbit. */
  readonly perOrbit: number;
  /** Of |drift| ~ orbits^exponent, where fitted. */
  readonly exponent: number | null;
}

/**
 * Below this part of the swing within an orbit a change from orbit to orbit is not what one sees: over the
 * span the swing is all that matters, and the means themselves are only that good.
 */
const SECULAR = 0.01;
/** A staircase: what happens between the passages is at most a tenth of what happens at them. */
const STAIRCASE = 0.1;

/**
 * Names the pattern of a drift.
 *
 * | pattern | when |
 * | --- | --- |
 * | rounding-level | the largest change is within what rounding alone may do (`rounding`) |
 * | bounded-oscillation | the means of the orbits do not grow, or by less than a hundredth of the swing within an orbit, or than rounding may make them |
 * | linear-drift | the means move steadily, t^1 or slower |
 * | faster-growth | as a power of t above 1.25 |
 * | random-walk | their steps forget one another |
 * | jumps-at-periapsis | any of the last three, nine tenths of it within a tenth of an orbit of the passages |
 *
 * @param largest largest relative change over the run
 * @param means orbit by orbit
 * @param swing half the widest swing within an orbit, as far as it is numerical
 * @param rounding what rounding may have done over the run
 * @param noise what rounding does in one step
 */
export function driftOf(
  largest: number,
  means: Aspect,
  swing: number,
  rounding: number,
  noise: number,
): Drift {
  const growth = growthOf(means.mean, noise);
  const found = (pattern: DriftPattern, exponent: number | null = null): Drift => ({
    pattern,
    perOrbit: growth.slope,
    exponent,
  });
  if (largest <= rounding) return found("rounding-level");
  const range = means.mean.length === 0 ? 0 : Math.max(...means.mean) - Math.min(...means.mean);
  if (growth.kind === "none" || range <= Math.max(SECULAR * swing, rounding))
    return found("bounded-oscillation");
  return found(isStaircase(means) ? "jumps-at-periapsis" : PATTERNS[growth.kind], growth.exponent);
}

const PATTERNS: Record<Exclude<Growth["kind"], "none">, DriftPattern> = {
  linear: "linear-drift",
  faster: "faster-growth",
  "random-walk": "random-walk",
};

/** Root mean square of the changes over each orbit's middle against that of the changes across passages. */
function isStaircase({ early, late }: Aspect): boolean {
  const flows: number[] = [];
  const jumps: number[] = [];
  for (let k = 0; k < early.length; k++) {
    const [from, to, before] = [early[k], late[k], k > 0 ? late[k - 1] : null];
    if (from != null && to != null) flows.push(to - from);
    if (from != null && before != null) jumps.push(from - before);
  }
  if (jumps.length === 0 || flows.length === 0) return false;
  const size = (values: readonly number[]): number =>
    Math.sqrt(values.reduce((sum, v) => sum + v * v, 0) / values.length);
  return size(flows) <= STAIRCASE * size(jumps);
}
