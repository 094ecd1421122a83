import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { findRoot } from "../../src/measure/root.js";

describe("findRoot", () => {
  it("finds roots that are known in closed form, to rounding", () => {
    const off = (f: (x: number) => number, a: number, b: number, root: number): number =>
      Math.abs(findRoot(f, a, f(a), b, f(b)) - root) / Math.max(Math.abs(a), Math.abs(b));
    // The bracket is narrowed to four units in the last place of its larger end.
    expect(off((x) => x * x - 2, 1, 2, Math.SQRT2)).toBeLessThan(4 * Number.EPSILON);
    expect(off(Math.cos, 1, 2, Math.PI / 2)).toBeLessThan(4 * Number.EPSILON);
    expect(off((x) => Math.exp(x) - 5, 0, 4, Math.log(5))).toBeLessThan(4 * Number.EPSILON);
  });

  it("takes few evaluations on the nearly linear curves that it is for", () => {
    let calls = 0;
    const f = (x: number): number => {
      calls++;
      return x - 0.3 + 0.01 * x * x;
    };
    const root = findRoot(f, 0, -0.3, 1, 0.71);
    expect(Math.abs(f(root))).toBeLessThan(2e-16);
    expect(calls).toBeLessThan(10);
  });

  it("finds the root of any bracket, steep, flat or kinked", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.001, max: 0.999, noNaN: true }),
        fc.double({ min: 0.1, max: 9, noNaN: true }),
        fc.double({ min: 1e-8, max: 1e8, noNaN: true }),
        (root, power, scale) => {
          const f = (x: number): number => scale * Math.sign(x - root) * Math.abs(x - root) ** power;
          expect(Math.abs(findRoot(f, 0, f(0), 1, f(1)) - root)).toBeLessThan(1e-15);
        },
      ),
    );
  });

  it("takes an end that is a root already, and refuses a bracket without a change of sign", () => {
    expect(findRoot((x) => x, 0, 0, 1, 1)).toBe(0);
    expect(findRoot((x) => x - 1, 0, -1, 1, 0)).toBe(1);
    expect(() => findRoot((x) => x + 1, 0, 1, 1, 2)).toThrow(/no change of sign/);
  });
});
