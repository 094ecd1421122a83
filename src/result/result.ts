/**
 * The result of an audit: plain data, the one object that every reporter takes and that `--json` writes.
 * All figures stand in the claim's own unit unless a field says otherwise; every half-width is 95 %.
 * What could not be had is null, never zero or NaN. The format changes only by adding.
 */
export interface ResultFile {
  readonly format: "cupel/result-1";
  readonly claims: readonly ClaimResult[];
}

export type Verdict = "resolved" | "partly-resolved" | "not-resolved" | "contradicted" | "undetermined";
export type Grade = "A" | "B" | "C" | "D" | "E";
export type Outcome = "pass" | "caution" | "fail" | "not-checked";
export type CheckName =
  | "reproduces"
  | "converges"
  | "order"
  | "conserves"
  | "null"
  | "agrees"
  | "stands-clear"
  | "carries-digits"
  | "sampling";
export type RungStatus = "ok" | "escaped" | "non-finite" | "too-few-passages" | "timed-out" | "unconverged";
/** What the differences of successive rungs look like. */
export type LadderShape =
  | "asymptotic"
  | "oscillating"
  | "divergent"
  | "stalled"
  | "at-rounding"
  | "irregular"
  | "too-short";
export type DriftPattern =
  | "rounding-level"
  | "bounded-oscillation"
  | "linear-drift"
  | "random-walk"
  | "faster-growth"
  | "jumps-at-periapsis";

export interface ClaimResult {
  /** As given on the command line, with forward slashes. */
  readonly file: string;
  readonly title: string;
  readonly verdict: Verdict;
  readonly grade: Grade | null;
  /** Significant digits of the claimed figure that stand; null when that cannot be said. */
  readonly digits: number | null;
  /** One sentence: why this verdict. */
  readonly reason: string;
  /** One sentence: the rule that set the grade. */
  readonly gradeRule: string;
  readonly claimed: {
    readonly value: number;
    readonly halfWidth: number;
    readonly unit: string;
    readonly baseline: "included" | "subtracted";
    readonly quantity: string;
    /** As written in the claim. */
    readonly text: string;
    /** Significant digits quoted. */
    readonly digits: number;
  } | null;
  readonly asSolved: {
    /** The figure at the author's own method and step (less its null run's when subtracted). */
    readonly value: number | null;
    /** The null run's figure at the same method and step. */
    readonly null: number | null;
    /** Qs - Q*. */
    readonly error: number | null;
    /** Half-width of `error`. */
    readonly halfWidth: number | null;
  };
  /**
   * A second reading of the author's run, raw: the mean drift of the osculating eccentricity vector, end less
   * start. Null where there is none to compare, as for an orbit whose apsis is counted from a moving node.
   */
  readonly crossReading: { readonly value: number; readonly halfWidth: number } | null;
  readonly best: {
    readonly value: number | null;
    readonly halfWidth: number | null;
    readonly from: "reference" | "extrapolation" | null;
    /** What the witnesses' ladders alone lead to; null where they bound nothing. */
    readonly extrapolated: { readonly value: number; readonly halfWidth: number } | null;
    /** In words: which methods carry it and how far they agree. */
    readonly says: string;
  };
  /**
   * The scenario solved in double-double arithmetic by two independent methods; null in a result without an
   * audit. Without a reference its figures are null and `says` tells why.
   */
  readonly reference: {
    readonly value: number | null;
    readonly halfWidth: number | null;
    /** Distance of the two methods' figures. */
    readonly apart: number | null;
    /** The first carries the value. */
    readonly methods: readonly string[];
    /** Where its methods are published. */
    readonly source: string | null;
    readonly evaluations: number | null;
    readonly says: string;
  } | null;
  /**
   * What rounding does to the author's run, from runs whose starts differ in the last bits: as far as the passages
   * let it be measured. Null without a solution.
   */
  readonly rounding: {
    /** Exponents in time of the spread of the apsis and of the passage times; null where too few passages tell. */
    readonly apsisGrowth: number | null;
    readonly phaseGrowth: number | null;
    readonly says: string;
  } | null;
  readonly checks: readonly Check[];
  readonly budget: Budget | null;
  readonly ladders: readonly Ladder[];
  readonly ledger: readonly LedgerEntry[];
  readonly remedy: Remedy | null;
  /** What was run, for the page; null when the claim could not be read. */
  readonly setup: Setup | null;
  /** The passages of the author's own run and its null run, for the page. */
  readonly passages: { readonly solution: PassageSeries; readonly null: PassageSeries | null } | null;
  readonly provenance: {
    readonly version: string;
    readonly claimSha256: string;
    readonly node: string;
    /** The command that repeats this audit. */
    readonly command: string;
    readonly seconds: number;
  };
}

export interface Check {
  readonly name: CheckName;
  readonly outcome: Outcome;
  readonly figure: number | null;
  readonly limit: number | null;
  readonly unit: string;
  readonly says: string;
}

export type BudgetPart = "truncation" | "rounding" | "readingOff" | "methodSpread" | "sampling";
export interface Budget {
  readonly truncation: number | null;
  readonly rounding: number | null;
  readonly readingOff: number | null;
  readonly methodSpread: number | null;
  readonly sampling: number | null;
  /** In quadrature. */
  readonly total: number | null;
  readonly dominant: BudgetPart | null;
}

export interface Ladder {
  readonly method: string;
  readonly role: "solution" | "witness";
  readonly formalOrder: number;
  readonly stateOrder: number | null;
  readonly figureOrder: number | null;
  /** 95 %, Student t. */
  readonly figureOrderInterval: readonly [number, number] | null;
  /** First and last rung of the window, as indices into `rungs`, coarsest first. */
  readonly window: readonly [number, number] | null;
  readonly shape: LadderShape;
  /** One sentence on what this ladder does. */
  readonly says: string;
  /** Richardson with the measured order, with its half-width; null when nothing can be extrapolated. */
  readonly extrapolated: { readonly value: number; readonly halfWidth: number } | null;
  /** Error law of the window, in the claim's unit: coefficient · stepsPerOrbit^-figureOrder. */
  readonly coefficient: number | null;
  /** Half-width of what rounding does to the figure, at the finest rung. */
  readonly floor: number | null;
  readonly rungs: readonly Rung[];
}

export interface Rung {
  /** s, or rad in angle form. */
  readonly step: number;
  readonly stepsPerOrbit: number;
  readonly status: RungStatus;
  /** The run's figure, raw. */
  readonly value: number | null;
  /** The null run's figure. */
  readonly null: number | null;
  /** The figure that this claim's ladder is about: value, or value - null when subtracted. */
  readonly figure: number | null;
  readonly standardError: number | null;
  /** Relative distance of the early state from the next finer rung's; null for the last. */
  readonly stateDifference: number | null;
  readonly evaluations: number;
  readonly seconds: number;
  /** The step that the author used. */
  readonly isAuthors: boolean;
}

export interface LedgerEntry {
  readonly quantity: string;
  /** Largest relative change over the span. */
  readonly largest: number;
  /** Secular relative change an orbit. */
  readonly perOrbit: number;
  readonly pattern: DriftPattern;
  /** Of |drift| ~ t^exponent, where fitted. */
  readonly exponent: number | null;
  /** Observed order of the drift in the step. */
  readonly stepOrder: number | null;
  /** Relative change against orbits since the start, thinned to at most 600 points by minimum and maximum. */
  readonly series: { readonly orbits: readonly number[]; readonly change: readonly number[] };
  readonly says: string;
}

export interface Remedy {
  /** The quote that today's solution can carry, in concise notation with unit; null if none. */
  readonly restated: string | null;
  readonly options: readonly RemedyOption[];
  readonly says: string;
}

export interface RemedyOption {
  readonly method: string;
  /** With unit, in the unit of the claim's own step. */
  readonly step: string;
  readonly stepsPerOrbit: number;
  /** Evaluations relative to the author's run. */
  readonly relativeCost: number;
  /** Measured on a rung of the ladder, or extended along the fitted law beyond it. */
  readonly basis: "measured" | "fitted";
}

export interface Setup {
  readonly equations: {
    readonly name: string;
    readonly title: string;
    readonly display: string;
    readonly source: string;
    readonly form: "time" | "angle";
  };
  readonly parameters: readonly { readonly name: string; readonly value: number; readonly unit: string }[];
  /** What the null run switches off, in words. */
  readonly nullRun: string;
  readonly start: readonly { readonly name: string; readonly value: number; readonly unit: string }[];
  readonly span: string;
  readonly method: {
    readonly name: string;
    readonly title: string;
    readonly order: number;
    readonly source: string;
  } | null;
  /** Of the author's program; null without a solution. */
  readonly arithmetic: "double" | "single" | null;
  /** As written in the claim. */
  readonly step: string | null;
  readonly stepsPerOrbit: number | null;
  readonly witnesses: readonly {
    readonly name: string;
    readonly title: string;
    readonly order: number;
    readonly source: string;
  }[];
}

export interface PassageSeries {
  /** Passage number. */
  readonly number: readonly number[];
  /** Apsidal angle less its first value and whole turns, in the claim's angle unit. */
  readonly angle: readonly number[];
}
