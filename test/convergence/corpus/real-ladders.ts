import ellipk from "@stdlib/math-base-special-ellipk";
import { lastBitEnsemble, roundingHalfWidth } from "../../../src/convergence/rounding.js";
import { findEquations } from "../../../src/equations/catalog/index.js";
import type { EquationsDefinition } from "../../../src/equations/definition.js";
import { appliesTo } from "../../../src/kernel/applies-to.js";
import { compileStepLoop } from "../../../src/kernel/compile.js";
import type { StepLoop } from "../../../src/kernel/step-loop.js";
import { compileSystem } from "../../../src/kernel/system.js";
import { apsidalAdvance } from "../../../src/measure/advance.js";
import { runPassages } from "../../../src/measure/passages.js";
import type { PreparedScenario } from "../../../src/measure/run.js";
import type { GivenScenario } from "../../../src/measure/start.js";
import { isPlanar, openParameters, prepareScenario } from "../../../src/measure/start.js";
import { findMethod, methodsCatalog } from "../../../src/methods/catalog/index.js";
import { elements } from "../../published/orbit.js";
import { type Case, cutShort } from "./case.js";

/** Steps an orbit on the coarsest rung, and rungs; what a method of low order needs, one of high order wastes. */
const COARSEST = 16;
const rungsFor = (order: number): number => (order <= 2 ? 10 : order <= 4 ? 9 : 8);
/** Rung of the last-bit ensemble. */
const ENSEMBLE_RUNG = 4;

interface Setting {
  readonly equations: string;
  readonly parameters: Readonly<Record<string, number>>;
  readonly periapsis: number;
  readonly apoapsis: number;
  readonly turningPoints: boolean;
  /** Advance an orbit, rad. */
  readonly truth: number;
}

/** Kepler's first law: no advance. */
const kepler = (equations: string, eccentricity: number): Setting => ({
  equations,
  parameters: { GM: 1 },
  periapsis: 1 - eccentricity,
  apoapsis: 1 + eccentricity,
  turningPoints: false,
  truth: 0,
});

/**
 * 4 K(m) / sqrt(2 (u3 - u1)) - 2π with GM/c² = 1, turning points u1 < u2, u3 = 1/2 - u1 - u2 and
 * m = (u2 - u1)/(u3 - u1): C. Darwin, Proc. R. Soc. Lond. A 249, 180 (1959); K(m) of @stdlib.
 */
function schwarzschild(periapsis: number, eccentricity: number): Setting {
  const apoapsis = (periapsis * (1 + eccentricity)) / (1 - eccentricity);
  const [u1, u2] = [1 / apoapsis, 1 / periapsis];
  const u3 = 1 / 2 - u1 - u2;
  const truth = (4 * ellipk((u2 - u1) / (u3 - u1))) / Math.sqrt(2 * (u3 - u1)) - 2 * Math.PI;
  const parameters = { GM: 1, c: 1 };
  return { equations: "schwarzschild-angle", parameters, periapsis, apoapsis, turningPoints: true, truth };
}

const settings: readonly Setting[] = [
  ...[0.01, 0.1, 0.3, 0.6, 0.9].map((e) => kepler("newtonian", e)),
  ...[0.05, 0.3, 0.7].map((e) => kepler("newtonian-angle", e)),
  schwarzschild(15, 0.2),
  schwarzschild(40, 0.05),
  schwarzschild(1000, 0.6),
];

/** The ladders of every method on every setting that it can step, each cut short at several rungs. */
export function realLadders(orbits: number): Case[] {
  return settings.flatMap((setting) => laddersOf(setting, orbits));
}

function laddersOf(setting: Setting, orbits: number): Case[] {
  const equations: EquationsDefinition = findEquations(setting.equations)!;
  const { periapsis, apoapsis, turningPoints } = setting;
  const given: GivenScenario = {
    equations,
    parameters: setting.parameters,
    start: elements(periapsis, apoapsis, { turningPoints }),
    span: { kind: "orbits", count: orbits, text: "" },
  };
  const system = compileSystem(equations, { parameters: openParameters(given), planar: isPlanar(given) });
  const fine = (): StepLoop => compileStepLoop(system, findMethod("dormand-prince-8")!);
  const scenario = prepareScenario(given, system, fine);
  if ("problem" in scenario) throw new Error(scenario.problem);
  return methodsCatalog
    .filter((method) => appliesTo(method, system).ok)
    .flatMap((method) => {
      const { order, symmetric } = method;
      const advances = ladderOf(compileStepLoop(system, method), scenario, rungsFor(order));
      const eccentricity = (apoapsis - periapsis) / (apoapsis + periapsis);
      const label = `${setting.equations}, e = ${eccentricity.toFixed(2)}, ${method.name}`;
      return cutShort(
        { label, kind: "real", points: advances, truth: setting.truth, traits: { order, symmetric } },
        5,
      );
    });
}

function ladderOf(loop: StepLoop, scenario: PreparedScenario, rungs: number): Case["points"] {
  const at = (rung: number, state = scenario.state): number | null => {
    const step = scenario.period / (COARSEST * 2 ** rung);
    const run = runPassages(loop, { ...scenario, state }, scenario.parameters, step);
    return run.status === "ok" ? (apsidalAdvance(run)?.perOrbit ?? null) : null;
  };
  const spread = roundingHalfWidth(lastBitEnsemble(scenario.state).map((s) => at(ENSEMBLE_RUNG, s))) ?? 0;
  // As an audit takes it: rounding walks at random (Brouwer, A. J. 46, 149, 1937), and rounded coefficients
  // push every step alike.
  const push = (2 * Math.PI * Number.EPSILON) / scenario.eccentricity;
  return Array.from({ length: rungs }, (_, k) => ({
    value: at(k),
    floor: Math.hypot(push, spread * Math.max(1, 2 ** ((k - ENSEMBLE_RUNG) / 2))),
  }));
}
