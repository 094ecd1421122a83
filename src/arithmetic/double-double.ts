import type Fraction from "fraction.js";
import * as word from "./double-word.js";
import { onNumbers } from "./machine.js";
import { wordsOf } from "./words.js";

/** A number of about 31 digits: an unevaluated sum of two doubles, range that of a double. */
export type DoubleDouble = word.Pair<number>;

export const ZERO: DoubleDouble = { high: 0, low: 0 };
export const ONE: DoubleDouble = { high: 1, low: 0 };

export const fromDouble = (value: number): DoubleDouble => ({ high: value, low: 0 });

/** The fraction rounded to nearest, and the rest rounded to nearest: within 2^-106 of it, relative. */
export function fromFraction(value: Fraction): DoubleDouble {
  const [high, low] = wordsOf(value, 2) as [number, number];
  return { high, low };
}

export const add = (x: DoubleDouble, y: DoubleDouble): DoubleDouble => word.add(onNumbers, x, y);
export const subtract = (x: DoubleDouble, y: DoubleDouble): DoubleDouble => word.add(onNumbers, x, negate(y));
export const multiply = (x: DoubleDouble, y: DoubleDouble): DoubleDouble => word.multiply(onNumbers, x, y);
export const divide = (x: DoubleDouble, y: DoubleDouble): DoubleDouble => word.divide(onNumbers, x, y);
export const negate = ({ high, low }: DoubleDouble): DoubleDouble => ({ high: -high, low: -low });
export const scale = (x: DoubleDouble, factor: number): DoubleDouble => word.scale(onNumbers, x, factor);
export const absolute = (x: DoubleDouble): DoubleDouble => (x.high < 0 ? negate(x) : x);
/** The nearest double. */
export const toDouble = ({ high, low }: DoubleDouble): number => high + low;
/** Times a power of two: exact. */
export const shift = ({ high, low }: DoubleDouble, power: number): DoubleDouble => ({
  high: high * power,
  low: low * power,
});

export function sqrt(x: DoubleDouble): DoubleDouble {
  return x.high === 0 ? x : word.squareRoot(onNumbers, x);
}

/** Negative, zero or positive as x is less than y, equal, or more. */
export function compare(x: DoubleDouble, y: DoubleDouble): number {
  return x.high === y.high ? x.low - y.low : x.high - y.high;
}

/** To a whole power, by squaring: an error of at most 7u² for each multiplication. */
export function wholePower(x: DoubleDouble, exponent: number): DoubleDouble {
  if (exponent < 0) return divide(ONE, wholePower(x, -exponent));
  let power = ONE;
  let square = x;
  for (let n = exponent; n > 0; n = Math.floor(n / 2)) {
    if (n % 2 === 1) power = multiply(power, square);
    if (n > 1) square = multiply(square, square);
  }
  return power;
}
