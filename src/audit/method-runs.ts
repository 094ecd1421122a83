import type { MethodDefinition } from "../methods/definition.js";
import type { Reading } from "./job.js";

/** Everything that was run with one method. */
export interface MethodRuns {
  readonly method: MethodDefinition;
  readonly arithmetic: "double" | "single";
  readonly role: "solution" | "witness";
  readonly rungs: readonly RungRuns[];
  /** Early states of coarser steps than the ladder's, coarsest first, for the state order alone. */
  readonly coarserEarly: readonly (readonly number[] | null)[];
  /** Early states of finer steps than the ladder's, each half the last, for the state order alone. */
  readonly finerEarly: readonly (readonly number[] | null)[];
  readonly ensemble: Ensemble;
}

export interface RungRuns {
  readonly step: number;
  readonly on: Reading | null;
  /** Null where no null run was called for; the run itself where nothing can vanish. */
  readonly off: Reading | null;
  readonly early: readonly number[] | null;
}

/** Runs whose starts differ in the last bits, all at the one rung. */
export interface Ensemble {
  readonly rung: number;
  readonly on: readonly (Reading | null)[];
  readonly off: readonly (Reading | null)[];
  readonly early: readonly (readonly number[] | null)[];
  /** The unperturbed run again, with compensated summation; of a run in single precision, in double. */
  readonly lessRounded: { readonly on: Reading | null; readonly off: Reading | null };
}
