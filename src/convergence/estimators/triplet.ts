import type { LadderPoint } from "../differences.js";

/** What the three finest rungs say, in the notation of the published procedures: 1 is the finest. */
export interface Triplet {
  readonly finest: number;
  readonly floor: number;
  /** φ2 - φ1 and φ3 - φ2. */
  readonly e21: number;
  readonly e32: number;
  /** Apparent order ln|e32 / e21| / ln 2, for a refinement by two throughout. */
  readonly order: number;
}

/**
 * Null without three figures at the fine end, where a difference vanishes (the procedures are not defined
 * there) and where they grow with refinement.
 */
export function finestTriplet(points: readonly LadderPoint[]): Triplet | null {
  const [third, second, first] = points.slice(-3);
  if (first === undefined || third!.value === null || second!.value === null || first.value === null)
    return null;
  const e21 = second!.value - first.value;
  const e32 = third!.value - second!.value;
  const order = Math.log2(Math.abs(e32 / e21));
  if (!(order > 0 && order < Infinity)) return null;
  return { finest: first.value, floor: first.floor, e21, e32, order };
}

/** Richardson's estimate of the error of the finest rung, e21 / (2^p - 1). */
export const richardsonError = ({ e21, order }: Triplet): number => e21 / (2 ** order - 1);
