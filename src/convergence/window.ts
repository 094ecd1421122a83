import { fitLine } from "../statistics/line.js";
import { studentT95 } from "../statistics/student-t.js";
import { type Difference, type Exponent, localExponent } from "./differences.js";

/** The rungs over which the differences follow one power of the step. */
export interface Window {
  /** The differences inside, coarsest first; at least three. */
  readonly differences: readonly Difference[];
  /** First and last rung. */
  readonly rungs: readonly [number, number];
  readonly exponent: number;
  /** 95 %, Student t. */
  readonly interval: readonly [number, number];
}

/**
 * The lower end of the exponent's interval, but no higher than another measure of it; and no order is below one,
 * unless it is measured to be.
 */
export const lowestExponent = ({ interval }: Window, measured: number): number =>
  Math.min(Math.max(1, interval[0]), measured);

/**
 * How far exponents of one window may lie from their mean. The next term of the error expansion shifts a
 * local exponent by 2^-q from rung to rung; a quarter keeps the ratio of successive errors within 19 % of
 * 2^p, which the safety factor 1.25 of the extrapolation covers.
 */
const AGREEMENT = 0.25;

/**
 * A floor measured on a few runs may be short by some factor. Up to 10 times its 95 % half-width, what the
 * finest difference is off the law of the ones before may be rounding; beyond that it is not.
 */
const UNDERRATED_FLOOR = 10;

/**
 * The longest run of agreeing exponents that ends at the finest difference clear of rounding, or one before
 * it where rounding may explain the last. A run that ends sooner is not the asymptotic one: something else
 * takes over on the finer rungs.
 *
 * @returns null when fewer than two exponents agree
 */
export function findWindow(differences: readonly Difference[]): Window | null {
  const finest = lastClear(differences);
  const whole = agreeingRun(differences, finest);
  if (whole.length >= 3) return fitWindow(whole);
  const shorter = agreeingRun(differences, finest - 1);
  if (shorter.length < 3) return null;
  const window = fitWindow(shorter);
  const dropped = differences[finest]!;
  const expected = differences[finest - 1]!.value / 2 ** window.exponent;
  return Math.abs(dropped.value - expected) <= UNDERRATED_FLOOR * dropped.noise ? window : null;
}

/** The finest difference that is clear of rounding together with the one before it: one alone may be chance. */
function lastClear(differences: readonly Difference[]): number {
  for (let k = differences.length - 1; k > 0; k--) {
    if (differences[k]!.clear && differences[k - 1]!.clear) return k;
  }
  return -1;
}

function agreeingRun(differences: readonly Difference[], last: number): Difference[] {
  const exponents: Exponent[] = [];
  let first = last;
  while (first > 0) {
    const next = localExponent(differences[first - 1]!, differences[first]!);
    if (next === null) break;
    const widened = [next, ...exponents];
    const centre = widened.reduce((sum, e) => sum + e.value, 0) / widened.length;
    if (widened.some((e) => Math.abs(e.value - centre) > AGREEMENT + e.noise)) break;
    exponents.unshift(next);
    first--;
  }
  return exponents.length === 0 || !(exponents[0]!.value > 0) ? [] : differences.slice(first, last + 1);
}

/**
 * log2|D| on log2 h. A difference is off the law by the next term of the expansion, which fades by half a
 * rung or faster, and by its rounding; the weights are one over both in squares.
 */
function fitWindow(differences: readonly Difference[]): Window {
  const nextTerm = (d: Difference): number => AGREEMENT / 2 ** (d.rung - differences[0]!.rung);
  const line = fitLine(
    differences.map((d) => -d.rung),
    differences.map((d) => Math.log2(Math.abs(d.value))),
    differences.map((d) => 1 / (nextTerm(d) ** 2 + (d.noise / d.value / Math.LN2) ** 2)),
  )!;
  const half = studentT95(line.degrees) * line.slopeError!;
  return {
    differences,
    rungs: [differences[0]!.rung, differences.at(-1)!.rung + 1],
    exponent: line.slope,
    interval: [line.slope - half, line.slope + half],
  };
}
