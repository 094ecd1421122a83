import { describe, expect, it } from "vitest";
import type { EquationsDefinition } from "../../src/equations/definition.js";
import { orbitOf } from "./orbit.js";

/** A central force as the power p of the distance, in the form that a catalog entry has. */
const powerLaw: EquationsDefinition = {
  name: "test-power-law",
  title: "Central force as a power of the distance",
  display: "r'' = -k |r|^p r / |r|",
  form: "time",
  source: "I. Newton, Principia, Book I, Prop. 45",
  parameters: {
    strength: {
      symbol: "k",
      unit: "m/s^2",
      meaning: "attraction at the unit of distance",
      range: "positive",
    },
    power: { symbol: "p", unit: "1", meaning: "power of the distance", range: "any" },
  },
  coordinates: {
    x: { rate: "vx", unit: "m" },
    y: { rate: "vy", unit: "m" },
    z: { rate: "vz", unit: "m" },
  },
  let: { r: "sqrt(x^2 + y^2 + z^2)", pull: "k * r^(p - 1)" },
  acceleration: { x: "-pull*x", y: "-pull*y", z: "-pull*z" },
  conserved: { "angular-momentum-z": { formula: "x*vy - y*vx", unit: "m^2/s" } },
};

/** From periapsis to periapsis, rad, of an orbit that starts faster than a circle by a part. */
function fullAngle(power: number, faster: number): number {
  const start = { kind: "state", values: { x: 1, y: 0, vx: 0, vy: 1 + faster } } as const;
  const orbit = orbitOf(powerLaw, { strength: 1, power }, start, 12);
  return 2 * Math.PI + orbit.advance("gauss-legendre-6", 256).perOrbit;
}

describe("a force as r^(n-3) turns from apsis to apsis by π/√n in nearly circular orbits", () => {
  // Principia, Book I, Prop. 45, example 2; with Newton's own cases n = 2 and 1/4 (127° 16' 45" and 360°),
  // and those of example 1 and of Props. 10 and 11: n = 3 (103° 55' 23"), 4 (90°), 1 (180°).
  it.each([1 / 4, 1 / 2, 2, 3, 5])(
    "n = %d, up to a rest that falls as the square of the eccentricity",
    (n) => {
      const exact = (2 * Math.PI) / Math.sqrt(n);
      const [wide, narrow] = [0.004, 0.002].map((faster) => fullAngle(n - 3, faster) - exact) as [
        number,
        number,
      ];
      // The radius swings by a part of 2·0.002/n about its mean.
      expect(Math.abs(narrow)).toBeLessThan(2 * (0.004 / n) ** 2);
      expect(Math.log2(wide / narrow)).toBeGreaterThan(1.9);
      expect(Math.log2(wide / narrow)).toBeLessThan(2.1);
    },
  );

  // To the accuracy that their arguments have in an orbit so near a circle.
  it.each([
    ["inverse square", 1, Math.PI],
    ["proportional to the distance", 4, Math.PI / 2],
  ])("whatever the eccentricity where it is %s", (_, n, half) => {
    for (const faster of [0.002, 0.1]) expect(fullAngle(n - 3, faster) / 2).toBeCloseTo(half, 10);
  });

  it.each([
    [3, 103, 55, 23],
    [2, 127, 16, 45],
    [1 / 4, 360, 0, 0],
  ])("n = %d: Newton's own degrees, minutes and seconds", (n, degrees, minutes, seconds) => {
    const printed = degrees + minutes / 60 + seconds / 3600;
    const half = ((fullAngle(n - 3, 1e-4) / 2) * 180) / Math.PI;
    expect(Math.abs(half - printed) * 3600).toBeLessThan(1);
  });
});
