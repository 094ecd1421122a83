import {
  add,
  type DoubleDouble,
  divide,
  fromDouble,
  multiply,
  ONE,
  scale,
  shift,
  sqrt,
  subtract,
  ZERO,
} from "../arithmetic/double-double.js";
import { cos, pi, turn } from "../arithmetic/elementary.js";
import type { ExactOrbit } from "./radial-quadrature.js";

const FIRST_NODES = 8;
const MOST_NODES = 4096;
const SETTLED = 1e-30;

/**
 * u'' + u = K + 3 m u² from a periapsis u2. Its first integral has the roots u1, u2 and 1/(2m) - u1 - u2, so that
 * u'² = (u2 - u)(u - u1) g with g = 1 - 2m (u + u1 + u2), and with u = middle + half-width cos θ the angle from
 * turn to turn and back is 2 ∫ dθ/sqrt(g) over half a turn.
 */
export function schwarzschildAdvance(
  parameters: Readonly<Record<string, DoubleDouble>>,
  [u2, slope]: readonly DoubleDouble[],
): ExactOrbit | null {
  const { GM, c, "inverse-semi-latus-rectum": K } = parameters;
  if (slope!.high !== 0) return null;
  const m = divide(GM!, multiply(c!, c!));
  const twoM = shift(m, 2);
  const b = subtract(ONE, multiply(twoM, u2!));
  const product = subtract(shift(K!, 2), multiply(u2!, b));
  const discriminant = subtract(multiply(b, b), scale(multiply(m, product), 8));
  // The smaller root of 2m u² - b u + product, without cancellation.
  const u1 = divide(shift(product, 2), add(b, sqrt(discriminant)));
  if (!(u1.high > 0 && u1.high < u2!.high)) return null;
  const middle = shift(add(u1, u2!), 0.5);
  const width = shift(subtract(u2!, u1), 0.5);
  const sum = add(u1, u2!);
  let last: DoubleDouble | null = null;
  for (let nodes = FIRST_NODES; nodes <= MOST_NODES; nodes *= 2) {
    let total = ZERO;
    for (let k = 0; k < nodes; k++) {
      const theta = divide(scale(pi, 2 * k + 1), fromDouble(2 * nodes));
      const u = add(middle, multiply(width, cos(theta)));
      const less = multiply(twoM, add(u, sum));
      const root = sqrt(subtract(ONE, less));
      // 1/root - 1 without cancellation.
      total = add(total, divide(less, multiply(root, add(ONE, root))));
    }
    const advance: DoubleDouble = multiply(total, divide(turn, fromDouble(nodes)));
    if (last !== null) {
      const off = Math.abs(subtract(advance, last).high) / turn.high;
      if (off <= SETTLED) return { advance, period: add(turn, advance), bound: off + SETTLED };
    }
    last = advance;
  }
  return null;
}
