import { type LadderPoint, successiveDifferences } from "./differences.js";
import type { Estimate } from "./estimators/estimator.js";
import { NEAR_WHOLE, nextColumn } from "./extrapolants.js";
import { remainderOfTwoPowers } from "./two-powers.js";
import { findWindow, type Window } from "./window.js";

/**
 * Safety factors of the grid convergence index: Roache, Verification and Validation in Computational
 * Science and Engineering (1998); Celik et al., J. Fluids Eng. 130, 078001 (2008).
 */
export const SAFETY_IN_WINDOW = 1.25;
export const SAFETY_OUTSIDE = 3;

/**
 * From the 95 % half-width of rounding, measured on eight runs, to the 99 % that a limit is held to: Student's
 * t of seven degrees of freedom, 3.499 / 2.365 (M. Abramowitz and I. Stegun, table 26.10).
 */
const TO_99_PERCENT = 1.48;

/**
 * The limit of a ladder that has a window.
 *
 * Richardson's extrapolants T = Q_fine - (Q_coarse - Q_fine) / (2^p - 1) of the leading power p make a ladder of
 * their own, and so on (L. F. Richardson and J. A. Gaunt, Phil. Trans. R. Soc. A 226, 299 (1927)). A column of
 * them counts where its own convergence is seen: where it has a window of a higher power. Its next correction
 * is then its error, and is not applied: an extrapolant that is not seen to converge may be a thousand times
 * better than the rung it comes from or no better at all, and the ladder does not tell which.
 *
 * Half-widths add truncation and rounding in line and not in quadrature: truncation is a bias, and the
 * choice of the tightest candidate spends what quadrature would save.
 */
export function extrapolateWindow(points: readonly LadderPoint[], window: Window): Estimate {
  return tightest(candidates(points, window, SAFETY_IN_WINDOW));
}

function candidates(points: readonly LadderPoint[], window: Window, safety: number): Estimate[] {
  const inside = insideWindow(points, window, safety);
  const found = [...inside.estimates, ...beyondWindow(points, window, inside.truncation)];
  const column = nextColumn(points, window);
  if (column === null) return found;
  const next = findWindow(successiveDifferences(column.points));
  if (next === null || !isSettled(next, column.power)) return found;
  return [...found, ...candidates(column.points, next, SAFETY_OUTSIDE)];
}

/**
 * Extrapolants rest on an expansion in whole powers of the step. Their exponent is that of a later power: whole,
 * and higher. Of passages it often is neither, since the partial step at a passage is another one on every rung
 * and its error, of order p + 1, does not follow the law; hence too the larger safety factor.
 */
function isSettled({ exponent }: Window, power: number): boolean {
  const whole = Math.round(exponent);
  return whole > power && Math.abs(exponent - whole) <= NEAR_WHOLE;
}

/**
 * The figures of the window's rungs, with the larger of two remainders: of one power at the lower end of the
 * exponent's interval, and of two powers. No order is below one, unless it is measured to be.
 */
function insideWindow(
  points: readonly LadderPoint[],
  window: Window,
  safety: number,
): { readonly estimates: Estimate[]; readonly truncation: number } {
  const { differences } = window;
  const estimates: Estimate[] = [];
  let truncation = 0;
  for (let k = 2; k < differences.length; k++) {
    const [a, b, c] = [differences[k - 2]!.value, differences[k - 1]!.value, differences[k]!.value];
    const onePower = Math.abs(c) / (2 ** lowestExponent(window, Math.log2(b / c)) - 1);
    truncation = safety * Math.max(onePower, Math.abs(remainderOfTwoPowers(a, b, c)));
    const { value, floor } = points[differences[k]!.rung + 1]!;
    estimates.push({ value: value!, halfWidth: truncation + TO_99_PERCENT * floor });
  }
  return { estimates, truncation };
}

const lowestExponent = ({ interval }: Window, local: number): number =>
  Math.min(Math.max(1, interval[0]), local);

/**
 * Beyond the window the law carries on below the rounding floor; the figure stands as it is. What a
 * difference there is off the law shows rounding at work, whatever the floor says.
 *
 * @param truncation of the window's last rung
 */
function beyondWindow(points: readonly LadderPoint[], window: Window, truncation: number): Estimate[] {
  const [before, last] = window.differences.slice(-2);
  const lowest = lowestExponent(window, Math.log2(before!.value / last!.value));
  const estimates: Estimate[] = [];
  let expected = last!.value;
  let remainder = truncation;
  let surprise = 0;
  for (let k = window.rungs[1] + 1; k < points.length; k++) {
    const { value, floor } = points[k]!;
    expected /= 2 ** window.exponent;
    remainder /= 2 ** lowest;
    surprise = Math.max(surprise, Math.abs(points[k - 1]!.value! - value! - expected));
    estimates.push({ value: value!, halfWidth: remainder + Math.hypot(TO_99_PERCENT * floor, surprise) });
  }
  return estimates;
}

export function tightest(estimates: readonly Estimate[]): Estimate {
  return estimates.reduce((best, next) => (next.halfWidth < best.halfWidth ? next : best));
}
