import type { LoopStyle } from "./arithmetic.js";
import type { Code, Expression } from "./code.js";

/** What a family needs to write the body of its step. */
export interface StepContext {
  /** Names of the coordinates in the loop, and of their rates in the same order. */
  readonly coordinates: readonly string[];
  readonly rates: readonly string[];
  readonly velocityDependent: boolean;
  /**
   * Writes the accelerations at a place.
   *
   * @param prefix makes the names unique in the loop
   * @param bind what each coordinate and rate goes by there
   * @returns a value for each coordinate's acceleration: a name, or a number
   */
  accelerate(code: Code, prefix: string, bind: (state: string) => Expression): Expression[];
  /** Defines `name` as what `state` becomes when `increment` is added to its value `from`. */
  move(code: Code, name: string, state: string, from: Expression, increment: Expression): void;
  readonly style: LoopStyle;
}

/**
 * One step of a method. The state's names are bare before the step; the body defines `next` of each. The step's
 * length is `h`, the number of steps taken so far `#taken`.
 */
export interface StepBody {
  /** Before the loop: what is carried from step to step. */
  readonly before: Code;
  /** Evaluations that it takes. */
  readonly evaluationsBefore: number;
  readonly step: Code;
  readonly evaluationsPerStep: number;
  /**
   * Where set, the step adds up its evaluations in `evaluations`; where it fails it sets `failed` to 1 and
   * leaves the loop.
   */
  readonly implicit: boolean;
}

/** Name of a state after the step. */
export const next = (state: string): string => `n_${state}`;
