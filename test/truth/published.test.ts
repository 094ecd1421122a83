import ellipk from "@stdlib/math-base-special-ellipk";
import { describe, expect, it } from "vitest";
import { type DoubleDouble, fromDouble, toDouble } from "../../src/arithmetic/double-double.js";
import { exactOrbit } from "../../src/truth/exact-orbit.js";

const of = (values: Record<string, number>): Record<string, DoubleDouble> =>
  Object.fromEntries(Object.entries(values).map(([name, value]) => [name, fromDouble(value)]));

/** An invented orbit of GM = 1 from its periapsis, Newton's where the field is weak. */
const periapsis = (a: number, e: number): DoubleDouble[] =>
  [a * (1 - e), 0, 0, Math.sqrt((1 + e) / (a * (1 - e)))].map(fromDouble);

it.each([0.05, 0.2, 0.6, 0.95])("gives Kepler's third law and no advance at e = %s", (e) => {
  // Common practice: T = 2π sqrt(a³/GM). The start's speed, rounded, moves a by some 2^-53/(1 - e).
  const orbit = exactOrbit("newtonian", of({ GM: 1 }), periapsis(2, e))!;
  expect(orbit.advance).toEqual({ high: 0, low: 0 });
  expect(Math.abs(toDouble(orbit.period) / (2 * Math.PI * Math.sqrt(8)) - 1)).toBeLessThan(1e-15 / (1 - e));
});

it("takes Newton's orbit in angle for one turn", () => {
  const orbit = exactOrbit("newtonian-angle", of({}), [fromDouble(1.2), fromDouble(0)])!;
  expect(toDouble(orbit.advance)).toBe(0);
  expect(toDouble(orbit.period)).toBe(2 * Math.PI);
});

it.each([0.01, 0.2, 0.6, 0.95])("gives the complete elliptic integral of the geodesic at e = %s", (e) => {
  // S. Chandrasekhar, The Mathematical Theory of Black Holes (1983), §19, with GM/c² = 1: as in test/published.
  const [u1, u2] = [(1 - e) / 40, (1 + e) / 40];
  const u3 = 1 / 2 - u1 - u2;
  const K = u1 * u2 + u3 * (u1 + u2);
  const orbit = exactOrbit("schwarzschild-angle", of({ GM: 1, c: 1, "inverse-semi-latus-rectum": K }), [
    fromDouble(u2),
    fromDouble(0),
  ])!;
  const swept = (4 * ellipk((u2 - u1) / (u3 - u1))) / Math.sqrt(2 * (u3 - u1));
  // Some last bits of the elliptic integral and of K in double precision.
  expect(Math.abs(toDouble(orbit.period) / swept - 1)).toBeLessThan(1e-14);
});

/** The order in which the relative rest of an advance falls as the field weakens twofold. */
function orderOfRest(rest: (strength: number) => number, strength: number): number {
  return Math.log2(rest(strength) / rest(strength / 2));
}

describe.each([0.1, 0.4, 0.8])("to leading order at e = %s", (e) => {
  it.each([0, 0.1, 0.25])("turns by 6π GM/(c² a (1 - e²)) at mass ratio %s", (nu) => {
    // T. Damour and N. Deruelle, Ann. Inst. H. Poincaré 43, 107 (1985): whatever the mass ratio.
    const rest = (strength: number): number => {
      const parameters = of({ GM: 1, c: 1 / Math.sqrt(strength), "mass-ratio": nu });
      const { advance } = exactOrbit("post-newtonian-1", parameters, periapsis(1, e))!;
      return toDouble(advance) / ((6 * Math.PI * strength) / (1 - e * e)) - 1;
    };
    expect(Math.abs(rest(1e-8))).toBeLessThan(1e-5);
    expect(Math.abs(orderOfRest(rest, 1e-6) - 1)).toBeLessThan(0.01);
  });

  it("turns by 3π J2 (R/p)² in the plane of an oblate body's equator", () => {
    // W. M. Kaula, Theory of Satellite Geodesy (1966), eq. 3.74, at no inclination: node and pericentre together
    // turn by (3/2) n J2 (R/p)².
    const rest = (J2: number): number => {
      const { advance } = exactOrbit("oblate", of({ GM: 1, R: 0.5, J2, J3: 0, J4: 0 }), periapsis(3, e))!;
      return toDouble(advance) / (3 * Math.PI * J2 * (0.5 / (3 * (1 - e * e))) ** 2) - 1;
    };
    expect(Math.abs(rest(1e-8))).toBeLessThan(1e-5);
    expect(Math.abs(orderOfRest(rest, 1e-4) - 1)).toBeLessThan(0.05);
  });
});
