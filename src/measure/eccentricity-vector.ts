import type { StepLoop } from "../kernel/step-loop.js";
import { wrap } from "./apsidal-angle.js";
import { nominalLength } from "./limits.js";
import type { PreparedScenario } from "./run.js";
import { ioAt, walk } from "./stepping.js";

/** A second reading of the advance, which locates no passage and fits no line. */
export interface EccentricityDrift {
  /** rad an orbit. */
  readonly perOrbit: number;
  /** What the swing of the osculating vector within an orbit can add or take away: all of it, once. */
  readonly halfWidth: number;
}

/**
 * Direction of the osculating Laplace-Runge-Lenz (eccentricity) vector e = v × L / GM - r/|r|, as an angle
 * in the orbit: from the x axis in the plane of the motion at the start. In angle form it is
 * φ - atan2(-u', u - K) with K = 1/p, since u = K (1 + e cos(φ - ω)).
 */
function direction(frame: Frame, state: ArrayLike<number>, angle: number): number {
  if (frame.form === "angle") return wrap(angle - Math.atan2(-state[1]!, state[0]! - frame.inverseParameter));
  const half = frame.half;
  let r2 = 0;
  let v2 = 0;
  let xv = 0;
  for (let i = 0; i < half; i++) {
    r2 += state[i]! ** 2;
    v2 += state[half + i]! ** 2;
    xv += state[i]! * state[half + i]!;
  }
  let along = 0;
  let across = 0;
  for (let i = 0; i < half; i++) {
    const component = (v2 - frame.GM / Math.sqrt(r2)) * state[i]! - xv * state[half + i]!;
    along += component * frame.along[i]!;
    across += component * frame.across[i]!;
  }
  return Math.atan2(across, along);
}

interface Frame {
  readonly form: "time" | "angle";
  readonly half: number;
  readonly GM: number;
  readonly inverseParameter: number;
  /** Unit vectors in the plane of the starting motion: along the starting position, and a quarter turn on. */
  readonly along: readonly number[];
  readonly across: readonly number[];
}

function frameOf(scenario: PreparedScenario, dimension: number): Frame {
  const { semiMajorAxis: a, eccentricity: e, period, state } = scenario;
  const half = dimension / 2;
  const x = state.slice(0, half);
  const v = state.slice(half, dimension);
  const dot = (p: readonly number[], q: readonly number[]): number =>
    p.reduce((sum, value, i) => sum + value * q[i]!, 0);
  const unit = (p: readonly number[]): number[] => p.map((value) => value / Math.sqrt(dot(p, p)));
  const along = unit(x);
  return {
    form: scenario.apsidalAngle === "polar" ? "angle" : "time",
    half,
    GM: (4 * Math.PI ** 2 * a ** 3) / period ** 2,
    inverseParameter: 1 / (a * (1 - e * e)),
    along,
    across: unit(v.map((value, i) => value - dot(v, along) * along[i]!)),
  };
}

/**
 * Mean drift of the direction of the osculating Newtonian eccentricity vector: end less start, over the
 * whole steps nearest to the span. What the equations add to Newton's makes the vector swing within each
 * orbit; the swing is measured over the first orbit and stands in the half-width.
 *
 * @param orbit length of the orbit that the figure is for: the run's own radial period, where it is known
 * @returns null where the run does not reach the end
 */
export function eccentricityDrift(
  loop: StepLoop,
  scenario: PreparedScenario,
  parameters: readonly number[],
  step: number,
  orbit: number = scenario.period,
): EccentricityDrift | null {
  const frame = frameOf(scenario, loop.dimension);
  const values = Float64Array.from(parameters);
  const io = ioAt(loop, scenario.state);
  const steps = Math.round(nominalLength(scenario) / step);
  const orbits = (steps * step) / orbit;
  const oneOrbit = Math.min(steps, Math.round(scenario.period / step));
  let last = direction(frame, io, 0);
  let total = 0;
  let least = 0;
  let most = 0;
  for (let taken = 1; taken <= oneOrbit; taken++) {
    if (walk(loop, io, values, step, 1) !== "done") return null;
    const now = direction(frame, io, taken * step);
    total += wrap(now - last);
    last = now;
    least = Math.min(least, total);
    most = Math.max(most, total);
  }
  // From then on an orbit at a time: each change is the one nearest to the change before it.
  let change = total;
  for (let taken = oneOrbit; taken < steps; ) {
    const next = Math.min(oneOrbit, steps - taken);
    if (walk(loop, io, values, step, next) !== "done") return null;
    taken += next;
    const now = direction(frame, io, taken * step);
    change += wrap(now - last - change);
    total += change;
    last = now;
  }
  return { perOrbit: total / orbits, halfWidth: (most - least) / orbits };
}
