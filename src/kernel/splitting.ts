import type { Splitting } from "../methods/definition.js";
import { next, type StepBody, type StepContext } from "./body.js";
import { Code, type Expression, times } from "./code.js";
import { constant } from "./constants.js";

/**
 * Kicks and drifts in the order given. A kick at coordinates that have not moved since the last kick uses
 * the same accelerations; so does the first kick of a step after the last of the step before.
 */
export function splitting(method: Splitting, context: StepContext): StepBody {
  const { coordinates, rates } = context;
  const before = new Code();
  const step = new Code();
  const names = new Map([...coordinates, ...rates].map((state) => [state, state]));
  const at = (state: string): string => names.get(state)!;
  const carried = "kick" in method.stages[0]! && "kick" in method.stages.at(-1)!;
  const carry = coordinates.map((_, i) => `carried_${i}`);
  if (carried) {
    const start = context.accelerate(before, "c", (state) => state);
    carry.forEach((name, i) => {
      before.variable(name, start[i]!);
    });
  }
  let accelerations: readonly Expression[] | null = carried ? carry : null;
  let evaluations = 0;
  const move = (state: string, stage: number, rate: Expression): void => {
    const moved = `${state}_${stage}`;
    context.move(step, moved, state, at(state), times(`w${stage}`, rate));
    names.set(state, moved);
  };
  method.stages.forEach((part, stage) => {
    const weight = constant("drift" in part ? part.drift : part.kick);
    before.define(`w${stage}`, times(weight, "h"));
    if ("drift" in part) {
      coordinates.forEach((coordinate, i) => {
        move(coordinate, stage, at(rates[i]!));
      });
      accelerations = null;
      return;
    }
    if (accelerations === null) {
      accelerations = context.accelerate(step, `s${stage}_`, at);
      evaluations++;
    }
    const kicks = accelerations;
    rates.forEach((rate, i) => {
      move(rate, stage, kicks[i]!);
    });
  });
  for (const state of [...coordinates, ...rates]) step.define(next(state), at(state));
  if (carried) {
    carry.forEach((name, i) => {
      step.set(name, accelerations![i]!);
    });
  }
  return {
    before,
    evaluationsBefore: carried ? 1 : 0,
    step,
    evaluationsPerStep: evaluations,
    implicit: false,
  };
}
