import { Decimal } from "decimal.js";
import fc from "fast-check";
import Fraction from "fraction.js";
import { describe, expect, it } from "vitest";
import { parseQuantity } from "../../src/claim/quantity.js";
import { nearestDouble } from "../../src/formula/nearest-double.js";

const si = (text: string | number, unit: string): number => {
  const read = parseQuantity(text, unit);
  if ("found" in read) throw new Error(`${read.found}; wanted ${read.wanted}`);
  return read.value;
};

describe("units", () => {
  it("has the astronomical unit of IAU 2012 Resolution B2", () =>
    expect(si("1 au", "m")).toBe(149_597_870_700));

  // SI Brochure, 9th ed. (2019), table 8: 1 min, 1 h, 1 d; 1° = π/180 rad, 1' = π/10 800 rad, 1″ = π/648 000 rad.
  it.each([
    ["1 min", "s", 60],
    ["1 h", "s", 3600],
    ["1 d", "s", 86_400],
    ["1 deg", "rad", Math.PI / 180],
    ["1 arcmin", "rad", Math.PI / 10_800],
    ["1 arcsec", "rad", Math.PI / 648_000],
    ["1 mas", "rad", Math.PI / 648_000_000],
    ["1 uas", "rad", Math.PI / 648_000_000_000],
    ["1 µas", "rad", Math.PI / 648_000_000_000],
    ["1 μas", "rad", Math.PI / 648_000_000_000],
  ])("%s is %s %d", (text, unit, value) => expect(si(text, unit) / value).toBeCloseTo(1, 15));

  // IAU Style Manual (1989), 5.15: Julian year of 365.25 d, Julian century of 36 525 d.
  it.each([
    ["1 yr", 31_557_600],
    ["1 century", 3_155_760_000],
  ])("%s is Julian", (text, value) => expect(si(text, "s")).toBe(value));

  // decimal.js: Decimal.acos(-1) at 60 digits. Angles are rounded once, like everything else.
  it("rounds angles once", () => {
    const Exact = Decimal.clone({ precision: 60 });
    const pi = Exact.acos(-1);
    expect(si("180 deg", "rad")).toBe(Math.PI);
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 9_999_999 }), (digits) => {
        const text = new Exact(digits).div(10_000).toFixed();
        expect(si(`${text} arcsec`, "rad")).toBe(new Exact(text).times(pi).div(648_000).toNumber());
      }),
    );
  });

  it("reads an inverse length", () => {
    expect(si("2 1/km", "1/m")).toBe(0.002);
    expect(si("2 km^-1", "1/m")).toBe(0.002);
  });

  it("reads a minus sign wherever a hyphen may stand", () => expect(si("−2e−3 km s^−1", "m/s")).toBe(-2));

  it("reads products, quotients and powers, a slash for the next factor alone", () => {
    expect(si("1 km^3/s^2", "m^3/s^2")).toBe(1e9);
    expect(si("1 km^3 s^-2", "m^3/s^2")).toBe(1e9);
    expect(si("1 au^3/d^2", "m^3/s^2") / (149_597_870_700 ** 3 / 86_400 ** 2)).toBeCloseTo(1, 14);
    expect(si("30 km/s", "m/s")).toBe(30_000);
  });

  // The standard gravitational parameter of the Sun in au^3/d^2 is the square of the Gaussian constant
  // k = 0.01720209895 (IAU 1976), and 1.32712442099e20 m^3/s^2 (TCB-compatible, IAU 2009): equal to 8 digits.
  it("turns the Gaussian constant into the gravitational parameter of the Sun", () =>
    expect(si(`${0.01720209895 ** 2} au^3/d^2`, "m^3/s^2") / 1.32712442e20).toBeCloseTo(1, 7));

  it.each([
    ["3", "m", /without a unit/, /'3 m'/],
    ["3 km/s", "m^3/s^2", /km\/s/, /m\^3\/s\^2/],
    ["3 parsec", "m", /parsec/, /unit of m/],
    ["3 arcsecs", "rad", /arcsecs/, /'arcsec'\?/],
    ["km", "m", /'km'/, /number with a unit/],
    ["1e999 m", "m", /1e999/, /1e60/],
    ["0.2 m", "1", /'m'/, /pure number/],
    ["1e61 m", "m", /1e61/, /1e60/],
    ["1e-61 m", "m", /1e-61/, /1e-60/],
    [`${"9".repeat(62)} m`, "m", /999/, /1e60/],
    ["3 m^", "m", /'m\^'/, /'m'\?/],
    ["3 m^10", "m", /'m\^10'/, /unit of m/],
    ["3 m//s", "m/s", /unit ''/, /unit of m\/s/],
    ["0x10 m", "m", /'x10'/, /unit of m/],
    ["Infinity m", "m", /Infinity/, /number with a unit/],
    ["", "m", /''/, /number with a unit/],
  ])("%s for %s: says what was found and what would be right", (text, unit, found, wanted) => {
    const read = parseQuantity(text, unit);
    if (!("found" in read)) throw new Error("read");
    expect(read.found).toMatch(found);
    expect(read.wanted).toMatch(wanted);
  });
});

describe("nearestDouble", () => {
  it("rounds as the language rounds a decimal", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e15, max: 1e15 }), (value) => {
        const text = Number(value.toPrecision(17)).toFixed(20);
        expect(nearestDouble(new Fraction(text))).toBe(Number(text) + 0);
      }),
      { numRuns: 500 },
    );
  });

  it("is the double nearest to an exact product", () => {
    // decimal.js: new Decimal(a).times(b).toNumber() at 60 digits.
    const Exact = Decimal.clone({ precision: 60 });
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 99_999_999 }),
        fc.integer({ min: 0, max: 12 }),
        (digits, places) => {
          const text = new Exact(digits).div(new Exact(10).pow(places)).toFixed();
          expect(si(`${text} au`, "m")).toBe(new Exact(text).times(149_597_870_700).toNumber());
        },
      ),
    );
  });
});
