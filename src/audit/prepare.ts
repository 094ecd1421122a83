import type { Claim } from "../claim/claim.js";
import { appliesTo } from "../kernel/applies-to.js";
import { roundToSingle } from "../kernel/single.js";
import { type CompiledSystem, compileSystem } from "../kernel/system.js";
import type { PreparedScenario } from "../measure/run.js";
import { isPlanar, openParameters, prepareScenario } from "../measure/start.js";
import { findMethod } from "../methods/catalog/index.js";
import type { MethodDefinition } from "../methods/definition.js";
import type { SystemRecipe } from "./job.js";
import { loopOf } from "./run-job.js";
import { defaultWitnesses } from "./witnesses.js";

/** A claim made ready to run. */
export interface Prepared {
  readonly recipe: SystemRecipe;
  readonly system: CompiledSystem;
  readonly scenario: PreparedScenario;
  readonly witnesses: readonly MethodDefinition[];
  /** The author's step, s or rad; null for a claim without a solution. */
  readonly authorsStep: number | null;
}

/** The method that starting orbits of exact turning points are found with. */
const FINE_METHOD = "dormand-prince-8";

/** @returns why the claim cannot be run, in a sentence, where it cannot */
export function prepare(claim: Claim): Prepared | { readonly problem: string } {
  const { equations } = claim.scenario;
  const recipe: SystemRecipe = {
    definition: equations,
    parameters: openParameters(claim.scenario),
    planar: isPlanar(claim.scenario),
  };
  const system = compileSystem(equations, recipe);
  const scenario = prepareScenario(claim.scenario, system, () => loopOf(recipe, findMethod(FINE_METHOD)!));
  if ("problem" in scenario) return scenario;

  const authors = claim.solution?.method ?? null;
  const named = [authors, ...(claim.audit.witnesses ?? [])].filter((method) => method !== null);
  for (const method of named) {
    const applies = appliesTo(method, system);
    if (!applies.ok) return { problem: applies.reason };
  }
  const authorsStep = claim.solution === null ? null : stepLength(claim.solution, scenario.period);
  if (authorsStep !== null && authorsStep >= scenario.period) {
    const orbits = (authorsStep / scenario.period).toPrecision(3);
    return {
      problem: `the step ${claim.solution!.step.text} is ${orbits} times the orbit; it must be a small part of it`,
    };
  }
  const applicable = (method: MethodDefinition) => appliesTo(method, system).ok;
  return {
    recipe,
    system,
    scenario,
    witnesses: claim.audit.witnesses ?? defaultWitnesses(authors, applicable),
    authorsStep,
  };
}

/** In single precision the step itself is a single. */
function stepLength({ step, arithmetic }: NonNullable<Claim["solution"]>, period: number): number {
  const length = step.kind === "length" ? step.length : period / step.count;
  return arithmetic === "single" ? roundToSingle(length) : length;
}
