import type { LadderPoint } from "../convergence/differences.js";
import type { Reading } from "./job.js";

/**
 * What the partial steps at the passages make of each rung's figure, of one run. A partial step's own error goes as
 * its length to the power p + 1 whatever the step: where the orbits end on nearly whole steps, as they do when the
 * apsis hardly turns and the step divides the period, the same short partial steps end them on every rung, and what
 * they add stays the same however often the step is halved, until it is shorter than they. A ladder cannot show it,
 * and no extrapolation takes it away. It is a whole step's part in the error of the rung, times that power of the
 * part of a step that is taken.
 *
 * @param raw figures of the rungs, coarsest first
 * @param readings of the runs that gave them
 * @param steps of the rungs, and steps an orbit
 * @param order p of the method
 */
export function passageShares(
  raw: readonly LadderPoint[],
  readings: readonly (Reading | null)[],
  rungs: readonly { readonly step: number; readonly perOrbit: number }[],
  order: number,
): number[] {
  const change = (k: number): number | null => {
    const [coarse, fine] = [raw[k]?.value ?? null, raw[k + 1]?.value ?? null];
    return coarse === null || fine === null ? null : Math.abs(coarse - fine);
  };
  return raw.map((_, k) => {
    // The error of a rung is at most twice its change to the next; of the last, what halving leaves of the change before.
    const error = change(k) ?? (change(k - 1) ?? 0) / 2;
    const { step, perOrbit } = rungs[k]!;
    return (error / perOrbit) * partOfStep(readings[k] ?? null, step) ** (order + 1);
  });
}

/** The longest distance of a passage from the nearest whole step, as a part of a step: a half at the most. */
function partOfStep(reading: Reading | null, step: number): number {
  return Math.max(
    0,
    ...(reading?.times ?? []).map((time) => Math.abs(time / step - Math.round(time / step))),
  );
}

/** The ladder with its shares added to its floors: what does not extrapolate, whatever it comes from. */
export const withShares = (
  points: readonly LadderPoint[],
  ...shares: readonly (readonly number[])[]
): LadderPoint[] =>
  points.map(({ value, floor }, k) => ({ value, floor: Math.hypot(floor, ...shares.map((all) => all[k]!)) }));
