import { Solver } from "odex";
import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import { findMethod } from "../../src/methods/catalog/index.js";
import { startOf } from "../kernel/starts.js";

/*
 * Whole trajectories against odex (npm), an extrapolation method after E. Hairer and G. Wanner's ODEX, with
 * accelerations written here by hand from the published equations.
 */
type Accelerate = (state: readonly number[], parameters: readonly number[]) => number[];

const postNewtonian: Accelerate = ([x, y, z, vx, vy, vz], [GM, c, nu]) => {
  const r = Math.hypot(x!, y!, z!);
  const v2 = vx! ** 2 + vy! ** 2 + vz! ** 2;
  const n = (x! * vx! + y! * vy! + z! * vz!) / r;
  const m = GM! / r;
  const radial =
    -(GM! / r ** 3) * (1 + ((1 + 3 * nu!) * v2 - 2 * (2 + nu!) * m - 1.5 * nu! * n ** 2) / c! ** 2);
  const along = (GM! / r ** 2) * ((2 * (2 - nu!) * n) / c! ** 2);
  return [radial * x! + along * vx!, radial * y! + along * vy!, radial * z! + along * vz!];
};

/** W. M. Kaula, Theory of Satellite Geodesy (1966), 1.1; the J2 acceleration of any handbook. */
const oblate: Accelerate = ([x, y, z], [GM, R, J2]) => {
  const r = Math.hypot(x!, y!, z!);
  const q = 1.5 * J2! * (R! / r) ** 2;
  const s = 5 * (z! / r) ** 2;
  const k = -GM! / r ** 3;
  return [k * x! * (1 - q * (s - 1)), k * y! * (1 - q * (s - 1)), k * z! * (1 - q * (s - 3))];
};

const newtonian: Accelerate = ([x, y, z], [GM]) => {
  const k = -GM! / Math.hypot(x!, y!, z!) ** 3;
  return [k * x!, k * y!, k * z!];
};

describe.each([
  ["newtonian", ["GM"], newtonian],
  ["post-newtonian-1", ["GM", "c", "mass-ratio"], postNewtonian],
  ["oblate", ["GM", "R", "J2"], oblate],
] as const)("%s", (name, parameters, accelerate) => {
  const start = startOf(findEquations(name)!, false, [...parameters]);
  // Lengths and times of the orbit, so that the tolerance of the other integrator means the same throughout.
  const length = start.state[0]!;
  const rate = length / start.period;
  const units = [length, length, length, rate, rate, rate];
  const end = 3.3 * start.period;
  const solver = new Solver(6);
  solver.absoluteTolerance = 1e-13;
  solver.relativeTolerance = 1e-13;
  solver.maxSteps = 100_000;
  const slopes = (_: number, scaled: number[]): number[] => {
    const state = scaled.map((value, i) => value * units[i]!);
    const acceleration = accelerate(state, start.parameters);
    return [state[3]!, state[4]!, state[5]!, ...acceleration].map(
      (slope, i) => (slope / units[i]!) * start.period,
    );
  };
  const scaledStart = start.state.map((value, i) => value / units[i]!);
  const reference = solver.solve(slopes, 0, scaledStart, end / start.period).y;

  it.each(["dormand-prince-8", "gauss-legendre-6"])(
    "%s follows the other integrator for three orbits",
    (method) => {
      const loop = compileStepLoop(start.system, findMethod(method)!);
      const io = new Float64Array(loop.ioLength);
      io.set(start.state);
      const steps = 6600;
      for (let left = steps; left > 0; ) {
        left -= loop.advance(io, Float64Array.from(start.parameters), end / steps, left);
      }
      reference.forEach((value: number, i: number) => {
        expect(Math.abs(io[i]! / units[i]! - value)).toBeLessThan(1e-9);
      });
    },
  );
});
