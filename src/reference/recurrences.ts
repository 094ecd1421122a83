import {
  type DoubleDouble,
  divide,
  fromDouble,
  multiply,
  negate,
  sqrt,
  subtract,
} from "../arithmetic/double-double.js";
import * as elementary from "../arithmetic/elementary.js";
import { operations } from "../arithmetic/operations.js";
import type { Node } from "../formula/graph.js";
import type { SeriesTable } from "./series.js";

/** Writes the k-th coefficient of a node's series, from lower ones and from those of its arguments up to k. */
export type Recurrence = (table: SeriesTable, k: number) => void;

/** Slots of a node, its first argument, and its second or what it needs beside them; whether they change. */
export interface Places {
  readonly own: number;
  readonly a: number;
  readonly b: number;
  readonly aMoves: boolean;
  readonly bMoves: boolean;
}

/**
 * The recurrences of Taylor coefficients (A. Jorba and M. Zou, Experimental Mathematics 14 (2005) 99, prop. 1;
 * R. E. Moore, Interval Analysis (1966), ch. 11).
 */
export function recurrence(node: Node, places: Places): Recurrence {
  const { own, a, b, aMoves, bMoves } = places;
  switch (node.op) {
    case "add":
      return (t, k) => t.sum(own, k, a, b, 1);
    case "subtract":
      return (t, k) => t.sum(own, k, a, b, -1);
    case "multiply":
      if (a === b) return (t, k) => t.square(own, k, a);
      if (!aMoves) return (t, k) => t.scaled(own, k, b, a);
      if (!bMoves) return (t, k) => t.scaled(own, k, a, b);
      return (t, k) => t.multiply(own, k, a, b);
    case "divide":
      return (t, k) => t.divide(own, k, a, b);
    case "sqrt":
      return begun(
        own,
        (t) => sqrt(t.get(a, 0)),
        (t, k) => t.root(own, k, a),
      );
    default: {
      const next = byValue(node.op, places);
      return (t, k) => t.set(own, k, next(t, k));
    }
  }
}

const begun =
  (own: number, first: (table: SeriesTable) => DoubleDouble, later: Recurrence): Recurrence =>
  (t, k) =>
    k === 0 ? t.set(own, 0, first(t)) : later(t, k);

/** The rarer ones. */
function byValue(op: Node["op"], { own, a, b }: Places): (table: SeriesTable, k: number) => DoubleDouble {
  switch (op) {
    case "negate":
      return (t, k) => negate(t.get(a, k));
    case "abs":
      return (t, k) => (t.get(a, 0).high < 0 ? negate(t.get(a, k)) : t.get(a, k));
    case "exp":
      return (t, k) =>
        k === 0 ? elementary.exp(t.get(a, 0)) : overWhole(t.weighted(a, own, k, 1, k, 0, 1), k);
    case "log":
      return (t, k) => {
        if (k === 0) return elementary.log(t.get(a, 0));
        const rest = overWhole(t.weighted(own, a, k, 1, k - 1, 0, 1), k);
        return divide(subtract(t.get(a, k), rest), t.get(a, 0));
      };
    case "sin":
      return (t, k) =>
        k === 0 ? elementary.sin(t.get(a, 0)) : overWhole(t.weighted(a, b, k, 1, k, 0, 1), k);
    case "cos":
      return (t, k) =>
        k === 0 ? elementary.cos(t.get(a, 0)) : negate(overWhole(t.weighted(a, b, k, 1, k, 0, 1), k));
    case "atan":
    case "asin":
    case "acos":
      return inverse(own, a, b, (x) => operations[op](x, x));
    case "power":
      return constantPower(own, a, b);
    default:
      throw new TypeError(`no recurrence for ${op}`);
  }
}

/** y' = a'/b: y_k = (a_k - (1/k) Σ j y_j b_(k-j)) / b_0. */
function inverse(
  own: number,
  a: number,
  b: number,
  value: (x: DoubleDouble) => DoubleDouble,
): (table: SeriesTable, k: number) => DoubleDouble {
  return (t, k) => {
    if (k === 0) return value(t.get(a, 0));
    const rest = overWhole(t.weighted(own, b, k, 1, k - 1, 0, 1), k);
    return divide(subtract(t.get(a, k), rest), t.get(b, 0));
  };
}

/** a^r with a constant r, the value of slot b: y_k = (1/(k a_0)) Σ_(j<k) (r (k - j) - j) a_(k-j) y_j, in two sums. */
function constantPower(own: number, a: number, b: number): (table: SeriesTable, k: number) => DoubleDouble {
  return (t, k) => {
    const exponent = t.get(b, 0);
    if (k === 0) return elementary.power(t.get(a, 0), exponent);
    const rising = multiply(exponent, t.weighted(own, a, k, 0, k - 1, k, -1));
    const falling = t.weighted(own, a, k, 1, k - 1, 0, 1);
    return divide(overWhole(subtract(rising, falling), k), t.get(a, 0));
  };
}

const overWhole = (value: DoubleDouble, k: number): DoubleDouble => divide(value, fromDouble(k));
