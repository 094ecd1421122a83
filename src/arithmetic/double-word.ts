import type { Machine } from "./machine.js";

/** An unevaluated sum of two doubles, the second no more than half a unit in the last place of the first. */
export interface Pair<T> {
  readonly high: T;
  readonly low: T;
}

/** 2^27 + 1 cuts a significand of 53 bits in two. Beyond 2^996 the product overflows. */
const CUT = 134_217_729;

/** Sum and its rounding error, exactly (D. E. Knuth, The Art of Computer Programming 2, 4.2.2, theorem B). */
export function twoSum<T>(m: Machine<T>, a: T, b: T): Pair<T> {
  const high = m.add(a, b);
  const bShare = m.subtract(high, a);
  const aShare = m.subtract(high, bShare);
  return { high, low: m.add(m.subtract(a, aShare), m.subtract(b, bShare)) };
}

/** The same where |a| ≥ |b|, or a is 0 (T. J. Dekker, Numerische Mathematik 18 (1971) 224). */
export function fastTwoSum<T>(m: Machine<T>, a: T, b: T): Pair<T> {
  const high = m.add(a, b);
  return { high, low: m.subtract(b, m.subtract(high, a)) };
}

/** Two halves of a double, of 26 bits each with their signs (G. W. Veltkamp; Dekker, the same). */
function split<T>(m: Machine<T>, a: T): Pair<T> {
  const shifted = m.multiply(m.constant(CUT), a);
  const high = m.subtract(shifted, m.subtract(shifted, a));
  return { high, low: m.subtract(a, high) };
}

/** Product and its rounding error, exactly, without a fused operation (Dekker, the same). */
export function twoProduct<T>(m: Machine<T>, a: T, b: T): Pair<T> {
  const high = m.multiply(a, b);
  const x = split(m, a);
  const y = a === b ? x : split(m, b);
  const first = m.subtract(m.multiply(x.high, y.high), high);
  const second = m.add(m.add(first, m.multiply(x.high, y.low)), m.multiply(x.low, y.high));
  return { high, low: m.add(second, m.multiply(x.low, y.low)) };
}

/*
 * Bounds of relative errors in u = 2^-53. M. Joldes, J.-M. Muller and V. Popescu, ACM Trans. Math. Softw. 44,
 * 15 (2017), and for the square root V. Lefèvre, N. Louvet, J.-M. Muller, J. Picot and L. Rideau, the same 49,
 * 1 (2023). They hold without under- and overflow.
 */

/** Algorithm 6, AccurateDWPlusDW: 3u²/(1 - 4u). */
export function add<T>(m: Machine<T>, x: Pair<T>, y: Pair<T>): Pair<T> {
  const s = twoSum(m, x.high, y.high);
  const t = twoSum(m, x.low, y.low);
  const v = fastTwoSum(m, s.high, m.add(s.low, t.high));
  return fastTwoSum(m, v.high, m.add(t.low, v.low));
}

/** Algorithm 7, DWTimesFP1: 2u². */
export function scale<T>(m: Machine<T>, x: Pair<T>, y: T): Pair<T> {
  const c = twoProduct(m, x.high, y);
  const t = fastTwoSum(m, c.high, m.multiply(x.low, y));
  return fastTwoSum(m, t.high, m.add(t.low, c.low));
}

/** Algorithm 10, DWTimesDW1: 7u². */
export function multiply<T>(m: Machine<T>, x: Pair<T>, y: Pair<T>): Pair<T> {
  const c = twoProduct(m, x.high, y.high);
  const cross = m.add(m.multiply(x.high, y.low), m.multiply(x.low, y.high));
  return fastTwoSum(m, c.high, m.add(c.low, cross));
}

/** Algorithm 17, DWDivDW2: 15u² + 56u³. */
export function divide<T>(m: Machine<T>, x: Pair<T>, y: Pair<T>): Pair<T> {
  const quotient = m.divide(x.high, y.high);
  const r = scale(m, y, quotient);
  const rest = m.add(m.subtract(x.high, r.high), m.subtract(x.low, r.low));
  return fastTwoSum(m, quotient, m.divide(rest, y.high));
}

/** Algorithm SQRTDWtoDW: 25/8 u². Of a number more than 0; the root of 0 is for the caller. */
export function squareRoot<T>(m: Machine<T>, x: Pair<T>): Pair<T> {
  const root = m.sqrt(x.high);
  const square = twoProduct(m, root, root);
  const rest = m.add(m.subtract(m.subtract(x.high, square.high), square.low), x.low);
  return fastTwoSum(m, root, m.divide(rest, m.add(root, root)));
}
