import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import { compileSystem } from "../../src/kernel/system.js";
import { periapsisSpeed } from "../../src/measure/elements.js";
import { shootForApoapsis } from "../../src/measure/turning-points.js";
import { findMethod } from "../../src/methods/catalog/index.js";

const fine = (name: string, parameters: readonly string[]) =>
  compileStepLoop(
    compileSystem(findEquations(name)!, { parameters, planar: true }),
    findMethod("dormand-prince-8")!,
  );
const schwarzschild = fine("schwarzschild-angle", ["GM", "c"]);
const newtonian = fine("newtonian", ["GM"]);

/**
 * GM/h² of the orbit between the turning points 1/u1 and 1/u2, m = GM/c² = 1: the first integral
 * u'² = C + 2 K u - u² + 2 m u³ vanishes at both, so 2 K = u1 + u2 - 2 m (u1² + u1 u2 + u2²).
 */
const exactK = (u1: number, u2: number): number => (u1 + u2) / 2 - (u1 * u1 + u1 * u2 + u2 * u2);

describe("shootForApoapsis", () => {
  it.each([
    [15, 25],
    [15, 45],
    [8, 20],
    [6.5, 30],
    [1e6, 2e6],
    [30, 3000],
  ])("finds GM/h² between r = %f and %f GM/c² in closed form", (rp, ra) => {
    const shot = (value: number) => ({ state: [1 / rp, 0], parameters: Float64Array.of(1, 1, value) });
    const newtonianK = (1 / rp + 1 / ra) / 2;
    const K = shootForApoapsis(schwarzschild, "angle", shot, newtonianK, ra, (2 * Math.PI) / 512)!;
    expect(Math.abs(K / exactK(1 / rp, 1 / ra) - 1)).toBeLessThan(1e-12);
  });

  it("finds the Newtonian speed again where the motion is Newton's, from a guess that is off by half", () => {
    for (const [rp, ra] of [
      [0.9, 1.1],
      [0.5, 1.5],
      [0.1, 1.9],
    ] as const) {
      const exact = periapsisSpeed(1, rp, ra);
      for (const off of [0.5, 1, 1.5]) {
        const shot = (value: number) => ({ state: [rp, 0, 0, value], parameters: Float64Array.of(1) });
        const speed = shootForApoapsis(newtonian, "time", shot, exact * off, ra, rp / exact / 32)!;
        expect(Math.abs(speed / exact - 1)).toBeLessThan(1e-12);
      }
    }
  });

  it("gives up where no orbit turns there", () => {
    // Within 4 GM/c² nothing that moves freely turns back.
    const shot = (value: number) => ({ state: [1 / 3, 0], parameters: Float64Array.of(1, 1, value) });
    expect(shootForApoapsis(schwarzschild, "angle", shot, 1 / 4, 6, 0.01)).toBeNull();
  });
});
