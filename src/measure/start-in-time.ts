import type { Scenario } from "../claim/claim.js";
import type { StepLoop } from "../kernel/step-loop.js";
import {
  dot,
  type Motion,
  motionAtPeriapsis,
  motionFromElements,
  type OsculatingOrbit,
  osculatingOrbit,
  periapsisSpeed,
  problemOfElements,
} from "./elements.js";
import { parameterValues, type Started, type StartProblem, type SystemShape } from "./started.js";
import { ioAt } from "./stepping.js";
import { shootForApoapsis } from "./turning-points.js";

/** x·v at a periapsis given in rounded numbers, as a part of |x||v|. */
const AT_APSIS = 1e-12;
/** An orbit inclined by less has no node to measure from that its own digits could tell. */
const FLAT = 1e-6;
/** Steps of a shot to rp/v, a radian of the circle at periapsis. */
const STEPS_PER_RADIAN = 32;
/** Time to either side over which an acceleration is read, in r/v: its error goes as the square of this. */
const INSTANT = 1e-4;

/** The start of a scenario in time: its state, osculating orbit, and how its apsidal angle is measured. */
export function startInTime(
  scenario: Scenario,
  system: SystemShape,
  fineLoop: () => StepLoop,
): Started | StartProblem {
  const { equations, start } = scenario;
  const parameters = parameterValues(scenario, system);
  if ("problem" in parameters) return parameters;
  const GM = scenario.parameters.GM ?? equations.parameters.GM?.default;
  const stateOf = (motion: Motion): number[] => {
    const byName: Record<string, number> = {};
    for (const [i, [name, { rate }]] of Object.entries(equations.coordinates).entries()) {
      byName[name] = motion.position[i]!;
      byName[rate] = motion.velocity[i]!;
    }
    return system.variables.map((name) => byName[name]!);
  };

  let motion: Motion;
  let orbit: OsculatingOrbit | null = null;
  if (start.kind === "elements") {
    if (GM === undefined) {
      return {
        problem: `${equations.name} has no parameter GM, which osculating elements need: give the start as a state`,
      };
    }
    const problem = problemOfElements(start);
    if (problem !== null) return { problem };
    if (start.turningPoints) {
      const guess = periapsisSpeed(GM, start.periapsis, start.apoapsis);
      const speed = shootForApoapsis(
        fineLoop(),
        "time",
        (value) => ({
          state: stateOf(motionAtPeriapsis(start, value)),
          parameters: Float64Array.from(parameters),
        }),
        guess,
        start.apoapsis,
        start.periapsis / guess / STEPS_PER_RADIAN,
      );
      if (speed === null) {
        return {
          problem: `no orbit of ${equations.name} turns at both the periapsis and the apoapsis given`,
        };
      }
      motion = motionAtPeriapsis(start, speed);
    } else {
      motion = motionFromElements(start, GM);
      const { periapsis: rp, apoapsis: ra } = start;
      orbit = { semiMajorAxis: (rp + ra) / 2, eccentricity: (ra - rp) / (ra + rp) };
    }
  } else {
    const read = motionFromState(scenario);
    if ("problem" in read) return read;
    motion = read;
  }

  const { position: x, velocity: v } = motion;
  const r = Math.hypot(...x);
  const speed = Math.hypot(...v);
  if (!(r > 0)) return { problem: "the starting position is the centre of attraction itself" };
  if (!(speed > 0)) return { problem: "the start is at rest: an orbit needs a velocity across its radius" };
  const central = GM ?? centralGM(fineLoop(), stateOf(motion), Float64Array.from(parameters), r, speed);
  orbit ??= osculatingOrbit(motion, central);
  const { semiMajorAxis: a, eccentricity: e } = orbit;
  if (!(central > 0)) return { problem: "nothing pulls the start towards the centre: it has no orbit" };
  if (!(a > 0 && Number.isFinite(a) && e < 1)) {
    return {
      problem:
        "the start is unbound (its Newtonian energy is not negative): there is no period to count steps and orbits by",
    };
  }
  const radial = dot(x, v);
  const outward = speed * speed * r > central;
  const normal = [x[1] * v[2] - x[2] * v[1], x[2] * v[0] - x[0] * v[2], x[0] * v[1] - x[1] * v[0]];
  const flat = Math.hypot(normal[0]!, normal[1]!) < FLAT * Math.hypot(...normal);
  return {
    state: stateOf(motion),
    parameters,
    startsAtPeriapsis:
      start.kind === "elements"
        ? start.trueAnomaly === 0
        : Math.abs(radial) <= AT_APSIS * r * speed && outward,
    period: 2 * Math.PI * Math.sqrt(a ** 3 / central),
    semiMajorAxis: a,
    eccentricity: e,
    apsidalAngle: flat ? "longitude" : "from-node",
  };
}

/** The equations' own variables; a third dimension that is left out is 0. */
function motionFromState({ equations, start }: Scenario): Motion | StartProblem {
  const position: [number, number, number] = [0, 0, 0];
  const velocity: [number, number, number] = [0, 0, 0];
  if (start.kind !== "state") throw new TypeError("not a state");
  for (const [i, [name, { rate }]] of Object.entries(equations.coordinates).entries()) {
    for (const [variable, target] of [
      [name, position],
      [rate, velocity],
    ] as const) {
      const value = start.values[variable] ?? (i === 2 ? 0 : undefined);
      if (value === undefined) return { problem: `the starting state lacks ${variable}` };
      target[i] = value;
    }
  }
  return { position, velocity };
}

/**
 * Where the equations have no GM: the one that would pull as they do at the start, -r² times the radial
 * acceleration, which is read off a short run to both sides.
 */
function centralGM(
  loop: StepLoop,
  state: readonly number[],
  parameters: Float64Array,
  r: number,
  speed: number,
): number {
  const half = loop.dimension / 2;
  const instant = (INSTANT * r) / speed;
  const radialVelocity = (step: number): number => {
    const io = ioAt(loop, state);
    loop.advance(io, parameters, step, 1);
    return dot(state.slice(0, half), Array.from(io.subarray(half, loop.dimension))) / r;
  };
  return (-r * r * (radialVelocity(instant) - radialVelocity(-instant))) / (2 * instant);
}
