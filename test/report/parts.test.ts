import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { linearTicks, logTicks, rungTicks } from "../../src/report/page/plots/axes.js";
import { clip } from "../../src/report/page/plots/clip.js";
import { distances } from "../../src/report/page/plots/distances.js";
import { spread, tag } from "../../src/report/page/plots/labels.js";
import { quotedDigits } from "../../src/report/page/quoted-digits.js";
import { powerOfTen, typeset } from "../../src/report/page/typeset.js";
import type { Ladder } from "../../src/result/result.js";

describe("typeset", () => {
  it("sets exponents and signs, and leaves names and dates of ours alone", () => {
    const nb = "\u00a0";
    expect(typeset("off by 1.15e-8 and -2e+10")).toBe(`off by 1.15${nb}×${nb}10⁻⁸ and −2${nb}×${nb}10¹⁰`);
    expect(typeset("(GM/(c^2 r))^2")).toBe("(GM/(c² r))²");
    expect(typeset("dormand-prince-8 at -433 arcsec")).toBe("dormand-prince-8 at −433 arcsec");
    expect(typeset("eqs. 219-220, rk4")).toBe("eqs. 219-220, rk4");
    expect(typeset("8.80 % and 2 ± 1e-3")).toBe(`8.80${nb}% and 2 ±${nb}1${nb}×${nb}10⁻³`);
    expect(typeset("0x1e5 and 1e5x")).toBe("0x1e5 and 1e5x");
  });

  it("writes powers of ten", () => {
    expect([1e-12, 0.01, 1, 10, 1000, 1e4, -1e-3].map(powerOfTen)).toEqual([
      "10⁻¹²",
      "10⁻²",
      "1",
      "10",
      "1000",
      "10⁴",
      "−10⁻³",
    ]);
  });
});

describe("quotedDigits", () => {
  it.each([
    ["78.62(2) arcsec/century", 1, "7", "8.62", "(2) arcsec/century"],
    ["78.62(2) arcsec/century", 2, "78", ".62", "(2) arcsec/century"],
    ["78.62(2) arcsec/century", 4, "78.62", "", "(2) arcsec/century"],
    ["0.0123 deg/yr", 2, "0.012", "3", " deg/yr"],
    ["-4.5e-3 rad/orbit", 1, "-4", ".5", "e-3 rad/orbit"],
    ["1200 arcsec/orbit", 2, "12", "00", " arcsec/orbit"],
    ["10.0 ± 0.1 mas/orbit", 3, "10.0", "", " ± 0.1 mas/orbit"],
    ["62.02 arcsec/century", 0, "", "62.02", " arcsec/century"],
    ["0.10(1) arcsec/orbit", null, "0.10", "", "(1) arcsec/orbit"],
  ])("cuts %s after %s", (text, digits, standing, fallen, rest) => {
    expect(quotedDigits(text, digits)).toEqual({ standing, fallen, rest });
  });

  it("loses no character", () => {
    fc.assert(
      fc.property(
        fc.double({ noNaN: true, noDefaultInfinity: true }),
        fc.integer({ min: 0, max: 20 }),
        (value, k) => {
          const text = `${value} deg/yr`;
          const { standing, fallen, rest } = quotedDigits(text, k);
          expect(standing + fallen + rest).toBe(text);
        },
      ),
    );
  });
});

describe("ticks", () => {
  it("are round, inside, evenly spaced and told apart", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e9, max: 1e9, noNaN: true }),
        fc.double({ min: 1e-6, max: 1e9, noNaN: true }),
        fc.integer({ min: 2, max: 9 }),
        (low, width, count) => {
          // Closer than this the numbers themselves cannot be told apart by a step of the axis.
          fc.pre(width > 1e-12 * Math.abs(low));
          const ticks = linearTicks(low, low + width, count);
          expect(ticks.values.length).toBeGreaterThanOrEqual(1);
          expect(ticks.values.length).toBeLessThanOrEqual(2 * count + 1);
          const slack = width * 1e-6;
          for (const value of ticks.values) {
            expect(value).toBeGreaterThanOrEqual(low - slack);
            expect(value).toBeLessThanOrEqual(low + width + slack);
          }
          const labels = ticks.values.map(ticks.format);
          expect(new Set(labels).size).toBe(labels.length);
        },
      ),
    );
  });

  it("move a common power of ten to the axis label", () => {
    const ticks = linearTicks(-1.2e-8, 0, 3);
    expect(ticks.values.map(ticks.format)).toEqual(["−1.0", "−0.5", "0.0"]);
    expect(ticks.factor).toBe(" × 10⁻⁸");
  });

  it("on a logarithmic axis are whole powers, thinned, and 1-2-5 where there are few", () => {
    const many = logTicks(1e-9, 1e8, 9);
    expect(many.values.every((value) => Number.isInteger(Math.log10(value)))).toBe(true);
    expect(many.values.length).toBeLessThanOrEqual(9);
    const few = logTicks(0.3, 8, 9);
    expect(few.values.map(few.format)).toEqual(["0.5", "1", "2", "5"]);
  });

  it("at rungs always include the author's", () => {
    const steps = [18.08, 36.16, 72.32, 144.6, 289.3, 578.6, 1157.1, 2314.3, 4628.6, 9257.1];
    for (const authors of steps) expect(rungTicks(steps, authors, 4).values).toContain(authors);
  });
});

describe("labels", () => {
  it("are moved apart, stay in order and inside", () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 1, maxLength: 12 }),
        (places) => {
          const apart = 0.05;
          const moved = spread(places, apart).toSorted((a, b) => a - b);
          for (let k = 1; k < moved.length; k++)
            expect(moved[k]! - moved[k - 1]!).toBeGreaterThan(apart - 1e-9);
          expect(moved[0]).toBeGreaterThan(-1e-9);
          expect(moved.at(-1)).toBeLessThan(1 + 1e-9);
        },
      ),
    );
  });

  it("stay where they belong when nothing is in the way", () => {
    expect(spread([0.9, 0.1, 0.5], 0.1)).toEqual([0.9, 0.1, 0.5]);
  });

  it("have short tags", () => {
    expect(
      ["dormand-prince-8", "implicit-midpoint", "rk4", "leapfrog-drift-first", "gauss-legendre-6"].map(tag),
    ).toEqual(["dp8", "im", "rk4", "ldf", "gl6"]);
  });
});

describe("clip", () => {
  it("cuts a curve where it leaves the frame, straight on logarithmic paper", () => {
    const cut = clip(
      [
        { n: 10, value: 200 },
        { n: 100, value: 0 },
        { n: 1000, value: 50 },
      ],
      [0, 100],
    );
    // Half-way down from 200 to 0 is half-way from 10 to 100 in the logarithm.
    expect(cut[0]!.n).toBeCloseTo(10 * Math.sqrt(10), 9);
    expect(cut[0]!.value).toBe(100);
    expect(cut.filter(({ value }) => !Number.isNaN(value))).toHaveLength(3);
  });

  it("shows both crossings of a piece that passes through", () => {
    const cut = clip(
      [
        { n: 1, value: -100 },
        { n: 100, value: 100 },
      ],
      [-50, 50],
    );
    expect(cut.slice(0, 2).map(({ value }) => value)).toEqual([-50, 50]);
  });
});

describe("distances", () => {
  const rung = (stepsPerOrbit: number, figure: number | null) => ({ stepsPerOrbit, figure });
  const ladder = { rungs: [rung(8, 5), rung(16, null), rung(32, 2), rung(64, 1)] } as unknown as Ladder;
  const best = (value: number | null, halfWidth: number | null) => ({
    value,
    halfWidth,
    from: null,
    extrapolated: null,
    says: "",
  });

  it("are from the best value, and never less than a third of its half-width", () => {
    expect(distances(ladder, best(1, 0.3))).toEqual([
      { n: 8, distance: 4 },
      { n: 32, distance: 1 },
      { n: 64, distance: 0.3 / 3 },
    ]);
  });

  it("are from the next rung where there is no best value", () => {
    expect(distances(ladder, best(null, null))).toEqual([{ n: 32, distance: 1 }]);
  });
});
