import type { EquationsDefinition } from "../equations/definition.js";
import type { LoopArithmetic } from "../kernel/arithmetic.js";
import type { LedgerReading } from "../measure/ledger.js";
import type { PreparedScenario } from "../measure/run.js";
import type { MethodDefinition } from "../methods/definition.js";
import type { PreciseOrbit, ReferenceMethod } from "../reference/orbit.js";
import type { RungStatus } from "../result/result.js";

/** All that a worker needs to build the step loop of a job. */
export interface SystemRecipe {
  readonly definition: EquationsDefinition;
  /** Parameters that stay symbols; the rest are folded into the loop at their defaults. */
  readonly parameters: readonly string[];
  readonly planar: boolean;
}

/** A scenario followed in double-double by one of the reference's methods. */
export interface ReferenceJob {
  readonly system: SystemRecipe;
  readonly scenario: PreparedScenario;
  readonly method: ReferenceMethod;
  readonly effect: "on" | "off";
  /** Of a step, as a part of position and velocity. */
  readonly tolerance: number;
  /** Most evaluations. */
  readonly evaluations: number;
}

/** Early states of a method on a ladder of halved steps, in double-double. */
export interface EarlyDistancesJob {
  readonly kind: "early-distances";
  readonly system: SystemRecipe;
  readonly method: MethodDefinition;
  readonly scenario: PreparedScenario;
  /** The coarsest. */
  readonly step: number;
  readonly rungs: number;
}

/** Work on one method, done by one worker in one go. */
export interface Job {
  readonly system: SystemRecipe;
  readonly method: MethodDefinition;
  readonly arithmetic: LoopArithmetic;
  readonly scenario: PreparedScenario;
  readonly tasks: readonly Task[];
}

export type Task = { readonly step: number } & (
  | {
      /** One run of the span, read off at its passages. */
      readonly kind: "run";
      readonly effect: "on" | "off";
      readonly state?: readonly number[];
      /** Most evaluations that the run may take. */
      readonly evaluations: number;
    }
  /** The state after whole steps from the start. */
  | { readonly kind: "early"; readonly steps: number; readonly state?: readonly number[] }
  /** The conserved quantities over the span. */
  | { readonly kind: "ledger" }
  /** The drift of the eccentricity vector, a second reading of the advance. */
  | { readonly kind: "second-reading" }
);

/** What a run of the span gave, SI. */
export interface Reading {
  readonly status: RungStatus;
  /** rad an orbit, with its standard error; null without three passages. */
  readonly advance: number | null;
  readonly advanceError: number | null;
  /** Mean radial period: s, or rad. */
  readonly period: number | null;
  readonly numbers: readonly number[];
  /** Independent variable at each passage, from the start. */
  readonly times: readonly number[];
  /** Apsidal angle at each passage less the first and whole turns, rad. */
  readonly advances: readonly number[];
  readonly evaluations: number;
  readonly seconds: number;
}

export type Outcome =
  | { readonly kind: "run"; readonly reading: Reading }
  | { readonly kind: "early"; readonly state: readonly number[] | null }
  | { readonly kind: "ledger"; readonly entries: readonly LedgerReading[] | null }
  | { readonly kind: "second-reading"; readonly perOrbit: number | null; readonly halfWidth: number | null };

/** What a job gives. */
export type Done<J> = J extends ReferenceJob
  ? PreciseOrbit
  : J extends EarlyDistancesJob
    ? number[]
    : Outcome[];

export type AnyJob = Job | ReferenceJob | EarlyDistancesJob;
