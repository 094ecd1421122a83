import Fraction from "fraction.js";
import { describe, expect, it } from "vitest";
import {
  add,
  type DoubleDouble,
  divide,
  fromFraction,
  multiply,
  scale,
  sqrt,
  subtract,
  wholePower,
} from "../../src/arithmetic/double-double.js";
import { twoProduct, twoSum } from "../../src/arithmetic/double-word.js";
import { onNumbers } from "../../src/arithmetic/machine.js";
import { Decimal, type Exact, errorInU2, exactly, ofDouble } from "./exact.js";
import { generator, nearlyOpposite, randomPair } from "./numbers.js";

const CASES = 4000;

interface Case {
  readonly name: string;
  /** Published bound in u². */
  readonly bound: number;
  readonly operation: (x: DoubleDouble, y: DoubleDouble) => DoubleDouble;
  readonly truth: (x: Exact, y: Exact) => Exact;
}

// Bounds: Joldes, Muller and Popescu, ACM TOMS 44, 15 (2017), theorems on algorithms 6, 7, 10 and 17.
const cases: readonly Case[] = [
  { name: "add", bound: 3.0001, operation: add, truth: (x, y) => x.plus(y) },
  { name: "subtract", bound: 3.0001, operation: subtract, truth: (x, y) => x.minus(y) },
  { name: "multiply", bound: 7, operation: multiply, truth: (x, y) => x.times(y) },
  { name: "divide", bound: 15.0001, operation: divide, truth: (x, y) => x.div(y) },
];

describe("double-double arithmetic beside decimal.js", () => {
  it.each(cases)("$name stays within its proved bound", ({ operation, truth, bound }) => {
    const random = generator(20260101);
    let worst = 0;
    for (let i = 0; i < CASES; i++) {
      const x = randomPair(random);
      const y = i % 4 === 0 ? nearlyOpposite(x, random) : randomPair(random, i % 4 === 1 ? 2 : 40);
      if (y.high === 0) continue;
      worst = Math.max(worst, errorInU2(operation(x, y), truth(exactly(x), exactly(y))));
    }
    expect(worst).toBeLessThanOrEqual(bound);
    // Random operands come near the bound: a looser algorithm would be seen.
    expect(worst).toBeGreaterThan(bound / 10);
  });

  it("scales by a double within 2u²", () => {
    const random = generator(7);
    for (let i = 0; i < CASES; i++) {
      const [x, y] = [randomPair(random), randomPair(random).high];
      expect(errorInU2(scale(x, y), exactly(x).times(ofDouble(y)))).toBeLessThanOrEqual(2);
    }
  });

  // Lefèvre, Louvet, Muller, Picot and Rideau, ACM TOMS 49, 1 (2023): 25/8 u².
  it("takes roots within 25/8 u²", () => {
    const random = generator(8);
    let worst = 0;
    for (let i = 0; i < CASES; i++) {
      const x = randomPair(random);
      const positive = x.high < 0 ? subtract({ high: 0, low: 0 }, x) : x;
      worst = Math.max(worst, errorInU2(sqrt(positive), exactly(positive).sqrt()));
    }
    expect(worst).toBeLessThanOrEqual(25 / 8);
    expect(worst).toBeGreaterThan(0.3);
    expect(sqrt({ high: 0, low: 0 })).toEqual({ high: 0, low: 0 });
  });

  it("loses nothing in sums and products of doubles", () => {
    const random = generator(9);
    for (let i = 0; i < CASES; i++) {
      const [a, b] = [randomPair(random).high, randomPair(random, 10).high];
      expect(errorInU2(twoSum(onNumbers, a, b), ofDouble(a).plus(ofDouble(b)))).toBeLessThan(1e-60);
      expect(errorInU2(twoProduct(onNumbers, a, b), ofDouble(a).times(ofDouble(b)))).toBeLessThan(1e-60);
    }
  });

  it("raises to whole powers", () => {
    const random = generator(10);
    for (let i = 0; i < 300; i++) {
      const x = randomPair(random, 3);
      const n = Math.floor(random() * 41) - 20;
      // 7u² for each of at most 9 multiplications, doubled by each squaring, and a division.
      expect(errorInU2(wholePower(x, n), exactly(x).pow(n))).toBeLessThanOrEqual(7 * Math.abs(n) + 15);
    }
  });

  it("rounds a fraction to nearest", () => {
    const tenth = fromFraction(new Fraction(1, 10));
    expect(errorInU2(tenth, new Decimal("0.1"))).toBeLessThanOrEqual(1);
    expect(tenth.high).toBe(0.1);
  });
});
