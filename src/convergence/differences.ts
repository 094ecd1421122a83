/** One rung as the analysis sees it; both null when the rung gave no figure. */
export interface LadderPoint {
  /** Figure, in any one unit. */
  readonly value: number | null;
  /** 95 % half-width of what rounding does to it, in the same unit. */
  readonly floor: number;
}

/** Difference of two successive rungs, each step half the last. */
export interface Difference {
  /** Index of the coarser rung. */
  readonly rung: number;
  /** Coarser value less finer. */
  readonly value: number;
  /** 95 % half-width of its rounding. */
  readonly noise: number;
  /** Stands clear of the rounding floor. */
  readonly clear: boolean;
}

/** At 4 times its own 95 % noise a difference moves a local exponent by at most log2(1.25 / 0.75) = 0.7. */
const CLEAR_OF_NOISE = 4;

export const isClear = (difference: number, noise: number): boolean =>
  Math.abs(difference) > CLEAR_OF_NOISE * noise;

/**
 * Differences of the rungs at the fine end that all gave a figure: a rung without one ends the ladder,
 * since nothing coarser can be compared across the gap.
 */
export function successiveDifferences(points: readonly LadderPoint[]): Difference[] {
  const differences: Difference[] = [];
  for (let k = points.length - 2; k >= 0; k--) {
    const coarse = points[k]!;
    const fine = points[k + 1]!;
    if (coarse.value === null || fine.value === null) break;
    const value = coarse.value - fine.value;
    const noise = Math.hypot(coarse.floor, fine.floor);
    differences.unshift({ rung: k, value, noise, clear: isClear(value, noise) });
  }
  return differences;
}

/** log2 of the ratio of two successive differences, and the 95 % half-width that rounding gives it. */
export interface Exponent {
  /** Index of the coarsest of the three rungs. */
  readonly rung: number;
  readonly value: number;
  readonly noise: number;
}

/** Null where the differences have opposite signs or one of them does not stand clear of rounding. */
export function localExponent(coarse: Difference, fine: Difference): Exponent | null {
  const ratio = coarse.value / fine.value;
  if (!coarse.clear || !fine.clear || !(ratio > 0)) return null;
  return {
    rung: coarse.rung,
    value: Math.log2(ratio),
    noise: Math.hypot(coarse.noise / coarse.value, fine.noise / fine.value) / Math.LN2,
  };
}
