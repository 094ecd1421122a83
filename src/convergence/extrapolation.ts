import type { Difference, LadderPoint } from "./differences.js";
import type { Window } from "./window.js";

/** A value with its 95 % half-width. */
export interface Estimate {
  readonly value: number;
  readonly halfWidth: number;
}

/**
 * Safety factors of the grid convergence index: Roache, Verification and Validation in Computational
 * Science and Engineering (1998); Celik et al., J. Fluids Eng. 130, 078001 (2008).
 */
const SAFETY_IN_WINDOW = 1.25;
const SAFETY_OUTSIDE = 3;
/** The part of a Richardson correction that is never claimed to be known, however well extrapolants agree. */
const CORRECTION_SHARE = 0.1;

/**
 * Richardson extrapolation with the measured exponent p: Q* = Q_fine - (Q_coarse - Q_fine) / (2^p - 1).
 *
 * Half-widths add truncation and rounding in line and not in quadrature: truncation is a bias, and the
 * choice of the tightest candidate spends what quadrature would save.
 */
export function extrapolateWindow(points: readonly LadderPoint[], window: Window): Estimate {
  const growth = 2 ** window.exponent - 1;
  const candidates: Estimate[] = [];
  let previous: number | null = null;
  let coarser = 0;
  let correction = 0;
  for (const difference of window.differences) {
    const fine = points[difference.rung + 1]!;
    correction = difference.value / growth;
    const value = fine.value! - correction;
    if (previous !== null) {
      // The exponent of the last two differences alone stands for where the measured one is heading.
      const local = Math.log2(coarser / difference.value);
      // The last extrapolant's distance from the one before is the error of the one before.
      const unresolved =
        SAFETY_OUTSIDE * Math.abs(value - previous) +
        SAFETY_IN_WINDOW * Math.abs(correction - difference.value / (2 ** local - 1)) +
        CORRECTION_SHARE * Math.abs(correction);
      const truncation = Math.min(SAFETY_IN_WINDOW * Math.abs(correction), unresolved);
      candidates.push({ value, halfWidth: truncation + Math.hypot(fine.floor, difference.noise / growth) });
    }
    previous = value;
    coarser = difference.value;
  }
  // Beyond the window the law carries on below the rounding floor; the figure stands as it is. What a
  // difference there is off the law shows rounding at work, whatever the floor says.
  let surprise = 0;
  for (let k = window.rungs[1] + 1; k < points.length; k++) {
    const { value, floor } = points[k]!;
    const step = points[k - 1]!.value! - value!;
    correction /= 2 ** window.exponent;
    surprise = Math.max(surprise, Math.abs(step - correction * growth));
    candidates.push({
      value: value!,
      halfWidth: SAFETY_IN_WINDOW * Math.abs(correction) + Math.hypot(floor, surprise),
    });
  }
  return tightest(candidates);
}

/**
 * The limit where rounding is reached before a window shows: among the finest differences that are all
 * rounding, the coarsest rung has collected the least of it. Its own truncation is at most the difference
 * to the next, widened by the factor for an unknown order.
 */
export function extrapolateFlat(
  points: readonly LadderPoint[],
  differences: readonly Difference[],
): Estimate {
  const flat = flatDifferences(differences);
  return tightest(
    flat.map((d) => ({
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

/** Without one exponent: the finest figure, give or take three times the larger of the last two differences. */
export function boundIrregular(points: readonly LadderPoint[], differences: readonly Difference[]): Estimate {
  const finest = points.at(-1)!;
  const spread = Math.max(...differences.slice(-2).map((d) => Math.abs(d.value)));
  return { value: finest.value!, halfWidth: SAFETY_OUTSIDE * spread + finest.floor };
}

function tightest(estimates: readonly Estimate[]): Estimate {
  return estimates.reduce((best, next) => (next.halfWidth < best.halfWidth ? next : best));
}
