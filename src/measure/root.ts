/**
 * Narrows a change of sign of `f` between `a` and `b` down to rounding: to four units in the last place of
 * the larger end. Needs no derivative, never leaves the bracket, and halves it where the curve is unkind.
 *
 * Chandrupatla, "A new hybrid quadratic/bisection algorithm for finding the zero of a nonlinear function
 * without using derivatives", Advances in Engineering Software 28 (1997) 145. The first trial is the secant
 * instead of the middle, since most brackets here are nearly linear.
 *
 * @param fa value at `a`; its sign differs from that of `fb`
 * @returns the end of the last bracket with the smaller |f|
 *
 * @example findRoot((x) => x * x - 2, 1, -1, 2, 2) // 1.4142135623730951
 */
export function findRoot(f: (x: number) => number, a: number, fa: number, b: number, fb: number): number {
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (fa > 0 === fb > 0) throw new RangeError(`no change of sign between ${a} (${fa}) and ${b} (${fb})`);
  const tolerance = 4 * Number.EPSILON * Math.max(Math.abs(a), Math.abs(b));
  // x1 is the newest point, x2 the other end of the bracket, x3 the point before.
  let [x1, f1, x2, f2] = [b, fb, a, fa];
  let t = f1 / (f1 - f2);
  for (;;) {
    const least = tolerance / Math.abs(x2 - x1);
    if (!(least < 0.5)) return Math.abs(f1) < Math.abs(f2) ? x1 : x2;
    const x = x1 + Math.min(1 - least, Math.max(least, t)) * (x2 - x1);
    const fx = f(x);
    if (fx === 0) return x;
    let [x3, f3] = [x1, f1];
    if (fx > 0 !== f1 > 0) {
      [x3, f3] = [x2, f2];
      [x2, f2] = [x1, f1];
    }
    [x1, f1] = [x, fx];
    const xi = (x1 - x2) / (x3 - x2);
    const phi = (f1 - f2) / (f3 - f2);
    t =
      phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi
        ? (f1 / (f2 - f1)) * (f3 / (f2 - f3)) + ((x3 - x1) / (x2 - x1)) * (f1 / (f3 - f1)) * (f2 / (f3 - f2))
        : 0.5;
  }
}
