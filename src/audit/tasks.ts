import { ENSEMBLE_SIZE, lastBitEnsemble } from "../convergence/rounding.js";
import { EPSILON, type LoopArithmetic } from "../kernel/arithmetic.js";
import { earlySteps } from "../measure/early-state.js";
import { nominalLength } from "../measure/limits.js";
import type { PreparedScenario } from "../measure/run.js";
import type { MethodDefinition } from "../methods/definition.js";
import type { Task } from "./job.js";
import type { LadderPlan } from "./plan.js";

/** Where the outcome of a task belongs. */
export type Slot =
  | { readonly in: "rung"; readonly rung: number; readonly field: "on" | "off" | "early" }
  | { readonly in: "coarser-early" | "finer-early"; readonly index: number }
  | { readonly in: "ensemble"; readonly member: number; readonly field: "on" | "off" | "early" }
  | { readonly in: "less-rounded"; readonly field: "on" | "off" }
  | { readonly in: "ledger"; readonly halved: boolean }
  | { readonly in: "second-reading" };

export interface PlannedTask {
  readonly method: MethodDefinition;
  readonly arithmetic: LoopArithmetic;
  readonly task: Task;
  readonly slot: Slot;
  /** Evaluations that it is expected to take. */
  readonly cost: number;
}

/** Rungs finer than the ladder's on which only the early state is computed: an orbit costs little. */
const FINER_EARLY = 3;
/** A method of high order may be down to rounding on all but the coarsest steps: its order shows on coarser ones. */
const COARSER_EARLY = 2;
const FEWEST_EARLY = 4;
const coarserEarly = (stepsPerOrbit: number): number => {
  let count = 0;
  while (count < COARSER_EARLY && stepsPerOrbit / 2 ** (count + 1) >= FEWEST_EARLY) count++;
  return count;
};
/** Sweeps that the stages of an implicit step take, on the average over a ladder. */
const SWEEPS = 8;
/** A single run may take this many times the evaluations that it is expected to. */
const PATIENCE = 6;

/** Evaluations a step, as planned. */
export function costPerStep(method: MethodDefinition): number {
  switch (method.family) {
    case "explicit-runge-kutta":
      return method.b.length;
    case "implicit-runge-kutta":
      return method.b.length * SWEEPS;
    case "splitting":
      return method.stages.filter((stage) => "kick" in stage).length;
  }
}

/**
 * Everything to run with one method.
 *
 * @param arithmetic of the method's own runs
 * @param ensembleRung the rung on which rounding is measured
 * @param wanted null runs where the claim subtracts them and for the author's method; the ensemble where a
 *   ladder may come down to rounding; the ledger, and at half the step too, for the author's method
 */
export function planTasks(
  method: MethodDefinition,
  arithmetic: "double" | "single",
  scenario: PreparedScenario,
  ladder: LadderPlan,
  ensembleRung: number,
  wanted: { nullRuns: boolean; ensemble: boolean; ledger: boolean; halvedLedger: boolean },
): PlannedTask[] {
  const perStep = costPerStep(method);
  const length = nominalLength(scenario);
  const spanCost = (step: number): number => (length / step) * perStep;
  const separateNull = wanted.nullRuns && scenario.nullParameters !== null;
  const effects: readonly ("on" | "off")[] = separateNull ? ["on", "off"] : ["on"];
  const coarsest = ladder.steps[0]!;
  const coarser = coarserEarly(scenario.period / coarsest);
  const coarse = earlySteps(coarsest * 2 ** coarser, scenario.period);
  const tasks: PlannedTask[] = [];
  // The order of a method is that of its truncation, which single precision would drown.
  const arithmeticOf = (slot: Slot): LoopArithmetic => {
    if (slot.in === "less-rounded") return arithmetic === "single" ? "double" : "compensated";
    return slot.in === "coarser-early" ||
      slot.in === "finer-early" ||
      ("field" in slot && slot.field === "early")
      ? "double"
      : arithmetic;
  };
  const add = (slot: Slot, task: Task, cost: number): void => {
    tasks.push({ method, arithmetic: arithmeticOf(slot), task, slot, cost });
  };
  const run = (slot: Slot, step: number, effect: "on" | "off", state?: readonly number[]): void => {
    const cost = spanCost(step);
    add(slot, { kind: "run", step, effect, evaluations: PATIENCE * cost, ...(state && { state }) }, cost);
  };
  const early = (slot: Slot, step: number, halvings: number, state?: readonly number[]): void => {
    const steps = coarse * 2 ** (coarser + halvings);
    add(slot, { kind: "early", step, steps, ...(state && { state }) }, steps * perStep);
  };

  ladder.steps.forEach((step, rung) => {
    for (const effect of effects) run({ in: "rung", rung, field: effect }, step, effect);
    early({ in: "rung", rung, field: "early" }, step, rung);
  });
  // Of the author's method the order is judged; of a witness the rungs alone will do.
  for (let index = 0; wanted.ledger && index < FINER_EARLY; index++) {
    const halvings = ladder.steps.length + index;
    early({ in: "finer-early", index }, coarsest / 2 ** halvings, halvings);
  }
  for (let index = 0; index < coarser; index++) {
    early({ in: "coarser-early", index }, coarsest * 2 ** (coarser - index), index - coarser);
  }
  const members = lastBitEnsemble(scenario.state, EPSILON[arithmetic]);
  const inDouble = lastBitEnsemble(scenario.state);
  for (let member = 0; wanted.ensemble && member < ENSEMBLE_SIZE; member++) {
    const step = ladder.steps[ensembleRung]!;
    for (const field of effects) run({ in: "ensemble", member, field }, step, field, members[member]!);
    early({ in: "ensemble", member, field: "early" }, step, ensembleRung, inDouble[member]!);
  }
  if (wanted.ensemble) {
    const step = ladder.steps[ensembleRung]!;
    for (const field of effects) run({ in: "less-rounded", field }, step, field);
  }
  if (wanted.ledger) {
    const step = ladder.steps[ladder.authors ?? ensembleRung]!;
    add({ in: "ledger", halved: false }, { kind: "ledger", step }, 2 * spanCost(step));
    if (wanted.halvedLedger) {
      add({ in: "ledger", halved: true }, { kind: "ledger", step: step / 2 }, 4 * spanCost(step));
    }
    add({ in: "second-reading" }, { kind: "second-reading", step }, 2 * spanCost(step));
  }
  return tasks;
}
