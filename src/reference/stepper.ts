import type { DoubleDouble } from "../arithmetic/double-double.js";

/** Coordinates, then rates, in the order of the compiled system. */
export type PreciseState = readonly DoubleDouble[];

/** A method of high order in double-double arithmetic that chooses its own steps. */
export interface Stepper {
  /** What it is, in words. */
  readonly name: string;
  /** Where the last step began and ended. */
  readonly before: PreciseState;
  readonly state: PreciseState;
  /** Radial rate at the two: x·v, or -u' in angle form; negative while the orbit comes in. */
  readonly rateBefore: number;
  readonly rate: number;
  /** Takes a step of its own choice; null where the motion cannot be followed. */
  step(): DoubleDouble | null;
  /** The state a part of the last step on from its beginning. */
  within(length: DoubleDouble): PreciseState;
  /** Evaluations of the right-hand side so far, or work worth as much. */
  readonly evaluations: number;
}

/** Where a stepper is: what it changes as it goes. */
export interface Track {
  before: PreciseState;
  state: PreciseState;
  rateBefore: number;
  rate: number;
  evaluations: number;
  /** Goes on to the end of a step. */
  moveTo(state: PreciseState): void;
}

/** @param rateAt radial rate of a state */
export function trackFrom(state: PreciseState, rateAt: (state: PreciseState) => number): Track {
  const rate = rateAt(state);
  return {
    before: state,
    state,
    rateBefore: rate,
    rate,
    evaluations: 0,
    moveTo(to) {
      this.before = this.state;
      this.rateBefore = this.rate;
      this.state = to;
      this.rate = rateAt(to);
    },
  };
}

/** What a method is asked to keep to: the error of a step, as a part of position and velocity each. */
export interface StepperOptions {
  readonly state: PreciseState;
  readonly parameters: readonly DoubleDouble[];
  readonly tolerance: number;
  /** s, or rad: tried first. */
  readonly firstStep: number;
}
