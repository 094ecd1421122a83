import Fraction from "fraction.js";
import {
  add,
  compare,
  type DoubleDouble,
  divide,
  fromDouble,
  fromFraction,
  multiply,
  negate,
  ONE,
  shift,
  sqrt,
  subtract,
  wholePower,
  ZERO,
} from "./double-double.js";
import { twoProduct } from "./double-word.js";
import { onNumbers } from "./machine.js";
import { LN2, PI, wordsOf } from "./words.js";

/**
 * Elementary functions of double-double numbers. Arguments are cut down with constants of three words, series
 * are summed from the small end; errors stay below 16u² relative with u = 2^-53, but where stated.
 */
const EPSILON = 2 ** -104;

/** Terms up to which a series is carried: x^30/30! is 3e-36 at a half turn's quarter. */
const TERMS = 30;
const INVERSE_FACTORIALS: readonly DoubleDouble[] = inverseFactorials();
const HALF_PI = wordsOf(PI.div(2), 3);
const LN2_WORDS = wordsOf(LN2, 3);
const PI_PAIR = fromFraction(PI);

function inverseFactorials(): DoubleDouble[] {
  const inverses: DoubleDouble[] = [];
  let factorial = new Fraction(1);
  for (let n = 0; n <= TERMS; n++) {
    if (n > 0) factorial = factorial.mul(n);
    inverses.push(fromFraction(factorial.inverse()));
  }
  return inverses;
}

/** x less a whole number of three-word constants, to the digits of x. */
function reduce(x: DoubleDouble, times: number, words: readonly number[]): DoubleDouble {
  return words.reduce((rest, word) => subtract(rest, twoProduct(onNumbers, times, word)), x);
}

/** Sum of c_n x^n over every second n from `first` up, with alternating signs where `sign` is -1. */
function series(x: DoubleDouble, first: number, stride: number, sign: number): DoubleDouble {
  const power = stride === 1 ? x : multiply(x, x);
  const step = sign < 0 ? negate(power) : power;
  const last = first + stride * Math.floor((TERMS - first) / stride);
  let sum = INVERSE_FACTORIALS[last]!;
  for (let n = last - stride; n >= first; n -= stride) {
    sum = add(multiply(sum, step), INVERSE_FACTORIALS[n]!);
  }
  return first === 0 ? sum : multiply(sum, x);
}

/**
 * Cosine and sine. Of an argument of more than 2^30 the quarter turns are no longer told apart exactly: the
 * error then grows with it.
 */
export function cosineAndSine(x: DoubleDouble): readonly [DoubleDouble, DoubleDouble] {
  const quarters = Math.round(x.high / HALF_PI[0]!);
  const rest = reduce(x, quarters, HALF_PI);
  const c = series(rest, 0, 2, -1);
  const s = series(rest, 1, 2, -1);
  switch (((quarters % 4) + 4) % 4) {
    case 0:
      return [c, s];
    case 1:
      return [negate(s), c];
    case 2:
      return [negate(c), negate(s)];
    default:
      return [s, negate(c)];
  }
}

export const cos = (x: DoubleDouble): DoubleDouble => cosineAndSine(x)[0];
export const sin = (x: DoubleDouble): DoubleDouble => cosineAndSine(x)[1];
export function tan(x: DoubleDouble): DoubleDouble {
  const [c, s] = cosineAndSine(x);
  return divide(s, c);
}

export function exp(x: DoubleDouble): DoubleDouble {
  // Outside of this a double is 0 or infinite.
  if (!(Math.abs(x.high) < 700)) return fromDouble(Math.exp(x.high));
  const doublings = Math.round(x.high / LN2_WORDS[0]!);
  return shift(series(reduce(x, doublings, LN2_WORDS), 0, 1, 1), 2 ** doublings);
}

/** Natural logarithm; NaN of a negative number. */
export function log(x: DoubleDouble): DoubleDouble {
  if (!(x.high > 0)) return fromDouble(Math.log(x.high));
  if (Math.abs(x.high - 1) < 0.1) return logNearOne(x);
  const guess = fromDouble(Math.log(x.high));
  // log x = y + log(1 + w) with w = x exp(-y) - 1, which is of the size of a double's last bit.
  const w = subtract(multiply(x, exp(negate(guess))), ONE);
  return add(guess, subtract(w, shift(multiply(w, w), 0.5)));
}

/** 2 atanh s = 2 (s + s³/3 + s⁵/5 + ...) with s = (x - 1)/(x + 1): keeps the digits of a small logarithm. */
function logNearOne(x: DoubleDouble): DoubleDouble {
  const s = divide(subtract(x, ONE), add(x, ONE));
  const square = multiply(s, s);
  let power = s;
  let sum = s;
  for (let n = 3; Math.abs(power.high) > EPSILON * Math.abs(sum.high); n += 2) {
    power = multiply(power, square);
    sum = add(sum, divide(power, fromDouble(n)));
  }
  return shift(sum, 2);
}

/** x^y. Whole powers by squaring; others as exp(y log x), with an error of (16 + 32 |y log x|) u². */
export function power(x: DoubleDouble, y: DoubleDouble): DoubleDouble {
  if (y.low === 0 && Number.isInteger(y.high) && Math.abs(y.high) <= 1024) return wholePower(x, y.high);
  if (y.low === 0 && Number.isInteger(2 * y.high) && Math.abs(y.high) <= 64) {
    return multiply(wholePower(x, y.high - 0.5), sqrt(x));
  }
  if (x.high === 0) return fromDouble(x.high ** y.high);
  return exp(multiply(y, log(x)));
}

/** The angle from the first axis to (x, y), in (-π, π], rad. */
export function atan2(y: DoubleDouble, x: DoubleDouble): DoubleDouble {
  if (y.high === 0 && x.high === 0) return ZERO;
  if (y.high === 0 && y.low === 0) return x.high > 0 ? ZERO : PI_PAIR;
  const guess = fromDouble(Math.atan2(y.high, x.high));
  const [c, s] = cosineAndSine(guess);
  const size = sqrt(add(multiply(x, x), multiply(y, y)));
  // The sine of what is left of the angle: of the size of a double's last bit, so that it is the angle.
  return add(guess, divide(subtract(multiply(y, c), multiply(x, s)), size));
}

export const atan = (x: DoubleDouble): DoubleDouble => atan2(x, ONE);
export const asin = (x: DoubleDouble): DoubleDouble => atan2(x, coSide(x));
export const acos = (x: DoubleDouble): DoubleDouble => atan2(coSide(x), x);

/** sqrt(1 - x²) as sqrt((1 - x)(1 + x)). NaN beyond ±1. */
function coSide(x: DoubleDouble): DoubleDouble {
  const product = multiply(subtract(ONE, x), add(ONE, x));
  return compare(product, ZERO) < 0 ? fromDouble(Number.NaN) : sqrt(product);
}

export const pi = PI_PAIR;
export const turn = shift(PI_PAIR, 2);
/** x less the whole turns nearest to it, to the digits of x. */
export function lessTurns(x: DoubleDouble, turns: number): DoubleDouble {
  return reduce(x, 4 * turns, HALF_PI);
}
