import type { Grade, Ladder, LedgerEntry, RungStatus, Verdict } from "../result/result.js";

/**
 * All that a verdict rests on: numbers, in the claim's own unit unless said otherwise. Every half-width is
 * 95 %.
 */
export interface Evidence {
  readonly claimed: {
    readonly value: number;
    /** The margin that the author stands behind; more than 0. */
    readonly halfWidth: number;
    /** Significant digits quoted. */
    readonly digits: number;
    readonly unit: string;
    readonly baseline: "included" | "subtracted";
  };
  /** Null for a claim that has only the text. */
  readonly solution: SolutionEvidence | null;
  /** Null where no ladder bounds its limit. */
  readonly best: {
    readonly value: number;
    readonly halfWidth: number;
    /** Two independent methods agree on it. */
    readonly sound: boolean;
  } | null;
  /** The author's first, where there is one. */
  readonly ladders: readonly Ladder[];
  readonly ledger: readonly LedgerEntry[];
  /** Length of the span, in orbits. */
  readonly orbits: number;
  /** False where nothing can be switched off: the run is its own null run, and the true figure is 0. */
  readonly nullExists: boolean;
  /** A step as the author would write it, from steps an orbit. */
  readonly writeStep: (stepsPerOrbit: number) => string;
}

export interface SolutionEvidence {
  readonly method: string;
  readonly formalOrder: number;
  /** Symplectic or symmetric: it promises that energy does not drift. */
  readonly conserving: boolean;
  readonly stepsPerOrbit: number;
  /** Index of its rung in the first ladder. */
  readonly rung: number;
  readonly status: RungStatus;
  /** Of the null run at the same step. */
  readonly nullStatus: RungStatus;
  /** The run's figure, its null run's, and the one that the claim is about; null where the run gave none. */
  readonly raw: number | null;
  readonly null: number | null;
  readonly value: number | null;
  readonly rounding: number;
  readonly readingOff: number;
  /** The raw figure read a second way, without passages or a fit; null where there is none. */
  readonly crossReading: { readonly value: number; readonly halfWidth: number } | null;
}

/** The numerical error of the author's solution against the best value. */
export interface SolutionError {
  /** Qs - Q*. */
  readonly value: number;
  /** Of that difference: best value, rounding and reading-off in quadrature. */
  readonly halfWidth: number;
  /** E = |Qs - Q*| and its half-width. */
  readonly bound: number;
}

/** E, or null where the solution gave no figure or there is no best value. */
export function solutionError({ solution, best }: Evidence): SolutionError | null {
  if (solution === null || solution.value === null || best === null) return null;
  const value = solution.value - best.value;
  const halfWidth = Math.hypot(best.halfWidth, solution.rounding, solution.readingOff);
  return { value, halfWidth, bound: Math.abs(value) + halfWidth };
}

export interface Conclusion {
  readonly verdict: Verdict;
  readonly reason: string;
}

export interface Grading {
  readonly grade: Grade | null;
  readonly rule: string;
}
