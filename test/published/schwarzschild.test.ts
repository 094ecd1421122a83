import ellipk from "@stdlib/math-base-special-ellipk";
import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { elements, orbitOf } from "./orbit.js";

/*
 * The orbit of a test particle in closed form, GM/c² = 1 (C. Darwin, Proc. R. Soc. Lond. A 249, 180 (1959);
 * S. Chandrasekhar, The Mathematical Theory of Black Holes (1983), §19): with turning points u1 < u2 and
 * u3 = 1/2 - u1 - u2, u = u1 + (u2 - u1) sn²(K + sqrt(2 (u3 - u1)) φ/2 | m), m = (u2 - u1)/(u3 - u1), from
 * periapsis at φ = 0; from one periapsis to the next φ = 4 K / sqrt(2 (u3 - u1)).
 * The complete integral is that of @stdlib, which takes the parameter m.
 */

/** Jacobi's sn(u | m) by the arithmetic-geometric mean (M. Abramowitz and I. Stegun, 16.4). */
function sn(u: number, m: number): number {
  // The next c goes as the square of the last.
  const scale = [{ a: 1, c: Math.sqrt(m) }];
  for (let a = 1, b = Math.sqrt(1 - m); scale.at(-1)!.c > 1e-9; ) {
    const c = (a - b) / 2;
    [a, b] = [(a + b) / 2, Math.sqrt(a * b)];
    scale.push({ a, c });
  }
  const n = scale.length - 1;
  let phase = 2 ** n * scale[n]!.a * u;
  for (let i = n; i > 0; i--) phase = (phase + Math.asin((scale[i]!.c / scale[i]!.a) * Math.sin(phase))) / 2;
  return Math.sin(phase);
}

function closedForm(periapsis: number, apoapsis: number) {
  const [u1, u2] = [1 / apoapsis, 1 / periapsis];
  const u3 = 1 / 2 - u1 - u2;
  const m = (u2 - u1) / (u3 - u1);
  const pace = Math.sqrt(2 * (u3 - u1)) / 2;
  const K = ellipk(m);
  return {
    full: (2 * K) / pace,
    at: (angle: number): number => u1 + (u2 - u1) * sn(K + pace * angle, m) ** 2,
  };
}

const orbitBetween = (periapsis: number, apoapsis: number) =>
  orbitOf(
    findEquations("schwarzschild-angle")!,
    { GM: 1, c: 1 },
    elements(periapsis, apoapsis, { turningPoints: true }),
    20,
  );

describe.each([
  ["weak", 1e6, 1.5e6],
  ["weak and eccentric", 1e5, 9e5],
  ["strong", 15, 30],
  ["strong and eccentric", 15, 75],
])("a %s field, from %d to %d GM/c²", (_, periapsis, apoapsis) => {
  const exact = closedForm(periapsis, apoapsis);
  const orbit = orbitBetween(periapsis, apoapsis);

  it("is followed to 1e-12 over three turns", () => {
    const loop = orbit.loop("gauss-legendre-6");
    const parameters = Float64Array.from(orbit.scenario.parameters);
    const io = new Float64Array(loop.ioLength);
    io.set(orbit.scenario.state);
    const step = (2 * Math.PI) / 1000;
    for (let taken = 0; taken < 3000; ) {
      taken += loop.advance(io, parameters, step, Math.min(75, 3000 - taken));
      expect(Math.abs(io[0]! / exact.at(taken * step) - 1)).toBeLessThan(1e-12);
    }
  });

  it.each([
    // The exponent of the advance: of the eighth-order method it wanders near the rounding floor.
    ["rk4", 4, 128],
    ["gauss-legendre-6", 6, 32],
  ])(
    "turns the apsis as the complete elliptic integral says: %s converges to it at %d",
    (method, order, coarse) => {
      const error = (perOrbit: number): number =>
        orbit.advance(method, perOrbit).perOrbit + 2 * Math.PI - exact.full;
      const exponent = Math.log2(error(coarse) / error(2 * coarse));
      expect(exponent).toBeGreaterThan(order - 0.2);
      expect(exponent).toBeLessThan(order + 0.2);
    },
  );

  it.each(["dormand-prince-8", "gauss-legendre-6"])("and %s to 1e-12 in the end", (method) => {
    const angle = 2 * Math.PI + orbit.advance(method, 512).perOrbit;
    expect(Math.abs(angle / exact.full - 1)).toBeLessThan(1e-12);
  });
});

it("in a weak field turns it by 6πGM/(c²p), with a relative rest of order GM/(c²p)", () => {
  // C. W. Misner, K. S. Thorne and J. A. Wheeler, Gravitation (1973), eq. 40.18.
  const rest = (scale: number): number => {
    const orbit = orbitBetween(scale, 2 * scale);
    const p = (2 * scale * 2 * scale) / (3 * scale);
    return orbit.advance("dormand-prince-8", 256).perOrbit / ((6 * Math.PI) / p) - 1;
  };
  const [near, far] = [rest(1000), rest(2000)];
  expect(near).toBeGreaterThan(1 / 1000);
  expect(near).toBeLessThan(10 / 1000);
  expect(Math.log2(near / far)).toBeGreaterThan(0.95);
  expect(Math.log2(near / far)).toBeLessThan(1.05);
});
