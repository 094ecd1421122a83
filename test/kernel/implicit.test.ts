import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { appliesTo } from "../../src/kernel/applies-to.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import type { StepLoop } from "../../src/kernel/step-loop.js";
import { findMethod, methodsCatalog } from "../../src/methods/catalog/index.js";
import { startOf } from "./starts.js";

const start = startOf(findEquations("newtonian")!, true);
const { system, state, period } = start;
const parameters = Float64Array.from(start.parameters);

/** Takes steps, passages and all. */
function take(
  loop: StepLoop,
  from: ArrayLike<number>,
  step: number,
  steps: number,
  most = steps,
): Float64Array {
  const io = new Float64Array(loop.ioLength);
  io.set(Array.from(from).slice(0, loop.dimension));
  for (let left = steps; left > 0; ) {
    const taken = loop.advance(io, parameters, step, Math.min(most, left));
    if (io[2 * loop.dimension + 2] === 1) break;
    left -= taken;
  }
  return io;
}

/** Largest relative difference of positions or of velocities. */
function apart(a: ArrayLike<number>, b: ArrayLike<number>): number {
  const norm = (from: number, value: (i: number) => number) => Math.hypot(value(from), value(from + 1));
  return Math.max(...[0, 2].map((from) => norm(from, (i) => a[i]! - b[i]!) / norm(from, (i) => a[i]!)));
}

describe("going there and back", () => {
  const STEPS = 40;
  const backAndForth = (name: string): number => {
    const loop = compileStepLoop(system, findMethod(name)!);
    const there = take(loop, state, period / 100, STEPS);
    return apart(state, take(loop, there, -period / 100, STEPS));
  };

  const symmetric = methodsCatalog.filter((method) => method.symmetric && appliesTo(method, system).ok);
  it.each(symmetric.map(({ name }) => name))("%s, which is symmetric, returns to rounding", (name) => {
    // Both ways round some tens of times a step, and Kepler's shear carries what a step rounds on.
    expect(backAndForth(name)).toBeLessThan(2e-12);
  });

  it.each(["rk4", "symplectic-euler", "dormand-prince-5"])("%s, which is not, does not", (name) => {
    expect(backAndForth(name)).toBeGreaterThan(1e-10);
  });
});

describe.each(["implicit-midpoint", "gauss-legendre-6"])("%s", (name) => {
  const loop = compileStepLoop(system, findMethod(name)!);
  const FLAG = 2 * loop.dimension + 2;

  it("leaves nothing behind from call to call", () => {
    const once = take(loop, state, period / 100, 250);
    take(loop, [1e11, 0, 0, 1e4], period / 50, 30);
    expect(take(loop, state, period / 100, 250)).toEqual(once);
  });

  it("goes as far in many calls as in one, but for rounding", () => {
    const many = take(loop, state, period / 100, 60, 1);
    expect(apart(take(loop, state, period / 100, 60), many)).toBeLessThan(1e-12);
  });

  it("says that a step of half a period does not converge, and leaves the state", () => {
    const io = new Float64Array(loop.ioLength);
    io.set(state);
    expect(loop.advance(io, parameters, period / 2, 5)).toBe(0);
    expect(io[FLAG]).toBe(1);
    expect([...io.slice(0, 4)]).toEqual(state);
    expect([...io.slice(4, 8)]).toEqual(state);
    expect(io[FLAG - 1]).toBeGreaterThan(loop.evaluationsPerStep);
  });

  it("says so of a state that is no number", () => {
    const io = new Float64Array(loop.ioLength);
    io.set([Number.NaN, 0, 0, 1]);
    expect(loop.advance(io, parameters, period / 100, 5)).toBe(0);
    expect(io[FLAG]).toBe(1);
  });

  it("clears the flag when the next call converges", () => {
    const io = new Float64Array(loop.ioLength);
    io.set(state);
    loop.advance(io, parameters, period / 2, 1);
    expect(loop.advance(io, parameters, period / 100, 3)).toBe(3);
    expect(io[FLAG]).toBe(0);
  });
});
