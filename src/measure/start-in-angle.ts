import type { Scenario } from "../claim/claim.js";
import type { StepLoop } from "../kernel/step-loop.js";
import { problemOfElements } from "./elements.js";
import { INSTANT } from "./instant.js";
import { noOrbitBetween } from "./motion-of-start.js";
import { cosineAndSine } from "./orientation.js";
import { AT_APSIS, parameterValues, type Started, type StartProblem, type SystemShape } from "./started.js";
import { shootForApoapsis } from "./turning-points.js";

/** Steps of a shot to a turn. */
const STEPS_PER_TURN = 512;

/**
 * The start of a scenario in angle form: u = 1/r, u' and K = GM/h², the inverse of the osculating
 * semi-latus rectum p. From elements u = (1 + e cos ν)/p and u' = -e sin ν / p, with p = rp (1 + e).
 */
export function startInAngle(
  scenario: Omit<Scenario, "precise">,
  system: SystemShape,
  fineLoop: () => StepLoop,
): Started | StartProblem {
  const { equations, start } = scenario;
  const inverse = Object.keys(equations.parameters).find(
    (name) => equations.parameters[name]!.fromStart === "inverse-semi-latus-rectum",
  );
  const withK = (K: number): number[] | StartProblem =>
    parameterValues(scenario, system, inverse === undefined ? {} : { [inverse]: K });
  const finish = (
    u: number,
    w: number,
    K: number,
    orbit: { readonly semiMajorAxis: number; readonly eccentricity: number },
    atApsis: boolean,
  ): Started | StartProblem => {
    const parameters = withK(K);
    if ("problem" in parameters) return parameters;
    return {
      state: [u, w],
      parameters,
      atApsis,
      instant: INSTANT,
      period: 2 * Math.PI,
      ...orbit,
      apsidalAngle: "polar",
    };
  };

  if (start.kind === "state") {
    const [u, w] = system.states.map((name) => start.values[name]);
    const K = inverse === undefined ? undefined : (start.values[inverse] ?? scenario.parameters[inverse]);
    if (u === undefined || w === undefined || K === undefined) {
      const wanted = [...system.states, inverse].join(", ");
      return { problem: `a starting state of ${equations.name} needs all of ${wanted}` };
    }
    const orbit = osculating(u, w, K);
    if (!(u > 0 && K > 0 && orbit.eccentricity < 1)) return { problem: UNBOUND };
    return finish(u, w, K, orbit, Math.abs(w) <= AT_APSIS * u);
  }

  if (start.inclination !== 0 || start.node !== 0 || start.argumentOfPeriapsis !== 0) {
    return {
      problem:
        "equations in angle form know no orientation: leave out inclination, node and argument of periapsis",
    };
  }
  const problem = problemOfElements(start);
  if (problem !== null) return { problem };
  const { periapsis: rp, apoapsis: ra } = start;
  const e = (ra - rp) / (ra + rp);
  const newtonian = (rp + ra) / (2 * rp * ra);
  const geometric = { semiMajorAxis: (rp + ra) / 2, eccentricity: e };
  if (start.turningPoints) {
    const K = shootForApoapsis(
      fineLoop(),
      "angle",
      (value) => ({ state: [1 / rp, 0], parameters: Float64Array.from(withK(value) as number[]) }),
      newtonian,
      ra,
      (2 * Math.PI) / STEPS_PER_TURN,
    );
    if (K === null) {
      return { problem: noOrbitBetween(equations.name) };
    }
    const orbit = osculating(1 / rp, 0, K);
    // A strong field holds orbits that Newton's would let go: their own turning points then give the size.
    return finish(1 / rp, 0, K, orbit.eccentricity < 1 ? orbit : geometric, true);
  }
  const [cosine, sine] = cosineAndSine(start.trueAnomaly);
  const atPeriapsis = start.trueAnomaly === 0;
  const u = atPeriapsis ? 1 / rp : newtonian * (1 + e * cosine);
  return finish(u, -newtonian * e * sine + 0, newtonian, geometric, atPeriapsis);
}

const UNBOUND =
  "the start is unbound (GM/h² and u give an eccentricity of 1 or more): it has no periapsis passages";

function osculating(u: number, w: number, K: number): { semiMajorAxis: number; eccentricity: number } {
  const eccentricity = Math.hypot(u / K - 1, w / K);
  return { semiMajorAxis: 1 / (K * (1 - eccentricity * eccentricity)), eccentricity };
}
