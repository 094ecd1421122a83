import type { ExplicitRungeKutta } from "../methods/definition.js";
import { next, type StepBody, type StepContext } from "./body.js";
import { Code, type Expression, plus, times, weightedSum } from "./code.js";
import { constant } from "./constants.js";

/** Stages in straight lines: y + h (a1 k1 + a2 k2 + ...), the sum from left to right, zeros left out. */
export function explicitRungeKutta(method: ExplicitRungeKutta, context: StepContext): StepBody {
  const { coordinates, rates } = context;
  const a = method.a.map((row) => row.map(constant));
  const b = method.b.map(constant);
  const step = new Code();
  // Derivatives of each state at each stage: of a coordinate its rate, of a rate its acceleration.
  const slopes: Record<string, Expression[]> = {};
  for (const state of [...coordinates, ...rates]) slopes[state] = [];
  const increment = (state: string, weights: readonly Expression[]): Expression =>
    times("h", weightedSum(weights, slopes[state]!));

  for (let stage = 0; stage < b.length; stage++) {
    const weights = a[stage]!;
    const first = weights.every((weight) => weight === 0);
    const at = (state: string): string => (first ? state : `${state}_${stage}`);
    if (!first) {
      for (const state of [...coordinates, ...rates])
        step.define(at(state), plus(state, increment(state, weights)));
    }
    const accelerations = context.accelerate(step, `s${stage}_`, at);
    coordinates.forEach((coordinate, i) => {
      slopes[coordinate]!.push(at(rates[i]!));
      slopes[rates[i]!]!.push(accelerations[i]!);
    });
  }
  for (const state of [...coordinates, ...rates])
    context.move(step, next(state), state, state, increment(state, b));
  return {
    before: new Code(),
    evaluationsBefore: 0,
    step,
    evaluationsPerStep: b.length,
    implicit: false,
  };
}
