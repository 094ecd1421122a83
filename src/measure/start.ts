import type { Scenario } from "../claim/claim.js";
import type { StepLoop } from "../kernel/step-loop.js";
import { cosineAndSine } from "./orientation.js";
import type { PreparedScenario } from "./run.js";
import { startInAngle } from "./start-in-angle.js";
import { startInTime } from "./start-in-time.js";
import type { StartProblem, SystemShape } from "./started.js";

/** True where the whole motion stays in the xy plane, so that a system may leave the third dimension out. */
export function isPlanar({ equations, start }: Scenario): boolean {
  if (equations.form === "angle") return false;
  if (start.kind === "elements") return cosineAndSine(start.inclination)[1] === 0;
  return (start.values.z ?? 0) === 0 && (start.values.vz ?? 0) === 0;
}

/**
 * Makes a scenario ready to step.
 *
 * @param fineLoop a loop of high order over the same system; asked for only where the start needs a run of
 *   its own: exact turning points, or equations without GM
 */
export function prepareScenario(
  scenario: Scenario,
  system: SystemShape,
  fineLoop: () => StepLoop,
): PreparedScenario | StartProblem {
  const span = spanOf(scenario);
  if ("problem" in span) return span;
  const inAngle = scenario.equations.form === "angle";
  const started = (inAngle ? startInAngle : startInTime)(scenario, system, fineLoop);
  if ("problem" in started) return started;
  const vanishing = system.parameters.map((name) => scenario.equations.parameters[name]?.vanishesAt);
  const nullParameters = vanishing.map((value, i) => value ?? started.parameters[i]!);
  return {
    ...started,
    nullParameters: vanishing.every((value) => value === undefined) ? null : nullParameters,
    span,
  };
}

function spanOf({ equations, span }: Scenario): PreparedScenario["span"] | StartProblem {
  if (span.kind === "orbits") return { kind: "orbits", count: span.count };
  if (span.kind === equations.form) return { kind: "length", length: span.length };
  const wanted = equations.form === "angle" ? "an angle" : "a time";
  return { problem: `the span of ${equations.name} must be in orbits or ${wanted}, not ${span.text}` };
}
