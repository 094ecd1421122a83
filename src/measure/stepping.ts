import type { StepLoop } from "../kernel/step-loop.js";

/** Places in the io array of a step loop, after the state and the state before the last step. */
export const radialRateAt = (loop: StepLoop): number => 2 * loop.dimension;
export const evaluationsAt = (loop: StepLoop): number => 2 * loop.dimension + 1;
export const unconvergedAt = (loop: StepLoop): number => 2 * loop.dimension + 2;

/** The equations' independent variable: time, or the polar angle of a state (u, u'). */
export type Form = "time" | "angle";

/**
 * x·v, or -u' in angle form: negative while the orbit comes in. Summed in the order of the coordinates, as
 * the step loops do.
 *
 * @param at where the state begins in `values`
 */
export function radialRate(form: Form, values: ArrayLike<number>, dimension: number, at = 0): number {
  if (form === "angle") return -values[at + 1]!;
  const half = dimension / 2;
  let rate = values[at]! * values[at + half]!;
  for (let i = 1; i < half; i++) rate += values[at + i]! * values[at + half + i]!;
  return rate;
}

/** Distance from the centre, m. */
export function distance(form: Form, values: ArrayLike<number>, dimension: number): number {
  if (form === "angle") return 1 / values[0]!;
  let square = 0;
  for (let i = 0; i < dimension / 2; i++) square += values[i]! * values[i]!;
  return Math.sqrt(square);
}

export function allFinite(values: ArrayLike<number>, dimension: number): boolean {
  for (let i = 0; i < dimension; i++) if (!Number.isFinite(values[i])) return false;
  return true;
}

/** What stopped a walk of whole steps before its end. */
export type WalkEnd = "done" | "non-finite" | "unconverged";

/** A fresh io array at a state, its radial rate set so that no passage is seen at the start itself. */
export function ioAt(loop: StepLoop, state: ArrayLike<number>): Float64Array {
  const io = new Float64Array(loop.ioLength);
  for (let i = 0; i < loop.dimension; i++) io[i] = state[i]!;
  return io;
}

/**
 * Takes `steps` whole steps, going on after every passage.
 *
 * @param atPassage told the steps taken so far, after the first step beyond each passage
 */
export function walk(
  loop: StepLoop,
  io: Float64Array,
  parameters: Float64Array,
  step: number,
  steps: number,
  atPassage?: (taken: number) => void,
): WalkEnd {
  for (let taken = 0; taken < steps; ) {
    taken += loop.advance(io, parameters, step, steps - taken);
    if (io[unconvergedAt(loop)] !== 0) return "unconverged";
    if (!allFinite(io, loop.dimension)) return "non-finite";
    if (taken < steps) atPassage?.(taken);
  }
  return "done";
}
