import type { StepLoop } from "../kernel/step-loop.js";
import { ioAt, radialRateAt } from "./stepping.js";

/** Step of a look at an instant, as a part of the time scale of the motion; its error goes as the square. */
export const INSTANT = 1e-4;

/**
 * Change of the radial rate over an instant round a state, from one step of a method forwards and one
 * backwards. At an apsis it is positive where the radius is smallest: where the motion turns outward.
 *
 * @param loop of high order
 * @param step a small part of r/v, or of a radian
 */
export function radialTurn(
  loop: StepLoop,
  state: readonly number[],
  parameters: readonly number[],
  step: number,
): number {
  const values = Float64Array.from(parameters);
  const rateAfter = (length: number): number => {
    const io = ioAt(loop, state);
    loop.advance(io, values, length, 1);
    return io[radialRateAt(loop)]!;
  };
  return rateAfter(step) - rateAfter(-step);
}
