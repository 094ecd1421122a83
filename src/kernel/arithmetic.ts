/** What a step loop computes in; compensated is double with the rounding of each state's sums carried along. */
export type LoopArithmetic = "double" | "single" | "compensated";

/** Distance from 1 to the next number. */
export const EPSILON: Readonly<Record<LoopArithmetic, number>> = {
  double: Number.EPSILON,
  compensated: Number.EPSILON,
  single: 2 ** -23,
};

/** How a step loop is written, as its arithmetic wants it. */
export interface LoopStyle {
  /** What a step adds to a state is rounded into it: where set, what was lost goes with the next step. */
  readonly compensated: boolean;
  /** Changes between two sweeps of an implicit step that rounding makes, as a part of the accelerations. */
  readonly rounding: number;
  /** Sweeps after which an implicit step that still changes is given up. */
  readonly sweeps: number;
}

/** A sweep gains about a digit where the step is fair: enough of them to come down to rounding, twice over. */
export const styles = {
  double: { compensated: false, rounding: 1e-13, sweeps: 60 },
  compensated: { compensated: true, rounding: 1e-13, sweeps: 60 },
  single: { compensated: false, rounding: 1e-4, sweeps: 60 },
  doubleDouble: { compensated: false, rounding: 1e-28, sweeps: 120 },
} as const satisfies Readonly<Record<string, LoopStyle>>;
