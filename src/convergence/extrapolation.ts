import { type LadderPoint, successiveDifferences } from "./differences.js";
import type { Estimate } from "./estimators/estimator.js";
import { NEAR_WHOLE, nextColumn } from "./extrapolants.js";
import { rungEstimates } from "./rung-estimates.js";
import { SAFETY_IN_WINDOW, SAFETY_OUTSIDE } from "./safety.js";
import { unsettledEstimate } from "./unsettled.js";
import { findWindow, type Window } from "./window.js";

export type { Estimate } from "./estimators/estimator.js";

/** Three exponents of an extrapolant. */
const FEWEST_DIFFERENCES = 4;

/**
 * The limit of a ladder that has a window.
 *
 * Richardson's extrapolants T = Q_fine - (Q_coarse - Q_fine) / (2^p - 1) of the leading power p make a ladder of
 * their own, and so on (L. F. Richardson and J. A. Gaunt, Phil. Trans. R. Soc. A 226, 299 (1927)). A column of
 * them counts where its own convergence is seen: where it has a window of a higher power. Its next correction
 * is then its error, and is not applied: an extrapolant that is not seen to converge may be a thousand times
 * better than the rung it comes from or no better at all, and a short ladder does not tell which.
 */
export function extrapolateWindow(points: readonly LadderPoint[], window: Window): Estimate {
  const found = rungEstimates(points, window, SAFETY_IN_WINDOW);
  const deeper = settledEstimates(points, window);
  if (deeper.length > 0) return tightest([...found, ...deeper]);
  const column = nextColumn(points, window);
  const unsettled = column === null ? null : unsettledEstimate(window, column);
  return tightest(unsettled === null ? found : [...found, unsettled]);
}

/** Those of all columns that are seen to converge. */
function settledEstimates(points: readonly LadderPoint[], window: Window): Estimate[] {
  const column = nextColumn(points, window);
  if (column === null) return [];
  const next = findWindow(successiveDifferences(column.points));
  if (next === null || !isSettled(next, column.power)) return [];
  return [...rungEstimates(column.points, next, SAFETY_OUTSIDE), ...settledEstimates(column.points, next)];
}

/**
 * Extrapolants rest on an expansion in whole powers of the step. Their exponent is that of a later power: whole,
 * and higher. Of passages it often is neither, since the partial step at a passage is another one on every rung
 * and its error, of order p + 1, follows no law; hence too the larger safety factor. Two such exponents may agree
 * by chance: on real ladders of known limit the error was then above three times the next correction in more
 * than one of a hundred, and with three that agree in none.
 */
function isSettled({ exponent, differences }: Window, power: number): boolean {
  const whole = Math.round(exponent);
  const near = whole > power && Math.abs(exponent - whole) <= NEAR_WHOLE;
  return near && differences.length >= FEWEST_DIFFERENCES;
}

export function tightest(estimates: readonly Estimate[]): Estimate {
  return estimates.reduce((best, next) => (next.halfWidth < best.halfWidth ? next : best));
}
