import { describe, expect, it } from "vitest";
import type { PreciseScenario } from "../../src/claim/claim.js";
import { parseClaim } from "../../src/claim/read.js";
import { Decimal, errorInU2 } from "../arithmetic/exact.js";

function precise(start: string): PreciseScenario {
  const text = `cupel: claim/1
title: An invented orbit
claimed: { quantity: apsidal-advance, value: 1 arcsec/orbit }
scenario: { equations: oblate, span: 3 orbits, start: ${start},
  parameters: { GM: 1.1e11 km^3/s^2, R: 0.003 au, J2: 1.7e-4 } }
`;
  const read = parseClaim(new TextEncoder().encode(text), "made-up.yaml");
  if (!read.ok) throw new Error(JSON.stringify(read.problems));
  return read.claim.scenario.precise;
}

// IAU 2012 Resolution B2; degree and arcsecond by the SI Brochure, table 8.
const AU = new Decimal("149597870700");
const DEGREE = Decimal.acos(-1).div(180);
/** Rounded once, by `fromFraction`: 1u². */
const ROUNDED = 1;
/** A product of two numbers that are each rounded once: 7u² for itself (Joldes et al. 2017, algorithm 10). */
const PRODUCT = 9;

describe("the numbers of a claim to 31 digits", () => {
  it("are those written, unit and all", () => {
    const { parameters, start } = precise(
      "{ periapsis: 0.21 au, apoapsis: 0.34 au, inclination: 37.3 deg, node: 4000 arcsec }",
    );
    expect(errorInU2(parameters.GM!, new Decimal("1.1e20"))).toBeLessThanOrEqual(ROUNDED);
    expect(errorInU2(parameters.R!, AU.times("0.003"))).toBeLessThanOrEqual(ROUNDED);
    expect(errorInU2(parameters.J2!, new Decimal("1.7e-4"))).toBeLessThanOrEqual(ROUNDED);
    expect(errorInU2(start.periapsis!, AU.times("0.21"))).toBeLessThanOrEqual(ROUNDED);
    expect(errorInU2(start.apoapsis!, AU.times("0.34"))).toBeLessThanOrEqual(ROUNDED);
    expect(errorInU2(start.inclination!, DEGREE.times("37.3"))).toBeLessThanOrEqual(ROUNDED);
    expect(errorInU2(start.node!, DEGREE.times(4000).div(3600))).toBeLessThanOrEqual(ROUNDED);
    expect(start.trueAnomaly).toEqual({ high: 0, low: 0 });
  });

  it.each(["0.31", "0.95", "0.99998"])("keep their digits in the apsides of an eccentricity of %s", (e) => {
    const { start } = precise(`{ semi-major-axis: 0.27 au, eccentricity: ${e} }`);
    const a = AU.times("0.27");
    expect(errorInU2(start.periapsis!, a.times(new Decimal(1).minus(e)))).toBeLessThanOrEqual(PRODUCT);
    expect(errorInU2(start.apoapsis!, a.times(new Decimal(1).plus(e)))).toBeLessThanOrEqual(PRODUCT);
  });
});
