import type { Start } from "../../src/claim/claim.js";
import type { EquationsDefinition } from "../../src/equations/definition.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import type { StepLoop } from "../../src/kernel/step-loop.js";
import { compileSystem } from "../../src/kernel/system.js";
import { type Advance, apsidalAdvance } from "../../src/measure/advance.js";
import { runPassages } from "../../src/measure/passages.js";
import type { PreparedScenario, Run } from "../../src/measure/run.js";
import type { GivenScenario } from "../../src/measure/start.js";
import { isPlanar, openParameters, prepareScenario } from "../../src/measure/start.js";
import { findMethod } from "../../src/methods/catalog/index.js";

/** A scenario on the road that a claim takes, from data to a run. */
export interface Orbit {
  readonly scenario: PreparedScenario;
  loop(method: string): StepLoop;
  run(method: string, perOrbit: number): Run;
  advance(method: string, perOrbit: number): Advance;
}

type Elements = Extract<Start, { kind: "elements" }>;

export function elements(periapsis: number, apoapsis: number, rest: Partial<Elements> = {}): Elements {
  return {
    kind: "elements",
    periapsis,
    apoapsis,
    inclination: 0,
    node: 0,
    argumentOfPeriapsis: 0,
    trueAnomaly: 0,
    turningPoints: false,
    ...rest,
  };
}

export function orbitOf(
  equations: EquationsDefinition,
  parameters: Readonly<Record<string, number>>,
  start: Start,
  orbits: number,
): Orbit {
  const given: GivenScenario = {
    equations,
    parameters,
    start,
    span: { kind: "orbits", count: orbits, text: "" },
  };
  const system = compileSystem(equations, { parameters: openParameters(given), planar: isPlanar(given) });
  const loop = (method: string): StepLoop => compileStepLoop(system, findMethod(method)!);
  const scenario = prepareScenario(given, system, () => loop("dormand-prince-8"));
  if ("problem" in scenario) throw new Error(scenario.problem);
  const run = (method: string, perOrbit: number): Run => {
    const found = runPassages(loop(method), scenario, scenario.parameters, scenario.period / perOrbit);
    if (found.status !== "ok") throw new Error(found.status);
    return found;
  };
  return { scenario, loop, run, advance: (method, perOrbit) => apsidalAdvance(run(method, perOrbit))! };
}
