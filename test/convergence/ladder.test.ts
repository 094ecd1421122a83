import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { LadderPoint } from "../../src/convergence/differences.js";
import { analyseLadder } from "../../src/convergence/ladder.js";

const ladder = (count: number, figure: (halvings: number) => number, floor = 0): LadderPoint[] =>
  Array.from({ length: count }, (_, k) => ({ value: figure(k), floor }));

const trapezium = (f: (x: number) => number, a: number, b: number, n: number): number => {
  let sum = (f(a) + f(b)) / 2;
  for (let i = 1; i < n; i++) sum += f(a + ((b - a) * i) / n);
  return (sum * (b - a)) / n;
};

describe("a ladder whose limit is known in closed form", () => {
  it("finds order 2 and π in the trapezium rule on 4 / (1 + x²)", () => {
    const result = analyseLadder(
      ladder(8, (k) => trapezium((x) => 4 / (1 + x * x), 0, 1, 4 * 2 ** k), 1e-15),
    );
    expect(result.shape).toBe("asymptotic");
    expect(result.order!).toBeGreaterThan(1.98);
    expect(result.order!).toBeLessThan(2.02);
    expect(Math.abs(result.limit!.value - Math.PI)).toBeLessThanOrEqual(result.limit!.halfWidth);
    expect(result.limit!.halfWidth).toBeLessThan(1e-6);
  });

  it("finds order 3/2 and 2/3 in the trapezium rule on √x, whose derivative is singular at 0", () => {
    const result = analyseLadder(ladder(10, (k) => trapezium(Math.sqrt, 0, 1, 4 * 2 ** k), 1e-15));
    expect(Math.abs(result.order! - 1.5)).toBeLessThan(0.05);
    expect(Math.abs(result.limit!.value - 2 / 3)).toBeLessThanOrEqual(result.limit!.halfWidth);
  });

  it("finds order 1 of the forward difference of eˣ above its rounding floor, and stops there", () => {
    const points = Array.from({ length: 30 }, (_, k) => {
      const h = 0.5 / 2 ** k;
      // Cancellation of two values near 1: an absolute error of about one unit of the last place over h.
      return { value: (Math.exp(h) - 1) / h, floor: 2.2e-16 / h };
    });
    const result = analyseLadder(points);
    expect(Math.abs(result.order! - 1)).toBeLessThan(0.05);
    expect(result.window![1]).toBeLessThan(29);
    expect(Math.abs(result.limit!.value - 1)).toBeLessThanOrEqual(result.limit!.halfWidth);
  });

  it("calls a figure at rounding what is constant but for noise", () => {
    const noise = [3, -2, 1, 4, -3, 2, -1, 3];
    const result = analyseLadder(ladder(8, (k) => 42 + 1e-13 * noise[k]!, 4e-13));
    expect(result.shape).toBe("at-rounding");
    expect(result.order).toBeNull();
    expect(Math.abs(result.limit!.value - 42)).toBeLessThanOrEqual(result.limit!.halfWidth);
  });
});

describe("ladders that do not converge cleanly", () => {
  it.each([
    ["divergent", (k: number) => 2 ** k],
    ["stalled", (k: number) => 5 + 0.05 * (-1) ** k],
    ["oscillating", (k: number) => 1 + (-0.4) ** k],
  ] as const)("names a %s ladder", (shape, figure) =>
    expect(analyseLadder(ladder(8, figure)).shape).toBe(shape),
  );

  it("gives no limit to a divergent or a stalled ladder", () => {
    expect(analyseLadder(ladder(8, (k) => 2 ** k)).limit).toBeNull();
    expect(analyseLadder(ladder(8, (k) => 5 + 0.05 * (-1) ** k)).limit).toBeNull();
  });

  it("does not take a coarse run of order 4 for the law when order 1 takes over on the fine rungs", () => {
    const result = analyseLadder(ladder(14, (k) => 1 + 1e3 * 16 ** -k + 1e-4 * 2 ** -k, 1e-12));
    expect(result.order!).toBeLessThan(1.3);
    expect(Math.abs(result.limit!.value - 1)).toBeLessThanOrEqual(result.limit!.halfWidth);
  });

  it("claims no order 4 when order 1 shows on the last rung alone", () => {
    const result = analyseLadder(ladder(10, (k) => 1 + 1e3 * 16 ** -k + 1e-4 * 2 ** -k, 1e-12));
    expect(result.shape).not.toBe("asymptotic");
    expect(Math.abs(result.limit!.value - 1)).toBeLessThanOrEqual(result.limit!.halfWidth);
  });

  it("names a ladder of two rungs too short, and passes over coarse rungs without a figure", () => {
    expect(analyseLadder(ladder(2, (k) => k)).shape).toBe("too-short");
    const points = ladder(8, (k) => 1 + 4 ** -k, 1e-14).map((p, k) => (k < 2 ? { ...p, value: null } : p));
    expect(analyseLadder(points).window).toEqual([2, 7]);
  });

  it("passes over fine rungs that were not reached", () => {
    const points = ladder(8, (k) => 1 + 4 ** -k, 1e-14).map((p, k) => (k > 6 ? { ...p, value: null } : p));
    expect(analyseLadder(points).window).toEqual([0, 6]);
  });
});

it("covers the limit of made-up expansions with rounding noise in at least 99 % of cases", () => {
  let inside = 0;
  let all = 0;
  let windows = 0;
  fc.assert(
    fc.property(
      fc.integer({ min: 1, max: 8 }),
      fc.integer({ min: 1, max: 2 }),
      fc.integer({ min: -1000, max: 1000 }).map((n) => n / 1000),
      fc.integer({ min: -3000, max: 3000 }).map((n) => n / 1000),
      fc.integer({ min: 6, max: 14 }),
      fc.array(
        fc.integer({ min: -1000, max: 1000 }).map((n) => n / 1000),
        { minLength: 9, maxLength: 9 },
      ),
      (p, gap, c, d, digits, noise) => {
        const floor = 10 ** -digits;
        const points = ladder(
          9,
          (k) => 1 + c * 2 ** (-k * p) * (1 + d * 2 ** (-k * gap)) + floor * noise[k]!,
          floor,
        );
        const result = analyseLadder(points);
        if (result.shape === "asymptotic") windows++;
        if (result.limit === null) return;
        all++;
        if (Math.abs(result.limit.value - 1) <= result.limit.halfWidth) inside++;
      },
    ),
    { numRuns: 4000, seed: 20260 },
  );
  expect(windows).toBeGreaterThan(2000);
  expect(inside / all).toBeGreaterThan(0.99);
});
