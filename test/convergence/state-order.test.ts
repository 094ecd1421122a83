import { describe, expect, it } from "vitest";
import type { Difference } from "../../src/convergence/differences.js";
import { stateOrder } from "../../src/convergence/state-order.js";

const distances = (values: readonly number[], noise: number): Difference[] =>
  values.map((value, rung) => ({ rung, value, noise, clear: value > 4 * noise }));
/** Distance of successive rungs of a rule for e = exp(1), whose limit is known. */
const successive = (rule: (n: number) => number, count: number): number[] =>
  Array.from({ length: count }, (_, k) => Math.abs(rule(4 * 2 ** k) - rule(8 * 2 ** k)));

describe("stateOrder", () => {
  it("finds order 1 of the compound-interest limit (1 + 1/n)^n of e", () => {
    const found = stateOrder(
      distances(
        successive((n) => (1 + 1 / n) ** n, 10),
        1e-15,
      ),
    )!;
    expect(Math.abs(found.order - 1)).toBeLessThan(0.02);
    expect(found.rungs).toEqual([6, 10]);
  });

  it("finds order 2 of ((2n + 1) / (2n - 1))^n", () => {
    const found = stateOrder(
      distances(
        successive((n) => ((2 * n + 1) / (2 * n - 1)) ** n, 10),
        1e-14,
      ),
    )!;
    expect(Math.abs(found.order - 2)).toBeLessThan(0.02);
  });

  it("looks past the differences that are rounding, and at no more than four", () => {
    const found = stateOrder(
      distances([1, 2 ** -2, 2 ** -7, 2 ** -11, 2 ** -15, 2 ** -19, 1e-9, 3e-9], 1e-8),
    )!;
    expect(found.order).toBeCloseTo(4, 1);
    expect(found.rungs[1]).toBe(6);
  });

  it("gives an order without an interval from two differences", () => {
    const found = stateOrder(distances([1e-3, 1e-3 / 256, 1e-14, 2e-14], 1e-12))!;
    expect(found.order).toBeCloseTo(8, 10);
    expect(found.interval).toBeNull();
  });

  it("finds nothing where all is rounding", () => {
    expect(stateOrder(distances([1e-15, 2e-15, 1e-15], 1e-15))).toBeNull();
    expect(stateOrder([])).toBeNull();
  });
});
