import type { LadderShape } from "../result/result.js";
import type { Difference } from "./differences.js";
import type { Window } from "./window.js";

/**
 * Names what the differences of a ladder do.
 *
 * - asymptotic: a window was found
 * - at-rounding: the finest differences are all rounding
 * - divergent: the differences clear of rounding grow with refinement
 * - stalled: they stop shrinking, at less than a factor of two over two halvings (the lowest order, 1, gives four)
 * - oscillating: they shrink with alternating sign
 * - irregular: they shrink, but with no one exponent
 * - too-short: fewer than three rungs gave a figure
 */
export function ladderShape(differences: readonly Difference[], window: Window | null): LadderShape {
  if (window !== null) return "asymptotic";
  if (differences.length < 2) return "too-short";
  if (differences.slice(-2).every((d) => !d.clear)) return "at-rounding";
  const lastThree = differences.filter((d) => d.clear).slice(-3);
  if (lastThree.length < 3) return "irregular";
  const [a, b, c] = lastThree.map((d) => Math.abs(d.value)) as [number, number, number];
  if (c > 2 * a || (c > b && b > a)) return "divergent";
  if (c > a / 2) return "stalled";
  const [x, y, z] = lastThree.map((d) => Math.sign(d.value));
  return x !== y && y !== z ? "oscillating" : "irregular";
}
