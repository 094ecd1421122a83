import type { Difference, LadderPoint } from "./differences.js";
import type { Estimate } from "./estimators/estimator.js";
import { tightest } from "./extrapolation.js";
import { SAFETY_OUTSIDE } from "./safety.js";

/**
 * The limit where rounding is reached before a window shows: among the finest differences that are all
 * rounding, the coarsest rung has collected the least of it. Its own truncation is at most the difference
 * to the next, widened by the factor for an unknown order.
 */
export function boundFlat(points: readonly LadderPoint[], differences: readonly Difference[]): Estimate {
  return tightest(
    flatDifferences(differences).map((d) => ({
      value: points[d.rung + 1]!.value!,
      halfWidth: SAFETY_OUTSIDE * Math.abs(d.value) + points[d.rung + 1]!.floor,
    })),
  );
}

/** The differences at the fine end that are all rounding. */
export function flatDifferences(differences: readonly Difference[]): Difference[] {
  const lastClear = differences.findLastIndex((d) => d.clear);
  return differences.slice(lastClear + 1);
}

/**
 * Without one exponent: the finest figure, give or take three times the last difference, or half the one
 * before where that is more. At the lowest order, one, a difference is half the one before; a smaller one may
 * be two errors that happen to cancel.
 */
export function boundIrregular(points: readonly LadderPoint[], differences: readonly Difference[]): Estimate {
  const finest = points.at(-1)!;
  const [before, last] = differences.slice(-2).map((d) => Math.abs(d.value)) as [number, number];
  return {
    value: finest.value!,
    halfWidth: SAFETY_OUTSIDE * Math.max(last, before / 2) + finest.floor,
  };
}
