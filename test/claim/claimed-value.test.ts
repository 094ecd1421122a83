import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { parseClaimedValue } from "../../src/claim/claimed-value.js";

const read = (text: string) => {
  const value = parseClaimedValue(text);
  if ("found" in value) throw new Error(`${value.found}; wanted ${value.wanted}`);
  return value;
};

describe("a quoted figure", () => {
  // JCGM 100:2008 (GUM), 7.2.2: 100.021 47(35) stands for 100.021 47 ± 0.000 35.
  it("follows the concise notation of the GUM", () =>
    expect(read("100.02147(35) arcsec/orbit")).toMatchObject({
      value: 100.02147,
      halfWidth: 0.00035,
      digits: 8,
    }));

  it.each(["100.02147(0.00035)", "(100.02147 ± 0.00035)", "100.02147 (35)"])("also as in %s", (text) =>
    expect(read(`${text} arcsec/orbit`)).toMatchObject({ value: 100.02147, halfWidth: 0.00035, digits: 8 }),
  );

  it.each([
    ["104.41(2) arcsec/century", 104.41, 0.02, 5],
    ["104.41(12) arcsec/century", 104.41, 0.12, 5],
    ["104(2) arcsec/century", 104, 2, 3],
    ["104.41±0.02arcsec/century", 104.41, 0.02, 5],
    ["1.2345(0.0067)e-3 deg/yr", 0.0012345, 0.0000067, 5],
    ["1.2e3 ± 5e1 arcsec/d", 1200, 50, 2],
    ["4.30e2 arcsec/century", 430, 0.5, 3],
    ["+42.98 arcsec/century", 42.98, 0.005, 4],
    ["1.2e−3 deg/yr", 0.0012, 0.00005, 2],
    ["0 arcsec/orbit", 0, 0.5, 1],
    ["104.41 ± 0.02 arcsec/century", 104.41, 0.02, 5],
    ["104.41 +/- 0.02 arcsec/century", 104.41, 0.02, 5],
    ["42.98 arcsec/century", 42.98, 0.005, 4],
    ["43 arcsec/century", 43, 0.5, 2],
    ["430 arcsec/century", 430, 0.5, 3],
    ["4.3e1 arcsec/century", 43, 0.5, 2],
    ["1.20e-3 deg/yr", 0.0012, 0.000005, 3],
    ["1.2345(67)e-3 deg/yr", 0.0012345, 0.0000067, 5],
    ["-433.29 arcsec/orbit", -433.29, 0.005, 5],
    ["−433.29 arcsec/orbit", -433.29, 0.005, 5],
    ["0.0120 mas per orbit", 0.012, 0.00005, 3],
    ["0.00(1) arcsec/orbit", 0, 0.01, 2],
    [".5 rad / orbit", 0.5, 0.05, 1],
  ])("%s is %d ± %d, %i digits", (text, value, halfWidth, digits) =>
    expect(read(text)).toMatchObject({ value, halfWidth, digits }),
  );

  it("knows orbits and Julian times", () => {
    expect(read("1 arcsec/orbit").unit.per).toBe("orbit");
    expect(read("1 deg/yr").unit.per).toBe(365.25 * 86_400);
    expect(read("1 arcsec/century").unit.per).toBe(36_525 * 86_400);
    expect(read("1 µas/d").unit).toMatchObject({ per: 86_400, radians: expect.closeTo(Math.PI / 648e9, 24) });
  });

  it.each([
    ["42.98", /'42.98'/],
    ["42.98 arcsec", /'arcsec'/],
    ["42.98 km/century", /'km'/],
    ["42.98 arcsec/fortnight", /per 'fortnight'/],
    ["42.98(0) arcsec/century", /margin of zero/],
    ["42.98 ± 0 arcsec/century", /margin of zero/],
    ["about 43 arcsec/century", /about 43/],
    ["NaN arcsec/century", /NaN/],
    ["1e999 arcsec/century", /1e999/],
    ["1e61 arcsec/century", /1e61/],
    ["1e-61 arcsec/century", /1e-61/],
    [`1(${"1".repeat(70)}) arcsec/century`, /1\(111/],
    [`1(${"1".repeat(100_000)}) arcsec/century`, /1\(111/],
    [`1${" ".repeat(100_000)}x`, /'1 /],
    ["104,41(2) arcsec/century", /104,41/],
    ["104.41(-2) arcsec/century", /104.41\(-2\)/],
    ["104.41 ± -0.02 arcsec/century", /104.41 ± -0.02/],
    ["1.2.3 arcsec/century", /1.2.3/],
    ["(2) arcsec/century", /\(2\)/],
    ["", /''/],
  ])("does not read %j", (text, found) => {
    const value = parseClaimedValue(text);
    expect("found" in value && value.found).toMatch(found);
  });

  // The language's own reading of a decimal is the outside here: Number("1.234e-5") rounds to nearest.
  it("reads back what is written in concise notation", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -999_999, max: 999_999 }),
        fc.integer({ min: 0, max: 5 }),
        fc.integer({ min: 1, max: 99 }),
        fc.option(fc.integer({ min: -20, max: 20 }), { nil: null }),
        (mantissa, decimals, margin, power) => {
          const text = (mantissa / 10 ** decimals).toFixed(decimals);
          const exponent = power === null ? "" : `e${power}`;
          const value = read(`${text}(${margin})${exponent} arcsec/orbit`);
          expect(value.value).toBe(Number(text + exponent) + 0);
          expect(value.halfWidth).toBe(Number(`${margin}e${(power ?? 0) - decimals}`));
          expect(value.digits).toBe(
            mantissa === 0 ? Math.max(1, decimals) : String(Math.abs(mantissa)).length,
          );
          expect(read(value.text)).toEqual(value);
        },
      ),
    );
  });

  it("never throws", () => {
    fc.assert(fc.property(fc.string(), (text) => void parseClaimedValue(text)));
    const marks = fc.string({ unit: fc.constantFrom(..."012.eE+-−±()/ arcsec") });
    fc.assert(fc.property(marks, (text) => void parseClaimedValue(text)));
  });
});
