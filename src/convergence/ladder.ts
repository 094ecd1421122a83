import type { LadderShape } from "../result/result.js";
import { type LadderPoint, successiveDifferences } from "./differences.js";
import {
  boundIrregular,
  type Estimate,
  extrapolateFlat,
  extrapolateWindow,
  flatDifferences,
} from "./extrapolation.js";
import { ladderShape } from "./shape.js";
import { findWindow } from "./window.js";

/** What a ladder of halved steps says about its figure. */
export interface LadderAnalysis {
  readonly shape: LadderShape;
  /** Measured exponent of the error in the step, with its 95 % interval. */
  readonly order: number | null;
  readonly orderInterval: readonly [number, number] | null;
  /**
   * First and last rung over which the error law is known: the agreeing rungs of an asymptotic ladder, the
   * flat ones of a ladder at rounding.
   */
  readonly window: readonly [number, number] | null;
  /** The limit of vanishing step; null when the ladder does not bound it. */
  readonly limit: Estimate | null;
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
      const flat = flatDifferences(differences);
      return {
        ...unknown,
        window: [flat[0]!.rung, points.length - 1],
        limit: extrapolateFlat(points, differences),
      };
    }
    case "oscillating":
    case "irregular":
      return { ...unknown, limit: boundIrregular(points, differences) };
    default:
      return { ...unknown, limit: null };
  }
}
