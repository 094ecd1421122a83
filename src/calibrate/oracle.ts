import type { Verdict } from "../result/result.js";
import { standingDigits } from "../verdict/digits.js";

/** What is known of a claim from outside the audit; figures in the claim's unit. */
export interface Known {
  /** Q*, exact for all that matters here. */
  readonly truth: number;
  readonly claimed: { readonly value: number; readonly halfWidth: number };
  /** Figures of the author's own run, and at a half, a quarter and an eighth of its step; null where a run gave none. */
  readonly runs: readonly (number | null)[];
  /** The same of the run and, where it is subtracted, of its null run, each by itself. */
  readonly ladders: readonly { readonly figures: readonly (number | null)[]; readonly rounding: number }[];
  /** How far rounding moves such a figure. */
  readonly rounding: number;
  readonly isMistyped: boolean;
  /** What doubles leave open, where there is no reference to see below it; else 0. */
  readonly leftOpen: number;
}

/** How many times what a few perturbed runs show of rounding an audit may take it to be. */
const CLOSE = 2;
/** Exponents of a window agree within a quarter: half as much is certain. */
const AGREE = 0.125;

/**
 * The verdicts that are right by the rules of the verdict on the numbers as they are. More than one where a
 * number lies at a limit, within what rounding leaves open.
 */
export function rightVerdicts(known: Known): ReadonlySet<Verdict> {
  const { truth, claimed, runs, rounding, isMistyped } = known;
  const figure = runs[0] ?? null;
  if (figure === null) return new Set(["not-resolved"]);
  const distance = Math.abs(claimed.value - truth);
  const error = Math.abs(figure - truth);
  const right = new Set<Verdict>();
  if (claimed.halfWidth / 3 < known.leftOpen) right.add("undetermined");
  // The audit adds what rounding may do to the error; without a reference it knows truth no better than doubles do.
  const { leftOpen } = known;
  for (const e of [error, error + CLOSE * rounding + leftOpen]) {
    for (const d of [Math.max(0, distance - leftOpen), distance, distance + leftOpen]) {
      for (const trusted of isMistyped ? [false] : convergence(known)) {
        right.add(verdict(truth, d, e, claimed, trusted));
      }
    }
  }
  return right;
}

/**
 * Whether the author's step lies where the figure converges: yes, no, or hard to say. A difference of two runs is
 * seldom monotone; it converges where both do.
 */
function convergence({ ladders }: Known): readonly boolean[] {
  const each = ladders.map(({ figures, rounding }) => converges(figures, rounding));
  if (each.some((answers) => !answers.includes(true))) return [false];
  return each.every((answers) => answers.length === 1) ? [true] : [true, false];
}

function converges(given: readonly (number | null)[], rounding: number): readonly boolean[] {
  const figures = given.map((figure) => figure ?? Number.NaN);
  const differences = figures.slice(1).map((figure, k) => figures[k]! - figure);
  // Down to rounding there is no more to ask.
  if (differences.every((difference) => Math.abs(difference) <= 3 * rounding)) return [true];
  if (!differences.every((difference) => Math.abs(difference) > 10 * rounding)) return [true, false];
  const [first, second] = differences.slice(1).map((fine, k) => Math.log2(differences[k]! / fine)) as [
    number,
    number,
  ];
  if (Math.abs(first - second) <= AGREE && second > AGREE) return [true];
  // Every order there is halves a difference at least.
  const sinks = differences.slice(1).every((fine, k) => Math.abs(fine) <= Math.abs(differences[k]!) / 2);
  return sinks ? [true, false] : [false];
}

function verdict(
  truth: number,
  distance: number,
  error: number,
  claimed: Known["claimed"],
  trusted: boolean,
): Verdict {
  const holdsZero = Math.abs(claimed.value) <= claimed.halfWidth;
  const clear = holdsZero || Math.abs(truth) >= 10 * error;
  if (distance > claimed.halfWidth + error) return "contradicted";
  const right = distance <= claimed.halfWidth && error <= claimed.halfWidth / 3;
  if (right && clear && trusted) return "resolved";
  const digits = holdsZero
    ? Number(error + distance <= claimed.halfWidth)
    : (standingDigits(truth, error, distance) ?? 0);
  return clear && digits >= 1 ? "partly-resolved" : "not-resolved";
}

/** A verdict of resolved for a figure that is not, with no more to spare than rounding of the last digit. */
export function isWrongResolved({ truth, claimed, runs, isMistyped }: Known): boolean {
  const figure = runs[0] ?? null;
  const error = figure === null ? Infinity : Math.abs(figure - truth);
  const slack = 1 + 1e-9;
  return (
    isMistyped ||
    Math.abs(claimed.value - truth) > claimed.halfWidth * slack ||
    error > (claimed.halfWidth / 3) * slack
  );
}

/** Digits that stand, for the error as it is and as rounding may have made it. */
export function rightDigits({ truth, claimed, runs, rounding }: Known): readonly number[] {
  const figure = runs[0] ?? null;
  if (figure === null) return [];
  const error = Math.abs(figure - truth);
  const distance = Math.abs(claimed.value - truth);
  return [error, error + rounding].flatMap((e) => standingDigits(truth, e, distance) ?? []);
}
