import { startOfDoubles } from "../../src/measure/precise-start.js";
import type { PreparedScenario } from "../../src/measure/run.js";

export const ARCSEC = Math.PI / 180 / 3600;
/** Julian century in seconds: 36525 d of 86400 s (IAU 2012 system of units). */
export const CENTURY = 36525 * 86400;

/** A planar orbit from periapsis on +x, by Newtonian elements; parameters GM and whatever is added. */
export function planarOrbit(
  GM: number,
  a: number,
  e: number,
  orbits: number,
  added: readonly number[] = [],
  nullParameters: readonly number[] | null = null,
): PreparedScenario {
  const doubles = {
    state: [a * (1 - e), 0, 0, Math.sqrt(((GM / a) * (1 + e)) / (1 - e))],
    parameters: [GM, ...added],
    nullParameters,
  };
  return {
    ...doubles,
    precise: startOfDoubles(doubles),
    startsAtPeriapsis: true,
    period: 2 * Math.PI * Math.sqrt(a ** 3 / GM),
    semiMajorAxis: a,
    eccentricity: e,
    span: { kind: "orbits", count: orbits },
    apsidalAngle: "longitude",
  };
}

/** Eccentric anomaly from Kepler's equation M = E - e sin E, by Newton's method from above. */
function eccentricAnomaly(M: number, e: number): number {
  let E = M + e;
  for (let i = 0; i < 100; i++) {
    const step = (E - e * Math.sin(E) - M) / (1 - e * Math.cos(E));
    E -= step;
    if (Math.abs(step) < 1e-16 * Math.max(1, Math.abs(E))) break;
  }
  return E;
}

/** Position and velocity on a Kepler ellipse with its periapsis on +x, a time after the passage. */
export function keplerState(GM: number, a: number, e: number, time: number): number[] {
  const n = Math.sqrt(GM / a ** 3);
  const E = eccentricAnomaly(n * time, e);
  const b = Math.sqrt(1 - e * e);
  const rate = n / (1 - e * Math.cos(E));
  return [a * (Math.cos(E) - e), a * b * Math.sin(E), -a * rate * Math.sin(E), a * b * rate * Math.cos(E)];
}
