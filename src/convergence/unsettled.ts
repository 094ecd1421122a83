import type { Estimate } from "./estimators/estimator.js";
import type { Column } from "./extrapolants.js";
import { SAFETY_IN_WINDOW, SAFETY_OUTSIDE, TO_98_PERCENT } from "./safety.js";
import { remainderOfTwoPowers } from "./two-powers.js";
import { lowestExponent, type Window } from "./window.js";

/** From here on Student's t is below 3 (2.78, of four degrees), and the exponent's interval no longer a guess. */
const FEWEST_DIFFERENCES = 6;

/**
 * The finest extrapolant of a long window, though its own convergence does not follow one power.
 *
 * How far off it may be is the sum of three parts: its last steps, as though they shrank by no more than the power
 * just removed; what the correction changes between that power and the lower end of the exponent's interval; and
 * what it changes where a lower power takes over.
 *
 * @returns null for a window that is too short, and where the last step of the extrapolants is not smaller than
 * the power just removed would have left it: they are no better than their rungs then
 */
export function unsettledEstimate(window: Window, { power, points }: Column): Estimate | null {
  const { differences, rungs } = window;
  if (differences.length < FEWEST_DIFFERENCES) return null;
  const finest = rungs[1] - rungs[0] - 1;
  const steps = [0, 1, 2].map((k) => Math.abs(points[finest - k - 1]!.value! - points[finest - k]!.value!));
  if (steps[0]! > steps[1]! / 2 ** power) return null;
  // One step alone may be small by chance. The next power is one higher at the least.
  const step = Math.max(...steps.map((size, k) => size / 2 ** (k * (power + 1))));
  const [a, b, c] = differences.slice(-3).map(({ value }) => value) as [number, number, number];
  const correctionAt = (exponent: number): number => Math.abs(c) / (2 ** exponent - 1);
  const correction = correctionAt(power);
  const lower = Math.abs(remainderOfTwoPowers(a, b, c));
  const truncation =
    (SAFETY_OUTSIDE * step) / (2 ** power - 1) +
    SAFETY_IN_WINDOW * (correctionAt(lowestExponent(window, power)) - correction) +
    SAFETY_IN_WINDOW * (lower === 0 ? 0 : Math.abs(lower - correction));
  const { value, floor } = points[finest]!;
  return { value: value!, halfWidth: truncation + TO_98_PERCENT * floor };
}
