import fc from "fast-check";
import { linearRegression } from "simple-statistics";
import { describe, expect, it } from "vitest";
import { apsidalAdvance } from "../../src/measure/advance.js";
import { lessTurns, unwrap } from "../../src/measure/turns.js";

const numbers = (count: number, from = 0): number[] => Array.from({ length: count }, (_, k) => from + k);

describe("apsidalAdvance", () => {
  it("is the slope that simple-statistics finds, with the textbook's standard error", () => {
    // By hand: y = 1, 3, 2, 5 on 0..3 has the slope 5.5/5 and residuals -0.1, 0.8, -1.3, 0.6.
    const run = { numbers: numbers(4), advances: [1, 3, 2, 5], times: [0, 10, 20, 30] };
    const found = apsidalAdvance(run)!;
    expect(found.perOrbit).toBeCloseTo(
      linearRegression(run.numbers.map((k, i) => [k, run.advances[i]!])).m,
      14,
    );
    expect(found.perOrbit).toBeCloseTo(1.1, 14);
    expect(found.perOrbitError).toBeCloseTo(Math.sqrt(2.7 / 2 / 5), 14);
    expect(found.radialPeriod).toBeCloseTo(10, 13);
    expect(found.perTime).toBeCloseTo(0.11, 14);
    expect(found.perTimeError).toBeCloseTo(found.perOrbitError / 10, 13);
  });

  it("keeps its digits at large passage numbers and times", () => {
    const [count, slope, period] = [50, 2e-6, 7.6e6];
    const run = {
      numbers: numbers(count, 2451545),
      advances: numbers(count).map((k) => 0.3 + slope * k),
      times: numbers(count, 2451545).map((k) => k * period),
    };
    const found = apsidalAdvance(run)!;
    expect(Math.abs(found.perOrbit / slope - 1)).toBeLessThan(1e-9);
    expect(Math.abs(found.radialPeriod / period - 1)).toBeLessThan(1e-12);
  });

  it("is not had from fewer than three passages", () => {
    for (const count of [0, 1, 2]) {
      const run = { numbers: numbers(count), advances: numbers(count), times: numbers(count) };
      expect(apsidalAdvance(run)).toBeNull();
    }
  });
});

describe("lessTurns", () => {
  it("keeps the digits of a small angle after many turns, by exact integers", () => {
    // 2π to 40 digits, as an integer over 10^40: OEIS A019692.
    const twoPi = 62831853071795864769252867665590057683943n;
    const scale = 10n ** 40n;
    /** A double as an exact multiple of 2^-1074 cut to 10^-40. */
    const exact = (value: number): bigint => {
      const [mantissa, exponent] = [BigInt(Math.round(value * 2 ** 60)), 60n];
      return (mantissa * scale) >> exponent;
    };
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 5e6 }),
        // Multiples of 2^-60, so that their integers are exact.
        fc.integer({ min: 2 ** 40, max: 2 ** 50 }),
        (steps, mantissa) => {
          const step = mantissa * 2 ** -52;
          const turns = Math.floor((steps * step) / (2 * Math.PI));
          const expected = BigInt(steps) * exact(step) - BigInt(turns) * twoPi;
          const found = lessTurns(steps, step, 0, turns);
          expect(Math.abs(Number(expected) / 1e40 - found)).toBeLessThan(2e-15);
        },
      ),
    );
  });
});

describe("unwrap", () => {
  it("restores any series whose change from turn to turn does not jump by half a turn", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -20, max: 20, noNaN: true }),
        fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 3, maxLength: 30 }),
        (change, wobbles) => {
          const series = wobbles.map((wobble, k) => k * change + (wobble - wobbles[0]!) / 2);
          const wrapped = series.map((value) => Math.atan2(Math.sin(value), Math.cos(value)));
          const found = unwrap(wrapped, series[1]! - series[0]!);
          for (const [k, value] of found.entries()) expect(value).toBeCloseTo(series[k]!, 9);
        },
      ),
    );
  });
});
