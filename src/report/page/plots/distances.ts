import type { ClaimResult, Ladder } from "../../../result/result.js";

export interface Point {
  readonly n: number;
  /** More than 0, in the claim's unit. */
  readonly distance: number;
}

/**
 * How far each rung's figure is from the best value; without one, how far from the next rung's. Closer to the
 * best value than a third of its own half-width means nothing, and is drawn at that distance.
 */
export function distances({ rungs }: Ladder, best: ClaimResult["best"]): readonly Point[] {
  const least = (best.halfWidth ?? 0) / 3;
  return rungs.flatMap(({ stepsPerOrbit: n, figure }, k) => {
    const other = best.value ?? rungs[k + 1]?.figure ?? null;
    if (figure === null || other === null) return [];
    const distance = Math.max(Math.abs(figure - other), least);
    return distance > 0 ? [{ n, distance }] : [];
  });
}
