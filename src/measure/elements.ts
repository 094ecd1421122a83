import type { Start } from "../claim/claim.js";
import { cosineAndSine, intoSpace } from "./orientation.js";

type Elements = Extract<Start, { kind: "elements" }>;

/** Position and velocity of a body in space, m and m/s. */
export interface Motion {
  readonly position: readonly [number, number, number];
  readonly velocity: readonly [number, number, number];
}

/** Osculating Newtonian orbit: semi-major axis (m; negative where unbound) and eccentricity. */
export interface OsculatingOrbit {
  readonly semiMajorAxis: number;
  readonly eccentricity: number;
}

/** What is wrong with elements, in a sentence; null for nothing. */
export function problemOfElements({
  periapsis,
  apoapsis,
  turningPoints,
  trueAnomaly,
}: Elements): string | null {
  if (!(periapsis > 0 && apoapsis >= periapsis && Number.isFinite(apoapsis))) {
    return `the apoapsis (${apoapsis} m) must be finite and no less than the periapsis (${periapsis} m), which must be more than 0`;
  }
  if (turningPoints && trueAnomaly !== 0) {
    return "exact turning points start the orbit at periapsis: leave the true anomaly out";
  }
  if (turningPoints && apoapsis === periapsis) return "exact turning points must differ: a circle has none";
  return null;
}

/** Newtonian speed at the periapsis rp of an orbit with the apoapsis ra: sqrt(2 GM ra / (rp (rp + ra))). */
export function periapsisSpeed(GM: number, periapsis: number, apoapsis: number): number {
  return Math.sqrt((2 * GM * apoapsis) / (periapsis * (periapsis + apoapsis)));
}

/** The motion at periapsis with a given speed there. */
export function motionAtPeriapsis(elements: Elements, speed: number): Motion {
  return {
    position: intoSpace(elements.periapsis, 0, elements),
    velocity: intoSpace(0, speed, elements),
  };
}

/**
 * The motion that osculating Newtonian elements stand for, at their true anomaly ν: with p = a (1 - e²),
 * r = p / (1 + e cos ν) and the velocity sqrt(GM/p) (-sin ν, e + cos ν) in the orbit's own plane
 * (Murray and Dermott, Solar System Dynamics (1999), 2.4). At the apsides the vis-viva speed, which keeps
 * one more digit.
 */
export function motionFromElements(elements: Elements, GM: number): Motion {
  const { periapsis: rp, apoapsis: ra } = elements;
  const [cosine, sine] = cosineAndSine(elements.trueAnomaly);
  if (sine === 0) {
    const [r, other] = cosine > 0 ? [rp, ra] : [ra, rp];
    return {
      position: intoSpace(cosine * r, 0, elements),
      velocity: intoSpace(0, cosine * periapsisSpeed(GM, r, other), elements),
    };
  }
  const e = (ra - rp) / (ra + rp);
  const p = (2 * rp * ra) / (rp + ra);
  const r = p / (1 + e * cosine);
  const speed = Math.sqrt(GM / p);
  return {
    position: intoSpace(r * cosine, r * sine, elements),
    velocity: intoSpace(-speed * sine, speed * (e + cosine), elements),
  };
}

/**
 * Newtonian orbit that osculates a motion: a from vis-viva, 1/a = 2/r - v²/GM, and e as the length of the
 * vector (v²/GM - 1/r) x - (x·v/GM) v.
 */
export function osculatingOrbit({ position: x, velocity: v }: Motion, GM: number): OsculatingOrbit {
  const r = Math.hypot(...x);
  const v2 = dot(v, v);
  const xv = dot(x, v);
  const vector = x.map((xi, i) => (v2 / GM - 1 / r) * xi - (xv / GM) * v[i]!);
  return { semiMajorAxis: 1 / (2 / r - v2 / GM), eccentricity: Math.hypot(...vector) };
}

export function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, value, i) => sum + value * b[i]!, 0);
}
