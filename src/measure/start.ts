import type { Scenario } from "../claim/claim.js";
import type { StepLoop } from "../kernel/step-loop.js";
import { radialTurn } from "./instant.js";
import { cosineAndSine } from "./orientation.js";
import { preciseStart, startOfDoubles } from "./precise-start.js";
import type { PreparedScenario } from "./run.js";
import { startInAngle } from "./start-in-angle.js";
import { startInTime } from "./start-in-time.js";
import type { StartProblem, SystemShape } from "./started.js";

/** Rounding moves the eccentricity vector by this much within an orbit or so: below it nothing marks the apsis. */
const LEAST_ECCENTRICITY = 1e-12;

/** True where the whole motion stays in the xy plane, so that a system may leave the third dimension out. */
export function isPlanar({ equations, start }: GivenScenario): boolean {
  if (equations.form === "angle") return false;
  if (start.kind === "elements") return cosineAndSine(start.inclination)[1] === 0;
  return (start.values.z ?? 0) === 0 && (start.values.vz ?? 0) === 0;
}

/**
 * The parameters that a system must leave open for a scenario: those that the claim gives, and those whose
 * default is not where they vanish, since the null run changes them.
 */
export function openParameters({ equations, parameters }: GivenScenario): string[] {
  return Object.entries(equations.parameters)
    .filter(
      ([name, { default: value, vanishesAt }]) =>
        name in parameters || value === undefined || (vanishesAt !== undefined && vanishesAt !== value),
    )
    .map(([name]) => name);
}

/** A scenario of a claim; one that is made up may be known in doubles alone. */
export type GivenScenario = Omit<Scenario, "precise"> & Partial<Pick<Scenario, "precise">>;

/**
 * Makes a scenario ready to step.
 *
 * @param system compiled with the `openParameters` of the scenario
 * @param fineLoop a loop of high order over the same system; asked for only where the start needs a run of
 *   its own: for exact turning points, for equations without GM, and for which apsis a start at one is
 */
export function prepareScenario(
  scenario: GivenScenario,
  system: SystemShape,
  fineLoop: () => StepLoop,
): PreparedScenario | StartProblem {
  const folded = openParameters(scenario).filter((name) => !system.parameters.includes(name));
  if (folded.length > 0) throw new TypeError(`the system was compiled without ${folded.join(", ")}`);
  const span = spanOf(scenario);
  if ("problem" in span) return span;
  const inAngle = scenario.equations.form === "angle";
  const started = (inAngle ? startInAngle : startInTime)(scenario, system, fineLoop);
  if ("problem" in started) return started;
  const { atApsis, instant, ...prepared } = started;
  if (prepared.eccentricity < LEAST_ECCENTRICITY) {
    return { problem: "the start is a circle: it has no apsis to follow" };
  }
  const vanishing = system.parameters.map((name) => scenario.equations.parameters[name]?.vanishesAt);
  const nothingVanishes = vanishing.every((value) => value === undefined);
  const nullParameters = nothingVanishes
    ? null
    : vanishing.map((value, i) => value ?? prepared.parameters[i]!);
  // Near a circle what is added to Newton's attraction may make an apoapsis of the elements' periapsis.
  const turnsOutward = (parameters: readonly number[]): boolean =>
    radialTurn(fineLoop(), prepared.state, parameters, instant) > 0;
  const startsAtPeriapsis =
    atApsis && turnsOutward(prepared.parameters) && turnsOutward(nullParameters ?? prepared.parameters);
  const doubles = { ...prepared, nullParameters };
  const precise =
    scenario.precise === undefined
      ? startOfDoubles(doubles)
      : preciseStart(scenario, scenario.precise, system, doubles);
  return { ...prepared, nullParameters, precise, startsAtPeriapsis, span };
}

function spanOf({ equations, span }: GivenScenario): PreparedScenario["span"] | StartProblem {
  if (span.kind === "orbits") return { kind: "orbits", count: span.count };
  if (span.kind === equations.form) return { kind: "length", length: span.length };
  const wanted = equations.form === "angle" ? "an angle" : "a time";
  return { problem: `the span of ${equations.name} must be in orbits or ${wanted}, not ${span.text}` };
}
