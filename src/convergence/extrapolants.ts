import type { LadderPoint } from "./differences.js";
import type { Window } from "./window.js";

/** The extrapolants of a ladder, one rung fewer, as a ladder of their own. */
export interface Column {
  /** The power that they are free of. */
  readonly power: number;
  readonly points: readonly LadderPoint[];
}

/** Exponents of a window agree within this, and so do they with the power that they stand for. */
export const NEAR_WHOLE = 0.25;

/**
 * The extrapolants T_k = Q_(k+1) - (Q_k - Q_(k+1)) / (2^p - 1) from the first rung of the window on.
 * The errors of one-step methods expand in whole powers of the step (E. Hairer, S. P. Nørsett and G. Wanner,
 * Solving Ordinary Differential Equations I (1993), II.8): p is the whole number next to the finest exponent.
 *
 * @returns null where that is not near a whole number
 */
export function nextColumn(ladder: readonly LadderPoint[], window: Window): Column | null {
  const [before, last] = window.differences.slice(-2);
  const local = Math.log2(before!.value / last!.value);
  const power = Math.round(local);
  if (power < 1 || Math.abs(local - power) > NEAR_WHOLE) return null;
  const growth = 2 ** power - 1;
  const points: LadderPoint[] = [];
  for (let k = window.rungs[0]; k + 1 < ladder.length; k++) {
    const [coarse, fine] = [ladder[k]!, ladder[k + 1]!];
    points.push({
      value: fine.value! - (coarse.value! - fine.value!) / growth,
      floor: Math.hypot(fine.floor * (1 + 1 / growth), coarse.floor / growth),
    });
  }
  return { power, points };
}
