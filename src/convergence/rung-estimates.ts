import type { LadderPoint } from "./differences.js";
import type { Estimate } from "./estimators/estimator.js";
import { TO_98_PERCENT } from "./safety.js";
import { remainderOfTwoPowers } from "./two-powers.js";
import { lowestExponent, type Window } from "./window.js";

/**
 * What each rung from the window's fourth on says of the limit: its own figure, and how far off it may be.
 *
 * Half-widths add truncation and rounding in line and not in quadrature: truncation is a bias, and the
 * choice of the tightest candidate spends what quadrature would save.
 *
 * @param safety factor on the truncation
 */
export function rungEstimates(points: readonly LadderPoint[], window: Window, safety: number): Estimate[] {
  const off = offTheLaw(points, window);
  const { estimates, truncation } = insideWindow(points, window, safety, unexplained(points, window, off));
  return [...estimates, ...beyondWindow(points, window, truncation, off)];
}

/** How far each difference beyond the window is off the window's law. */
function offTheLaw(points: readonly LadderPoint[], { differences, rungs, exponent }: Window): number[] {
  const last = differences.at(-1)!.value;
  return points.slice(rungs[1] + 1).map(({ value }, k) => {
    const expected = last / 2 ** ((k + 1) * exponent);
    return Math.abs(points[rungs[1] + k]!.value! - value! - expected);
  });
}

/**
 * The largest of those that rounding does not explain: another power has taken over below the window, or the
 * floor is underrated.
 */
function unexplained(points: readonly LadderPoint[], { rungs }: Window, off: readonly number[]): number {
  const noise = (k: number): number =>
    Math.hypot(points[rungs[1] + k]!.floor, points[rungs[1] + k + 1]!.floor);
  return Math.max(0, ...off.filter((distance, k) => distance > noise(k)));
}

/**
 * The figures of the window's rungs, with the larger of two remainders: of one power at the lower end of the
 * exponent's interval, and of two powers.
 */
function insideWindow(
  points: readonly LadderPoint[],
  window: Window,
  safety: number,
  surprise: number,
): { readonly estimates: Estimate[]; readonly truncation: number } {
  const { differences } = window;
  const estimates: Estimate[] = [];
  let truncation = 0;
  for (let k = 2; k < differences.length; k++) {
    const [a, b, c] = [differences[k - 2]!.value, differences[k - 1]!.value, differences[k]!.value];
    const onePower = Math.abs(c) / (2 ** lowestExponent(window, Math.log2(b / c)) - 1);
    truncation = safety * Math.max(onePower, Math.abs(remainderOfTwoPowers(a, b, c)));
    const { value, floor } = points[differences[k]!.rung + 1]!;
    estimates.push({ value: value!, halfWidth: truncation + Math.hypot(TO_98_PERCENT * floor, surprise) });
  }
  return { estimates, truncation };
}

/**
 * Beyond the window the law carries on below the rounding floor; the figure stands as it is. What a
 * difference there is off the law shows rounding at work, whatever the floor says.
 *
 * @param truncation of the window's last rung
 */
function beyondWindow(
  points: readonly LadderPoint[],
  window: Window,
  truncation: number,
  off: readonly number[],
): Estimate[] {
  const [before, last] = window.differences.slice(-2);
  const falls = 2 ** lowestExponent(window, Math.log2(before!.value / last!.value));
  return off.map((_, k) => {
    const { value, floor } = points[window.rungs[1] + 1 + k]!;
    const surprise = Math.max(...off.slice(0, k + 1));
    return {
      value: value!,
      halfWidth: truncation / falls ** (k + 1) + Math.hypot(TO_98_PERCENT * floor, surprise),
    };
  });
}
