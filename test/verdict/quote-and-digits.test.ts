import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { standingDigits } from "../../src/verdict/digits.js";
import { concise } from "../../src/verdict/quote.js";

describe("concise notation", () => {
  it("writes the example of the GUM", () => {
    // JCGM 100:2008, 7.2.2: m_S = 100.02147(35) g, with u_c = 0.35 mg. One digit where the first is not a 1.
    expect(concise(100.02147, 0.00035)).toBe("100.0215(4)");
  });

  it.each([
    [42.98041, 0.0013, "42.9804(13)"],
    [104.414, 0.02, "104.41(2)"],
    [-433.29, 0.7, "-433.3(7)"],
    [79, 3.2, "79(4)"],
    [62, 12, "62(12)"],
    [0.00123, 0.00002, "0.00123(2)"],
    [9149, 300, "9.1(3)e3"],
  ])("%d ± %d is %s", (value, halfWidth, text) => expect(concise(value, halfWidth)).toBe(text));

  it("never writes a margin smaller than it is, nor a value outside it", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e5, max: 1e5, noNaN: true }),
        fc.double({ min: 1e-9, max: 1e4, noNaN: true }),
        (value, halfWidth) => {
          const [, mantissa, units, exponent] = /^(-?[\d.]+)\((\d+)\)(?:e(-?\d+))?$/.exec(
            concise(value, halfWidth),
          )!;
          const decimals = mantissa!.split(".")[1]?.length ?? 0;
          const scale = 10 ** Number(exponent ?? 0);
          const written = Number(units) * 10 ** -decimals * scale;
          expect(written).toBeGreaterThanOrEqual(halfWidth * (1 - 1e-8));
          expect(Math.abs(Number(mantissa) * scale - value)).toBeLessThanOrEqual(written);
        },
      ),
    );
  });
});

describe("digits that stand", () => {
  // Half a unit of the k-th digit of 42.98: 5, 0.5, 0.05, 0.005, by the definition itself.
  it.each([
    [5, 1],
    [5.01, 0],
    [0.5, 2],
    [0.05, 3],
    [0.005, 4],
    [0.00501, 3],
  ])("an error of %d leaves %d of 42.98", (error, digits) =>
    expect(standingDigits(42.98, error, 0)).toBe(digits),
  );

  it("counts the claim's distance as it does the error", () => {
    expect(standingDigits(42.98, 1e-9, 0.5)).toBe(2);
    expect(standingDigits(-42.98, 1e-9, 0.5)).toBe(2);
  });

  it("has nothing to count in zero", () => expect(standingDigits(0, 1, 1)).toBeNull());
});
