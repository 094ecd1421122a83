import { fitLine } from "../statistics/line.js";
import type { Run } from "./run.js";

/** The apsidal advance of a run, and how long its orbits take. Errors are standard errors of the slopes. */
export interface Advance {
  /** rad an orbit (a radial period). */
  readonly perOrbit: number;
  readonly perOrbitError: number;
  /** Mean radial period: s, or rad in angle form. */
  readonly radialPeriod: number;
  readonly radialPeriodError: number;
  /** rad a unit of the independent variable: the one figure over the other. */
  readonly perTime: number;
  readonly perTimeError: number;
  readonly passages: number;
}

/**
 * Reads the advance off a run: the least-squares slope of the unwrapped apsidal angle on the passage
 * number, less 2π. The turns are taken off before the fit, so that the slope is not a small difference.
 *
 * @returns null where fewer than three passages leave a slope without an error
 */
export function apsidalAdvance(run: Pick<Run, "numbers" | "times" | "advances">): Advance | null {
  const angle = fitLine(run.numbers, run.advances);
  const time = fitLine(run.numbers, run.times);
  if (angle === null || time === null || angle.slopeError === null || time.slopeError === null) return null;
  const perTime = angle.slope / time.slope;
  return {
    perOrbit: angle.slope,
    perOrbitError: angle.slopeError,
    radialPeriod: time.slope,
    radialPeriodError: time.slopeError,
    perTime,
    perTimeError: Math.hypot(angle.slopeError, perTime * time.slopeError) / time.slope,
    passages: run.numbers.length,
  };
}
