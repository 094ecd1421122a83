import type { StepLoop } from "../kernel/step-loop.js";
import type { PreparedScenario } from "./run.js";
import { ioAt, type WalkEnd, walk } from "./stepping.js";

/**
 * Where the states of a ladder are compared, in orbits. Early, so that the error is still that of the
 * method and not yet a whole phase; and away from both apsides, since at a whole orbit or a half the leading
 * error of a method that is conjugate to a better one (symplectic-euler to leapfrog) comes back to nothing.
 */
export const EARLY_ORBITS = 1.3;

/** The whole number of coarsest steps nearest to the early time: every halved rung meets it exactly. */
export function earlySteps(coarsestStep: number, period: number): number {
  return Math.max(1, Math.round((EARLY_ORBITS * period) / coarsestStep));
}

export type EarlyState =
  | { readonly status: "done"; readonly state: readonly number[] }
  | { readonly status: Exclude<WalkEnd, "done"> };

/**
 * The state after whole steps, passages or not.
 *
 * @param steps earlySteps(coarsest, period) times the number of these steps in a coarsest one
 */
export function stateAfter(
  loop: StepLoop,
  scenario: PreparedScenario,
  parameters: readonly number[],
  step: number,
  steps: number,
): EarlyState {
  const io = ioAt(loop, scenario.state);
  const status = walk(loop, io, Float64Array.from(parameters), step, steps);
  if (status !== "done") return { status };
  return { status, state: Array.from(io.subarray(0, loop.dimension)) };
}

/**
 * Relative distance of two states: coordinates as parts of the semi-major axis a and rates as parts of the
 * mean speed 2πa/T, added in squares; in angle form u and u' as parts of 1/(a (1 - e²)).
 */
export function stateDistance(
  scenario: PreparedScenario,
  one: readonly number[],
  other: readonly number[],
): number {
  const { semiMajorAxis: a, eccentricity: e, period, apsidalAngle } = scenario;
  const half = one.length / 2;
  const length = apsidalAngle === "polar" ? 1 / (a * (1 - e * e)) : a;
  const rate = apsidalAngle === "polar" ? length : (2 * Math.PI * a) / period;
  return Math.hypot(...one.map((value, i) => (value - other[i]!) / (i < half ? length : rate)));
}
