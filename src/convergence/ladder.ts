import type { LadderShape } from "../result/result.js";
import { boundFlat, boundIrregular, flatDifferences } from "./bounds.js";
import { type Difference, type LadderPoint, successiveDifferences } from "./differences.js";
import type { Estimate } from "./estimators/estimator.js";
import { extrapolateWindow } from "./extrapolation.js";
import { ladderShape } from "./shape.js";
import { findWindow } from "./window.js";

/** What a ladder of halved steps says about its figure. */
export interface LadderAnalysis {
  readonly shape: LadderShape;
  /** Measured exponent of the error in the step, with its 95 % interval. */
  readonly order: number | null;
  readonly orderInterval: readonly [number, number] | null;
  /**
   * First and last rung over which the ladder is known to converge: the agreeing rungs of an asymptotic
   * ladder; of one at rounding the flat rungs and those that sink to them.
   */
  readonly window: readonly [number, number] | null;
  /** The limit of vanishing step; null when the ladder does not bound it. */
  readonly limit: Estimate | null;
}

/**
 * The coarsest rung from which every halving shrinks the difference to a half or less, the slowest that any
 * order does, until all is rounding. A figure of high order often gets there before its exponents settle.
 */
function firstSinking(differences: readonly Difference[]): number {
  let first = differences.length - flatDifferences(differences).length;
  while (first > 0) {
    const [coarse, fine] = [differences[first - 1]!, differences[first]!];
    if (!coarse.clear || Math.abs(coarse.value) < 2 * Math.abs(fine.value)) break;
    first--;
  }
  return differences[first]!.rung;
}

/**
 * Judges one ladder.
 *
 * @param rungs one a rung, coarsest first, each step half the last
 */
export function analyseLadder(rungs: readonly LadderPoint[]): LadderAnalysis {
  // Finer rungs that were not reached say nothing against the rest.
  const points = rungs.slice(0, rungs.findLastIndex((rung) => rung.value !== null) + 1);
  const differences = successiveDifferences(points);
  const window = findWindow(differences);
  const shape = ladderShape(differences, window);
  if (window !== null) {
    return {
      shape,
      order: window.exponent,
      orderInterval: window.interval,
      window: window.rungs,
      limit: extrapolateWindow(points, window),
    };
  }
  const unknown = { shape, order: null, orderInterval: null, window: null };
  switch (shape) {
    case "at-rounding": {
      return {
        ...unknown,
        window: [firstSinking(differences), points.length - 1],
        limit: boundFlat(points, differences),
      };
    }
    case "oscillating":
    case "irregular":
      return { ...unknown, limit: boundIrregular(points, differences) };
    default:
      return { ...unknown, limit: null };
  }
}
