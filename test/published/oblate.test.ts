import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { evaluate } from "../../src/formula/walk.js";
import { compileSystem } from "../../src/kernel/system.js";
import { elements, type Orbit, orbitOf } from "./orbit.js";

const oblate = findEquations("oblate")!;
const DEGREE = Math.PI / 180;
const P = 1.92;

/** An orbit of semi-latus rectum 1.92 and e = 0.2 about a body of radius 1. */
const orbit = (inclination: number, J2: number): Orbit =>
  orbitOf(
    oblate,
    { GM: 1, R: 1, J2 },
    elements(P / 1.2, P / 0.8, { inclination, node: 0.3, argumentOfPeriapsis: 1 }),
    20,
  );

/** Change of the node's longitude an orbit, end less start, rad: that of the plane normal to r × v. */
function nodePerOrbit({ scenario, loop, run }: Orbit): number {
  const passages = run("gauss-legendre-6", 256);
  const [time, orbits] = [passages.times.at(-1)!, passages.numbers.at(-1)!];
  // Once more in whole steps that end on the last passage, where the node's swing within an orbit is back.
  const steps = 256 * orbits;
  const step = loop("gauss-legendre-6");
  const io = new Float64Array(step.ioLength);
  io.set(scenario.state);
  for (let left = steps; left > 0; ) {
    left -= step.advance(io, Float64Array.from(scenario.parameters), time / steps, left);
  }
  const node = ([x, y, z, vx, vy, vz]: ArrayLike<number> & Iterable<number>): number =>
    Math.atan2(y! * vz! - z! * vy!, x! * vz! - z! * vx!);
  return (node(io) - node(Float64Array.from(scenario.state))) / orbits;
}

describe("about an oblate body", () => {
  // W. M. Kaula, Theory of Satellite Geodesy (1966), eq. 3.74: secular motion of node and perigee.
  it.each([20, 50, 100, 140])(
    "an orbit inclined by %d° turns its node by -3π J2 (R/p)² cos i, up to J2²",
    (i) => {
      const rest = (J2: number): number =>
        nodePerOrbit(orbit(i * DEGREE, J2)) + (3 * Math.PI * J2 * Math.cos(i * DEGREE)) / P ** 2;
      const [large, small] = [rest(2e-4), rest(1e-4)];
      expect(Math.abs(small)).toBeLessThan(20 * 1e-4 ** 2);
      expect(Math.log2(large / small)).toBeGreaterThan(1.9);
      expect(Math.log2(large / small)).toBeLessThan(2.1);
    },
  );

  it("the perigee stands still at the critical inclination, 63.43° (5 cos² i = 1)", () => {
    const at = (i: number): number => orbit(i * DEGREE, 1e-6).advance("dormand-prince-8", 256).perOrbit;
    const [below, above] = [at(63.4), at(63.5)];
    expect(below).toBeGreaterThan(0);
    expect(above).toBeLessThan(0);
    // A straight line over a tenth of a degree.
    expect(63.4 + (0.1 * below) / (below - above)).toBeCloseTo(63.435, 3);
  });
});

it("pulls as a row of point masses on its axis does, whose harmonics are known", () => {
  // -GM Σ f/|r - d ẑ| = -(GM/r) Σ f (d/r)^n P_n(cos θ): J_n = -Σ f (d/R)^n, by the generating function of
  // the Legendre polynomials (M. Abramowitz and I. Stegun, 22.9.12). Centre of mass at rest: Σ f d = 0.
  const row = [
    [0.5, 1],
    [0.25, -3],
    [0.25, 1],
  ] as const;
  const { accelerations } = compileSystem(oblate, { parameters: ["J2", "J3", "J4"], planar: false });
  const rest = (size: number, place: Readonly<Record<string, number>>): number => {
    const J = (n: number): number => -row.reduce((sum, [f, d]) => sum + f * (d * size) ** n, 0);
    const given: Record<string, number> = { GM: 1, R: 1, J2: J(2), J3: J(3), J4: J(4), ...place };
    const difference = accelerations.map((acceleration, axis) => {
      const pull = row.reduce((sum, [f, d]) => {
        const from = [place.x!, place.y!, place.z! - d * size];
        return sum - (f * from[axis]!) / Math.hypot(...from) ** 3;
      }, 0);
      return evaluate(acceleration, (symbol) => given[symbol]!) - pull;
    });
    return Math.hypot(...difference);
  };
  for (const place of [
    { x: 1, y: 0.5, z: 0.7 },
    { x: -0.3, y: 1.1, z: -0.9 },
    { x: 0.9, y: -0.8, z: 0.05 },
    { x: 0.1, y: 0.2, z: 1.3 },
  ]) {
    const [wide, narrow] = [rest(0.01, place), rest(0.005, place)];
    // What is left is the fifth harmonic, and no lower one.
    expect(Math.log2(wide / narrow)).toBeGreaterThan(4.8);
    expect(Math.log2(wide / narrow)).toBeLessThan(5.3);
  }
});
