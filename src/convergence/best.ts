import type { Estimate } from "./estimators/estimator.js";

/** A method's own limit of its ladder. */
export interface MethodEstimate extends Estimate {
  readonly method: string;
}

/** The value that the audit holds the claim against. */
export interface BestValue extends Estimate {
  /** The method that gives the value, and the one that it was checked with. */
  readonly carrier: string;
  readonly second: string | null;
  /** Distance between the two limits. */
  readonly apart: number | null;
  /** The two agree within their own uncertainties. */
  readonly sound: boolean;
}

/**
 * Takes the tightest limit and holds it against the next tightest of another method.
 * Its half-width is widened by their distance, so that the second method's value lies inside it.
 *
 * @param estimates one a method, none of them the author's
 * @returns null without any estimate
 */
export function chooseBest(estimates: readonly MethodEstimate[]): BestValue | null {
  const [first, second] = [...estimates].sort(
    (a, b) => a.halfWidth - b.halfWidth || a.method.localeCompare(b.method),
  );
  if (first === undefined) return null;
  if (second === undefined) {
    return { ...pick(first), carrier: first.method, second: null, apart: null, sound: false };
  }
  const apart = Math.abs(first.value - second.value);
  const sound = apart <= first.halfWidth + second.halfWidth;
  return {
    value: first.value,
    halfWidth: Math.max(first.halfWidth, apart),
    carrier: first.method,
    second: second.method,
    apart,
    sound,
  };
}

const pick = ({ value, halfWidth }: Estimate): Estimate => ({ value, halfWidth });
