import {
  add,
  compare,
  type DoubleDouble,
  divide,
  fromDouble,
  multiply,
  negate,
  ONE,
  scale,
  shift,
  sqrt,
  subtract,
  ZERO,
} from "../arithmetic/double-double.js";
import { cos, pi, turn } from "../arithmetic/elementary.js";

/** A motion in a plane whose radial rate and areal velocity are known functions of u = 1/r. */
export interface RadialMotion {
  /** u at a turning point, from which s = u - u0 counts. */
  readonly start: DoubleDouble;
  /** Coefficients of the square of dr/dt as a power series in s; the first is 0, since the start turns. */
  readonly rateSquared: readonly DoubleDouble[];
  /** h = r² dφ/dt at s. */
  arealVelocity(s: DoubleDouble): DoubleDouble;
}

/** An orbit from turning point to turning point and back. */
export interface ExactOrbit {
  /** Angle swept less one turn, rad. */
  readonly advance: DoubleDouble;
  readonly period: DoubleDouble;
  /** Of the advance as a part of a turn, and of the period as a part of itself. */
  readonly bound: number;
}

/** Nodes on half an orbit, at first and at last. */
const FIRST_NODES = 16;
const MOST_NODES = 2048;
const SETTLED = 1e-28;
/** Rounding in the sums; where the turns are near one another, dividing them out magnifies it. */
const ROUNDING = 1e-29;
const MOST_CORRECTIONS = 200;

/**
 * Quadrature of an orbit. With the two turning points divided out, (dr/dt)² = -s (s - s1) P(s), and
 * s = s1 (1 - cos θ)/2, angle and time are integrals over θ of smooth periodic functions, for which the midpoint
 * rule converges faster than any power (P. J. Davis and P. Rabinowitz, Methods of Numerical Integration, 2nd ed.
 * (1984), 2.9).
 *
 * @returns null where there is no second turning point between the start and infinity
 */
export function integrateOrbit({ start, rateSquared, arealVelocity }: RadialMotion): ExactOrbit | null {
  const other = otherTurn(rateSquared.slice(1), start);
  if (other === null) return null;
  // -P: what is left of the series without its two roots.
  const rest = deflated(rateSquared.slice(1), other).map(negate);
  let last: { readonly angle: DoubleDouble; readonly time: DoubleDouble } | null = null;
  for (let nodes = FIRST_NODES; nodes <= MOST_NODES; nodes *= 2) {
    let angle = ZERO;
    let time = ZERO;
    for (let k = 0; k < nodes; k++) {
      const theta = divide(scale(pi, 2 * k + 1), fromDouble(2 * nodes));
      const s = multiply(shift(other, 0.5), subtract(ONE, cos(theta)));
      const root = sqrt(horner(rest, s));
      const u = add(start, s);
      // Less 1, so that the sum is the advance and not the turn.
      angle = add(angle, subtract(divide(arealVelocity(s), root), ONE));
      time = add(time, divide(ONE, multiply(multiply(u, u), root)));
    }
    const step = divide(turn, fromDouble(nodes));
    const now = { angle: multiply(angle, step), time: multiply(time, step) };
    if (last !== null) {
      const off = Math.max(
        Math.abs(subtract(now.angle, last.angle).high) / turn.high,
        Math.abs(subtract(now.time, last.time).high / now.time.high),
      );
      // The error of the finer sum is that of the coarser squared: their difference bounds it.
      if (off <= SETTLED || 2 * nodes > MOST_NODES) {
        return {
          advance: now.angle,
          period: now.time,
          bound: off + ROUNDING * (1 + Math.abs(start.high / other.high)),
        };
      }
    }
    last = now;
  }
  return null;
}

const horner = (coefficients: readonly DoubleDouble[], x: DoubleDouble): DoubleDouble =>
  coefficients.reduceRight((sum, coefficient) => add(multiply(sum, x), coefficient), ZERO);

const derivative = (coefficients: readonly DoubleDouble[]): DoubleDouble[] =>
  coefficients.slice(1).map((coefficient, j) => scale(coefficient, j + 1));

/** The coefficients without the root s1, by Horner's scheme; the remainder is rounding. */
function deflated(coefficients: readonly DoubleDouble[], root: DoubleDouble): DoubleDouble[] {
  const quotient: DoubleDouble[] = [];
  let carried = ZERO;
  for (let j = coefficients.length - 1; j > 0; j--) {
    carried = add(multiply(carried, root), coefficients[j]!);
    quotient.unshift(carried);
  }
  return quotient;
}

/**
 * The root of a series between -start, which is infinitely far out, and 0: by Newton's method, kept in a bracket.
 *
 * @returns null where the series does not change from positive to negative: an orbit that escapes, or a start
 * that is no periapsis
 */
function otherTurn(coefficients: readonly DoubleDouble[], start: DoubleDouble): DoubleDouble | null {
  const slope = derivative(coefficients);
  let [out, near] = [negate(start), ZERO];
  if (!(horner(coefficients, out).high > 0 && coefficients[0]!.high < 0)) return null;
  // From the middle it gets there at once where the series is nearly a straight line, as it is.
  let s = shift(out, 0.5);
  for (let k = 0; k < MOST_CORRECTIONS; k++) {
    const value = horner(coefficients, s);
    if (value.high > 0) out = s;
    else near = s;
    const correction = divide(value, horner(slope, s));
    const next = subtract(s, correction);
    if (Math.abs(correction.high) <= 2 ** -103 * Math.abs(start.high)) return next;
    const inside = compare(next, out) > 0 && compare(next, near) < 0;
    s = inside ? next : shift(add(out, near), 0.5);
  }
  return s;
}
