import fc from "fast-check";
import { expect, it } from "vitest";
import { analyseLadder } from "../../src/convergence/ladder.js";
import { remainderOfTwoPowers } from "../../src/convergence/two-powers.js";

/** The trapezium rule for a periodic or smooth integrand: an expansion in even powers (Euler and Maclaurin). */
const trapezium = (f: (x: number) => number, n: number): number => {
  let sum = (f(0) + f(1)) / 2;
  for (let i = 1; i < n; i++) sum += f(i / n);
  return sum / n;
};

it("follows Romberg's columns as far as they converge: ln 2 to 1e-11 from errors of 1e-7", () => {
  const points = Array.from({ length: 9 }, (_, k) => ({
    value: trapezium((x) => 1 / (1 + x), 2 ** (k + 1)),
    floor: 1e-16,
  }));
  const { limit } = analyseLadder(points);
  expect(Math.abs(points.at(-1)!.value - Math.LN2)).toBeGreaterThan(1e-7);
  expect(Math.abs(limit!.value - Math.LN2)).toBeLessThanOrEqual(limit!.halfWidth);
  expect(limit!.halfWidth).toBeLessThan(1e-11);
});

it("does not apply a correction that three exponents do not vouch for", () => {
  const points = Array.from({ length: 5 }, (_, k) => ({
    value: trapezium((x) => 1 / (1 + x), 2 ** (k + 1)),
    floor: 1e-16,
  }));
  const { limit } = analyseLadder(points);
  expect(limit!.value).toBe(points.at(-1)!.value);
  expect(Math.abs(limit!.value - Math.LN2)).toBeLessThanOrEqual(limit!.halfWidth);
});

it("widens a limit when finer differences are off the law by more than their rounding", () => {
  const rung = (k: number) => ({ value: 1 + 2 ** (-8 * k), floor: 1e-9 });
  const clean = Array.from({ length: 6 }, (_, k) => rung(k));
  const off = clean.map((point, k) => (k === 5 ? { ...point, value: point.value + 5e-9 } : point));
  expect(analyseLadder(off).shape).toBe("asymptotic");
  expect(analyseLadder(off).limit!.halfWidth).toBeGreaterThan(3 * analyseLadder(clean).limit!.halfWidth);
});

it("finds the exact remainder of two powers, whether they add or cancel, once the lower one shows", () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 2, max: 8 }),
      fc.integer({ min: 1, max: 7 }),
      fc.double({ min: 0.02, max: 0.4, noNaN: true }),
      fc.boolean(),
      (leading, lower, share, cancels) => {
        fc.pre(lower < leading);
        // At the finest rung, k = 2, the lower power is this share of the leading one.
        const b = ((cancels ? -1 : 1) * share) / 2 ** (2 * (leading - lower));
        const error = (k: number): number => 2 ** (-leading * k) + b * 2 ** (-lower * k);
        const differences = [-1, 0, 1].map((k) => error(k) - error(k + 1)) as [number, number, number];
        const exponent = Math.log2(differences[1] / differences[2]);
        fc.pre(Math.abs(exponent - leading) < 1 && (cancels ? exponent > leading : exponent < leading));
        const found = remainderOfTwoPowers(...differences);
        expect(Math.abs(found / error(2) - 1)).toBeLessThan(1e-6);
      },
    ),
    { seed: 20_260, numRuns: 500 },
  );
});
