import type { Verdict } from "../result/result.js";
import { standingDigits } from "../verdict/digits.js";

/** What is known of a claim from outside the audit; figures in the claim's unit. */
export interface Known {
  /** Q*, exact for all that matters here. */
  readonly truth: number;
  readonly claimed: { readonly value: number; readonly halfWidth: number };
  /** Figures of the author's own run, and at half and a quarter of its step; null where a run gave none. */
  readonly runs: readonly [number | null, number | null, number | null];
  /** How far rounding moves such a figure. */
  readonly rounding: number;
  readonly isMistyped: boolean;
}

/** A margin by which a number may miss a limit before the case counts as clear. */
const CLOSE = 1.1;
/** Errors that fall by less than this at each halving follow no order. */
const FALLS = 1.5;

/**
 * The verdicts that are right by the rules of the verdict on the numbers as they are. More than one where a
 * number lies at a limit, within what rounding leaves open.
 */
export function rightVerdicts(known: Known): ReadonlySet<Verdict> {
  const { truth, claimed, runs, rounding, isMistyped } = known;
  if (runs[0] === null) return new Set(["not-resolved"]);
  const distance = Math.abs(claimed.value - truth);
  const error = Math.abs(runs[0] - truth);
  const right = new Set<Verdict>();
  for (const e of [error / CLOSE, error, error * CLOSE + rounding]) {
    for (const u of [claimed.halfWidth / CLOSE, claimed.halfWidth * CLOSE]) {
      for (const trusted of isMistyped ? [false] : convergence(known)) {
        right.add(verdict(truth, distance, e, { ...claimed, halfWidth: u }, trusted));
      }
    }
  }
  return right;
}

/** Whether the author's step lies where the figure converges: yes, no, or hard to say. */
function convergence({ truth, runs, rounding }: Known): readonly boolean[] {
  const errors = runs.map((run) => (run === null ? Infinity : Math.abs(run - truth)));
  const [at, half, quarter] = errors as [number, number, number];
  const falls = (coarse: number, fine: number): boolean => fine <= coarse / FALLS || fine <= 3 * rounding;
  if (falls(at, half) && falls(half, quarter))
    return at <= 3 * rounding ? [true] : [true, ...unsteady(errors)];
  return half > at && half > 3 * rounding ? [false] : [true, false];
}

/** Errors that fall, but not by one power of the step, may be outside of the window all the same. */
function unsteady([at, half, quarter]: readonly number[]): readonly boolean[] {
  const [first, second] = [Math.log2(at! / half!), Math.log2(half! / quarter!)];
  return Math.abs(first - second) > 0.5 ? [false] : [];
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
  const error = runs[0] === null ? Infinity : Math.abs(runs[0] - truth);
  const slack = 1 + 1e-9;
  return (
    isMistyped ||
    Math.abs(claimed.value - truth) > claimed.halfWidth * slack ||
    error > (claimed.halfWidth / 3) * slack
  );
}

/** Digits that stand, for the error as it is and as rounding may have made it. */
export function rightDigits({ truth, claimed, runs, rounding }: Known): readonly number[] {
  if (runs[0] === null) return [];
  const error = Math.abs(runs[0] - truth);
  const distance = Math.abs(claimed.value - truth);
  return [error, error + rounding].flatMap((e) => standingDigits(truth, e, distance) ?? []);
}
