import { describe, expect, it } from "vitest";
import { periapsisSpeed } from "../../src/measure/elements.js";
import { shootForApoapsis } from "../../src/measure/turning-points.js";
import { handLoop, kepler } from "./hand-loop.js";

/** u'' = K - u + 3 m u²; parameters K, m = GM/c². */
const schwarzschild = handLoop("rk4", 2, (x, _v, out, [K, m]) => {
  out[0] = K! - x[0]! + 3 * m! * x[0]! * x[0]!;
});

/**
 * GM/h² of the orbit between the turning points 1/u1 and 1/u2: the first integral
 * u'² = C + 2 K u - u² + 2 m u³ vanishes at both, so 2 K = u1 + u2 - 2 m (u1² + u1 u2 + u2²).
 */
const exactK = (u1: number, u2: number, m: number): number =>
  (u1 + u2) / 2 - m * (u1 * u1 + u1 * u2 + u2 * u2);

describe("shootForApoapsis", () => {
  it.each([
    [15, 25, 1],
    [15, 45, 1],
    [8, 20, 1],
    [1e6, 2e6, 1],
    [30, 300, 1],
  ])("finds GM/h² between r = %f and %f GM/c² in closed form", (rp, ra, m) => {
    const K = shootForApoapsis(
      schwarzschild,
      "angle",
      (value) => ({ state: [1 / rp, 0], parameters: Float64Array.of(value, m) }),
      (1 / rp + 1 / ra) / 2,
      ra,
      (2 * Math.PI) / 4096,
    )!;
    expect(Math.abs(K / exactK(1 / rp, 1 / ra, m) - 1)).toBeLessThan(1e-12);
  });

  it("finds the Newtonian speed again where the motion is Newton's, from a guess that is off by half", () => {
    for (const [rp, ra] of [
      [0.9, 1.1],
      [0.5, 1.5],
      [0.1, 1.9],
    ] as const) {
      const exact = periapsisSpeed(1, rp, ra);
      for (const off of [0.5, 1, 1.5]) {
        const speed = shootForApoapsis(
          handLoop("rk4", 4, kepler),
          "time",
          (value) => ({ state: [rp, 0, 0, value], parameters: Float64Array.of(1) }),
          exact * off,
          ra,
          rp / exact / 512,
        )!;
        expect(Math.abs(speed / exact - 1)).toBeLessThan(1e-12);
      }
    }
  });

  it("gives up where no orbit turns there", () => {
    // Within 4 GM/c² nothing that moves freely turns back.
    const shot = (value: number) => ({ state: [1 / 3, 0], parameters: Float64Array.of(value, 1) });
    expect(shootForApoapsis(schwarzschild, "angle", shot, 1 / 4, 6, 0.01)).toBeNull();
  });
});
