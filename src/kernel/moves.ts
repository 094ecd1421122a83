import type { StepContext } from "./body.js";
import { type Code, type Expression, minus, plus } from "./code.js";

/** How a step adds to the states, and what goes round the loop for it. */
export interface Moves {
  readonly move: StepContext["move"];
  before(code: Code): void;
  /** At the end of a step. */
  after(code: Code): void;
}

export const plainMoves: Moves = {
  move: (code, name, _, from, increment) => code.define(name, plus(from, increment)),
  before: () => {},
  after: () => {},
};

/**
 * Adds with compensation: what a sum loses of its increment is added to the next increment of the same state
 * (W. Kahan, Commun. ACM 8 (1965) 40; Hairer, Lubich and Wanner, Geometric Numerical Integration, VIII.5).
 * At every call of the loop it begins anew.
 */
export function compensatedMoves(states: readonly string[]): Moves {
  const lost = new Map<string, Expression>(states.map((state) => [state, `lost_${state}`]));
  return {
    move(code, name, state, from, increment) {
      const whole = `${name}_whole`;
      const rest = `${name}_lost`;
      code.define(whole, plus(increment, lost.get(state)!));
      code.define(name, plus(from, whole));
      code.define(rest, minus(whole, minus(name, from)));
      lost.set(state, rest);
    },
    before(code) {
      for (const state of states) code.variable(`lost_${state}`, 0);
    },
    after(code) {
      for (const state of states) code.set(`lost_${state}`, lost.get(state)!);
    },
  };
}
