import { fitLine } from "../statistics/line.js";
import { studentT95 } from "../statistics/student-t.js";
import { type Difference, localExponent } from "./differences.js";

/** The order at which the state itself converges at an early time. */
export interface StateOrder {
  readonly order: number;
  /** 95 %, Student t; null from two differences, which leave no degree of freedom. */
  readonly interval: readonly [number, number] | null;
  /** First and last rung that it rests on. */
  readonly rungs: readonly [number, number];
}

/** State exponents wander before they settle: only the finest few differences count. */
const FINEST = 4;

/** How far the next term of the expansion may bend log2 of a difference: it fades by half a rung or faster. */
const nextTerm = (rungsAbove: number): number => 2 ** (rungsAbove - FINEST);

/**
 * Fits the order on the finest rungs above the rounding floor.
 *
 * @param distances distance of each rung's early state from the next finer one's, coarsest first, with its noise
 * @returns null when no two successive distances stand clear of rounding
 */
export function stateOrder(distances: readonly Difference[]): StateOrder | null {
  let last = -1;
  for (let k = distances.length - 1; k > 0 && last < 0; k--) {
    if (localExponent(distances[k - 1]!, distances[k]!) !== null) last = k;
  }
  if (last < 0) return null;
  const used: Difference[] = [distances[last]!];
  for (let k = last - 1; k >= 0 && used.length < FINEST && distances[k]!.clear; k--)
    used.unshift(distances[k]!);
  const line = fitLine(
    used.map((d) => -d.rung),
    used.map((d) => Math.log2(d.value)),
    used.map((d) => 1 / (nextTerm(used.at(-1)!.rung - d.rung) ** 2 + (d.noise / d.value / Math.LN2) ** 2)),
  )!;
  const half = line.slopeError === null ? null : studentT95(line.degrees) * line.slopeError;
  return {
    order: line.slope,
    interval: half === null ? null : [line.slope - half, line.slope + half],
    rungs: [used[0]!.rung, used.at(-1)!.rung + 1],
  };
}
