import { Decimal } from "decimal.js";
import fc from "fast-check";
import Fraction from "fraction.js";
import { describe, expect, it } from "vitest";
import { exactDecimal } from "../../src/formula/decimal.js";
import { Graph } from "../../src/formula/graph.js";
import { nearestDouble } from "../../src/formula/nearest-double.js";
import { FormulaError, parseFormula } from "../../src/formula/parse.js";
import { preciseConstant } from "../../src/kernel/constants.js";
import { methodsCatalog } from "../../src/methods/catalog/index.js";
import { decimalValue, Exact } from "../formula/in-decimal.js";

/** The double of a coefficient, as loops take it. */
const evaluateConstant = (text: string): number => preciseConstant(text).high;

describe("the double nearest to a fraction", () => {
  // The language itself reads a decimal to the nearest double (ECMA-262, 7.1.4.1.1).
  it("is what the language reads from the same decimal", () => {
    const digits = fc.stringMatching(/^[1-9]\d{0,39}$/);
    fc.assert(
      fc.property(
        digits,
        fc.integer({ min: -360, max: 320 }),
        fc.boolean(),
        (mantissa, exponent, negative) => {
          const text = `${negative ? "-" : ""}${mantissa[0]}.${mantissa.slice(1)}0e${exponent}`;
          expect(nearestDouble(exactDecimal(text)) + 0).toBe(Number(text) + 0);
        },
      ),
      { numRuns: 3000 },
    );
  });

  it.each([
    ["2.4703282292062328e-324", "just above half the smallest"],
    ["2.4703282292062327e-324", "just below it"],
    ["2.2250738585072011e-308", "the largest subnormal"],
    ["1.7976931348623158e308", "rounds down to the largest"],
    ["1.7976931348623159e308", "rounds out of range"],
    ["9007199254740993", "a tie"],
    ["9007199254740993.0000000000000001", "hardly more than a tie"],
  ])("%s, %s", (text) => {
    expect(nearestDouble(exactDecimal(text))).toBe(Number(text));
  });

  it("is that of decimal.js for quotients", () => {
    const Wide = Decimal.clone({ precision: 200 });
    fc.assert(
      fc.property(
        fc.bigInt({ min: 1n, max: 10n ** 40n }),
        fc.bigInt({ min: 1n, max: 10n ** 40n }),
        (n, d) => {
          // 200 digits of the quotient, read by the language: no quotient of these is so near a tie.
          const wide = new Wide(n.toString()).div(d.toString()).toString();
          expect(nearestDouble(new Fraction(n, d))).toBe(Number(wide));
        },
      ),
    );
  });
});

describe("a coefficient", () => {
  it.each([
    ["1/3", 1 / 3],
    ["-2^2", -4],
    ["2^3^2", 512],
    ["1/10 + 2/10", 0.3],
    ["1e-3", 0.001],
    [".5", 0.5],
    ["1.", 1],
  ])("%s is %d", (text, value) => {
    expect(evaluateConstant(text)).toBe(value);
  });

  it("of any catalogued method is right to the last place or two", () => {
    const texts = methodsCatalog.flatMap((method) =>
      method.family === "splitting"
        ? method.stages.map((stage) => ("kick" in stage ? stage.kick : stage.drift))
        : [...method.a.flat(), ...method.b],
    );
    for (const text of texts) {
      const exact = decimalValue(parseFormula(new Graph(), text), () => new Exact(Number.NaN));
      // As text of 60 digits, since decimal.js takes a number for its shortest decimal.
      const error = exact.minus(evaluateConstant(text).toPrecision(60)).abs().toNumber();
      const size = exact.abs().toNumber();
      // A fraction rounds once; terms of a sum with a root in it are up to 1, and round each.
      const bound = /sqrt|\^/.test(text) ? 4 * 2 ** -53 * Math.max(size, 1) : 2 ** -53 * size;
      expect(error, text).toBeLessThanOrEqual(bound);
    }
    expect(texts.length).toBeGreaterThan(100);
  });

  it("with a name in it is refused", () => {
    expect(() => evaluateConstant("x/2")).toThrow(FormulaError);
  });

  it("of endless digits is computed in doubles", () => {
    expect(evaluateConstant("((9^32)^32)^32")).toBe(Number.POSITIVE_INFINITY);
    const terms = Array.from({ length: 1000 }, (_, i) => 10_007 + 2 * i);
    const sum = terms.reduce((total, term) => total + 1 / term, 0);
    expect(evaluateConstant(terms.map((term) => `1/${term}`).join(" + "))).toBeCloseTo(sum, 13);
  });
});
