import type { Verdict } from "./result.js";

/** So many times, of so many. */
export interface Share {
  readonly of: number;
  readonly held: number;
}

/** How far half-widths reach, and how often they reach truth. */
export interface Coverage extends Share {
  /** Median of half-width by true error, of those with an error above what a double shows. */
  readonly tightness: number | null;
  /** The same of those with an error above rounding, which a ladder cannot see below; null where none is known. */
  readonly tightnessAboveRounding: number | null;
}

export interface Calibration {
  readonly seed: number;
  readonly claims: number;
  readonly wrongResolved: number;
  readonly verdicts: Share;
  /** Of those claims on which the rules leave but one verdict. */
  readonly clearVerdicts: Share;
  readonly best: { readonly reference: Coverage; readonly extrapolation: Coverage };
  /** Of the witnesses' ladders alone, whether or not there was a reference beside them. */
  readonly fromLadders: Coverage;
  readonly ladders: { readonly asymptotic: Coverage; readonly all: Coverage };
  readonly error: Coverage;
  readonly digits: Share;
  /** Rows: the verdict that is right (the first, where more than one is); columns: the one given. */
  readonly confusion: Readonly<Record<Verdict, Readonly<Record<Verdict, number>>>>;
  readonly misses: readonly Miss[];
  readonly seconds: number;
}

/** A case that did not come out right, with what it takes to repeat it. */
export interface Miss {
  readonly name: string;
  readonly what: readonly string[];
  readonly right: readonly Verdict[];
  readonly verdict: Verdict;
  readonly reason: string;
  readonly claim: string;
  readonly method: unknown;
}

export const verdicts = [
  "resolved",
  "partly-resolved",
  "not-resolved",
  "contradicted",
  "undetermined",
] as const satisfies readonly Verdict[];
