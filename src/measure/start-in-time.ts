import type { Scenario } from "../claim/claim.js";
import type { StepLoop } from "../kernel/step-loop.js";
import { dot, type Motion, osculatingOrbit, periapsisSpeed } from "./elements.js";
import { INSTANT, radialTurn } from "./instant.js";
import { motionOfStart } from "./motion-of-start.js";
import { AT_APSIS, parameterValues, type Started, type StartProblem, type SystemShape } from "./started.js";
import { shootForApoapsis } from "./turning-points.js";

/** An orbit inclined by less has no node to measure from that its own digits could tell. */
const FLAT = 1e-6;
/** Steps of a shot to rp/v, a radian of the circle at periapsis. */
const STEPS_PER_RADIAN = 32;

/** The start of a scenario in time: its state, osculating orbit, and how its apsidal angle is measured. */
export function startInTime(
  scenario: Omit<Scenario, "precise">,
  system: SystemShape,
  fineLoop: () => StepLoop,
): Started | StartProblem {
  const { equations, start } = scenario;
  const parameters = parameterValues(scenario, system);
  if ("problem" in parameters) return parameters;
  const GM = scenario.parameters.GM ?? equations.parameters.GM?.default ?? null;
  const stateOf = ({ position, velocity }: Motion): number[] => {
    const variables = Object.entries(equations.coordinates).flatMap(([name, { rate }], i) => [
      [name, position[i]!] as const,
      [rate, velocity[i]!] as const,
    ]);
    const byName = new Map(variables);
    return system.states.map((name) => byName.get(name)!);
  };
  const motion = motionOfStart(scenario, GM, (motionAt, periapsis, apoapsis) => {
    const guess = periapsisSpeed(GM!, periapsis, apoapsis);
    const shot = (speed: number) => ({
      state: stateOf(motionAt(speed)),
      parameters: Float64Array.from(parameters),
    });
    const step = periapsis / guess / STEPS_PER_RADIAN;
    return shootForApoapsis(fineLoop(), "time", shot, guess, apoapsis, step);
  });
  if ("problem" in motion) return motion;

  const { position: x, velocity: v } = motion;
  const r = Math.hypot(...x);
  const speed = Math.hypot(...v);
  if (!(r > 0)) return { problem: "the starting position is the centre of attraction itself" };
  if (!(speed > 0)) return { problem: "the start is at rest: an orbit needs a velocity across its radius" };
  const state = stateOf(motion);
  const central = GM ?? centralGM(fineLoop(), state, parameters, r, speed);
  if (!(central > 0)) return { problem: "nothing pulls the start towards the centre: it has no orbit" };
  const exactly = start.kind === "elements" && !start.turningPoints;
  // Elements say a and e themselves; reading them back from the state would only round them.
  const { semiMajorAxis: a, eccentricity: e } = exactly
    ? {
        semiMajorAxis: (start.periapsis + start.apoapsis) / 2,
        eccentricity: (start.apoapsis - start.periapsis) / (start.apoapsis + start.periapsis),
      }
    : osculatingOrbit(motion, central);
  if (!(a > 0 && Number.isFinite(a) && e < 1)) {
    return {
      problem:
        "the start is unbound (its Newtonian energy is not negative): there is no period to count steps and orbits by",
    };
  }
  const normal = [x[1] * v[2] - x[2] * v[1], x[2] * v[0] - x[0] * v[2], x[0] * v[1] - x[1] * v[0]];
  const flat = Math.hypot(normal[0]!, normal[1]!) < FLAT * Math.hypot(...normal);
  return {
    state,
    parameters,
    atApsis: exactly ? start.trueAnomaly === 0 : Math.abs(dot(x, v)) <= AT_APSIS * r * speed,
    instant: (INSTANT * r) / speed,
    period: 2 * Math.PI * Math.sqrt(a ** 3 / central),
    semiMajorAxis: a,
    eccentricity: e,
    apsidalAngle: flat ? "longitude" : "from-node",
  };
}

/**
 * Where the equations have no GM: the one that would pull as they do at the start. The radial rate changes
 * by v² - GM/r in the unit of time.
 */
function centralGM(
  loop: StepLoop,
  state: readonly number[],
  parameters: readonly number[],
  r: number,
  speed: number,
): number {
  const instant = (INSTANT * r) / speed;
  return r * (speed * speed - radialTurn(loop, state, parameters, instant) / (2 * instant));
}
