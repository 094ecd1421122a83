import type { LadderPoint } from "../differences.js";

/** A value with its 95 % half-width. */
export interface Estimate {
  readonly value: number;
  readonly halfWidth: number;
}

/** What an estimator may know of the method behind a ladder. */
export interface LadderTraits {
  /** Formal order of the method. */
  readonly order: number;
  /** Its error expands in even powers of the step alone. */
  readonly symmetric: boolean;
}

/** A way to tell the limit of a ladder, and how wrong it is, from the ladder alone. */
export interface Estimator {
  readonly name: string;
  /** Where it is published: author, title or journal, place. */
  readonly source: string;
  /**
   * @param points one a rung, coarsest first, each step half the last
   * @returns null where the procedure gives no limit
   */
  estimate(points: readonly LadderPoint[], traits: LadderTraits): Estimate | null;
}
