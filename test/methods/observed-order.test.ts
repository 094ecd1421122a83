import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import { compileSystem } from "../../src/kernel/system.js";
import { methodsCatalog } from "../../src/methods/catalog/index.js";
import type { MethodDefinition } from "../../src/methods/definition.js";
import { keplerState } from "../measure/scenarios.js";

/*
 * What the generated loops do on a real orbit: GM = 1, a = 1, e = 0.5, from periapsis. The truth is Kepler's
 * equation solved by Newton's method; order, symmetry and symplecticity are held to what the catalog says.
 */
const E = 0.5;
const START = [1 - E, 0, 0, Math.sqrt((1 + E) / (1 - E))];
/**
 * A fifth of the way round. Over whole orbits the errors of leading order cancel in part (the orbit is
 * symmetric about its apsis) and some methods seem an order better than they are.
 */
const ARC = 0.2 * 2 * Math.PI;

const system = compileSystem(findEquations("newtonian")!, { parameters: ["GM"], planar: true });
const methods = methodsCatalog.map((method) => [method.name, method] as const);

function flow(method: MethodDefinition, from: readonly number[], step: number, steps: number): number[] {
  const loop = compileStepLoop(system, method);
  const io = new Float64Array(loop.ioLength);
  io.set(from);
  for (let left = steps; left > 0; ) {
    left -= loop.advance(io, Float64Array.of(1), step, left);
    if (io.at(-1) !== 0) throw new Error(`${method.name}: a step did not converge`);
  }
  return [...io.slice(0, 4)];
}

const distance = (one: readonly number[], other: readonly number[]): number =>
  Math.hypot(...one.map((value, i) => value - other[i]!));

describe.each(methods)("%s", (_, method) => {
  /** Rounding over these runs stays below 2e-14; a tenth of an exponent is 7 percent of an error. */
  const FLOOR = 2e-13;
  const MOST = 2 ** 14;

  it(`converges at ${method.order}, neither slower nor faster, down to rounding`, () => {
    const exact = keplerState(1, 1, E, ARC);
    const errors: number[] = [];
    for (let steps = 8; steps <= MOST; steps *= 2) {
      const error = distance(flow(method, START, ARC / steps, steps), exact);
      if (error < FLOOR) break;
      errors.push(error);
    }
    const exponents = errors.slice(1).map((error, i) => Math.log2(errors[i]! / error));
    expect(exponents.length).toBeGreaterThanOrEqual(2);
    // The finest two; the coarser of them may still be on its way.
    const [coarser, finer] = exponents.slice(-2) as [number, number];
    expect(Math.abs(finer - method.order), `${exponents}`).toBeLessThan(0.25);
    expect(Math.abs(coarser - method.order), `${exponents}`).toBeLessThan(0.5);
  });

  it(`${method.symmetric ? "comes back" : "does not come back"} when the step is reversed`, () => {
    const steps = 8;
    const there = flow(method, START, ARC / steps, steps);
    const back = distance(flow(method, there, -ARC / steps, steps), START);
    // Rounding of a few steps; else the error of eight coarse ones, at order 8 some 1e-8.
    if (method.symmetric) expect(back).toBeLessThan(1e-13);
    else expect(back).toBeGreaterThan(1e-10);
  });

  it(`${method.symplectic ? "keeps" : "does not keep"} the symplectic form over a step`, () => {
    const step = 0.2;
    // Columns of the step's Jacobian, by central differences of sixth order.
    const reach = 1e-3;
    const weights = [3 / 4, -3 / 20, 1 / 60];
    const columns = START.map((_, i) => {
      const shifted = (by: number): number[] =>
        flow(
          method,
          START.map((value, j) => (i === j ? value + by * reach : value)),
          step,
          1,
        );
      return START.map((_, k) =>
        weights.reduce((sum, weight, n) => sum + weight * (shifted(n + 1)[k]! - shifted(-n - 1)[k]!), 0),
      ).map((sum) => sum / reach);
    });
    const form = (u: readonly number[], v: readonly number[]): number =>
      u[0]! * v[2]! + u[1]! * v[3]! - u[2]! * v[0]! - u[3]! * v[1]!;
    let worst = 0;
    for (let i = 0; i < 4; i++) {
      for (let j = 0; j < 4; j++) {
        const whole = Number(j === i + 2) - Number(i === j + 2);
        worst = Math.max(worst, Math.abs(form(columns[i]!, columns[j]!) - whole));
      }
    }
    // The differences are right to 1e-12; the eighth order misses by 2e-6.
    if (method.symplectic) expect(worst).toBeLessThan(1e-10);
    else expect(worst).toBeGreaterThan(1e-7);
  });
});
