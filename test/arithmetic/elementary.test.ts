import { describe, expect, it } from "vitest";
import type { DoubleDouble } from "../../src/arithmetic/double-double.js";
import * as elementary from "../../src/arithmetic/elementary.js";
import { LN2, PI } from "../../src/arithmetic/words.js";
import { Decimal, type Exact, errorInU2, exactly } from "./exact.js";
import { generator, randomPair } from "./numbers.js";

interface Case {
  readonly name: string;
  readonly operation: (x: DoubleDouble) => DoubleDouble;
  readonly truth: (x: Exact) => Exact;
  /** Sizes of arguments, in decades from 1. */
  readonly decades: number;
  readonly domain?: (x: DoubleDouble) => boolean;
}

const within = (low: number, high: number) => (x: DoubleDouble) => x.high > low && x.high < high;
const cases: readonly Case[] = [
  { name: "sine", operation: elementary.sin, truth: (x) => x.sin(), decades: 8 },
  { name: "cosine", operation: elementary.cos, truth: (x) => x.cos(), decades: 8 },
  { name: "tangent", operation: elementary.tan, truth: (x) => x.tan(), decades: 4 },
  {
    name: "exponential",
    operation: elementary.exp,
    truth: (x) => x.exp(),
    decades: 2.5,
    domain: within(-690, 690),
  },
  {
    name: "logarithm",
    operation: elementary.log,
    truth: (x) => x.ln(),
    decades: 30,
    domain: within(0, 1e40),
  },
  { name: "arctangent", operation: elementary.atan, truth: (x) => x.atan(), decades: 20 },
  { name: "arcsine", operation: elementary.asin, truth: (x) => x.asin(), decades: 4, domain: within(-1, 1) },
];

describe("elementary functions beside decimal.js", () => {
  it.each(cases)("$name stays within 16u²", ({ operation, truth, decades, domain }) => {
    const random = generator(31);
    let tried = 0;
    while (tried < 400) {
      const x = randomPair(random, decades);
      if (domain !== undefined && !domain(x)) continue;
      tried++;
      expect(errorInU2(operation(x), truth(exactly(x)))).toBeLessThanOrEqual(16);
    }
  });

  it("keeps the digits of a logarithm near 1", () => {
    const random = generator(32);
    for (let i = 0; i < 200; i++) {
      const x = { high: 1 + (random() - 0.5) * 2 ** -Math.floor(random() * 45), low: 0 };
      if (x.high === 1) continue;
      expect(errorInU2(elementary.log(x), exactly(x).ln())).toBeLessThanOrEqual(16);
    }
  });

  it("keeps the digits of sines next to whole half turns", () => {
    for (let halves = 1; halves <= 1000; halves *= 3) {
      const x = { high: halves * Math.PI, low: 0 };
      expect(errorInU2(elementary.sin(x), exactly(x).sin())).toBeLessThanOrEqual(16);
    }
  });

  it("raises to any power within (16 + 32 |y log x|) u²", () => {
    const random = generator(33);
    for (let i = 0; i < 300; i++) {
      const x = { ...randomPair(random, 10) };
      if (x.high <= 0) continue;
      const y = i % 5 === 0 ? { high: Math.round(random() * 20) / 2, low: 0 } : randomPair(random, 0.8);
      const exponent = exactly(y).times(exactly(x).ln());
      if (exponent.abs().gt(600)) continue;
      const bound = 16 + 32 * exponent.abs().toNumber();
      expect(errorInU2(elementary.power(x, y), exactly(x).pow(exactly(y)))).toBeLessThanOrEqual(bound);
    }
  });

  it("finds the angle of a place in every quadrant", () => {
    const random = generator(34);
    for (let i = 0; i < 300; i++) {
      const [x, y] = [randomPair(random, 6), randomPair(random, 6)];
      const truth = Decimal.atan2(exactly(y), exactly(x));
      expect(errorInU2(elementary.atan2(y, x), truth)).toBeLessThanOrEqual(16);
    }
  });

  it("has π and ln 2 to all their digits", () => {
    const apart = (fraction: typeof PI, truth: Exact): number =>
      new Decimal(fraction.n.toString()).div(fraction.d.toString()).minus(truth).abs().toNumber();
    expect(apart(PI, Decimal.acos(-1))).toBeLessThan(1e-98);
    expect(apart(LN2, new Decimal(2).ln())).toBeLessThan(1e-98);
  });
});
