import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import { findMethod } from "../../src/methods/catalog/index.js";
import { startOf } from "./starts.js";

/* What `StepLoop.advance` promises, over one method of each family. */

const start = startOf(findEquations("newtonian")!, true);
const { state, period } = start;
const parameters = Float64Array.from(start.parameters);
const STEP = period / 200;

describe.each([
  ["rk4", 0, 4],
  ["leapfrog", 1, 1],
  ["leapfrog-drift-first", 0, 1],
  ["yoshida-8", 1, 15],
])("%s", (name, ahead, each) => {
  const loop = compileStepLoop(start.system, findMethod(name)!);
  const fresh = (): Float64Array => {
    const io = new Float64Array(loop.ioLength);
    io.set(state);
    return io;
  };

  it("stops after the step over which the radius turned from falling to rising", () => {
    const io = fresh();
    // Kepler's third law: the passage is a period after a start at periapsis, in step 200 or 201.
    const taken = loop.advance(io, parameters, STEP, 1000);
    expect(Math.abs(taken - 200.5)).toBeLessThan(1);
    const [x, y, vx, vy, ox, oy, ovx, ovy, rate] = io as unknown as number[];
    expect(x! * vx! + y! * vy!).toBe(rate);
    expect(rate).toBeGreaterThanOrEqual(0);
    expect(ox! * ovx! + oy! * ovy!).toBeLessThan(0);
  });

  it("goes on past a passage when called again, to the next", () => {
    const io = fresh();
    const first = loop.advance(io, parameters, STEP, 1000);
    const second = loop.advance(io, parameters, STEP, 1000);
    expect(Math.abs(second - 200)).toBeLessThanOrEqual(1);
    expect(first + second).toBeGreaterThanOrEqual(400);
  });

  it("leaves the state before the last step, from which one step leads to the state", () => {
    const io = fresh();
    loop.advance(io, parameters, STEP, 37);
    const again = new Float64Array(loop.ioLength);
    again.set(io.slice(4, 8));
    loop.advance(again, parameters, STEP, 1);
    expect([...again.slice(0, 4)]).toEqual([...io.slice(0, 4)]);
  });

  it("goes the same way in calls of any length, to the bit", () => {
    const [one, many] = [fresh(), fresh()];
    loop.advance(one, parameters, STEP, 120);
    for (const steps of [1, 2, 3, 50, 64]) loop.advance(many, parameters, STEP, steps);
    expect([...many.slice(0, 9)]).toEqual([...one.slice(0, 9)]);
  });

  it("counts its evaluations", () => {
    const io = fresh();
    expect(loop.evaluationsPerStep).toBe(each);
    loop.advance(io, parameters, STEP, 10);
    expect(io[9]).toBe(ahead + 10 * each);
  });

  it("takes no step when asked for none", () => {
    const io = fresh();
    expect(loop.advance(io, parameters, STEP, 0)).toBe(0);
    expect([...io.slice(0, 4)]).toEqual(state);
    expect([...io.slice(4, 8)]).toEqual(state);
  });

  it("goes backwards with a negative step", () => {
    const io = fresh();
    loop.advance(io, parameters, -STEP, 1);
    expect(io[1]).toBeLessThan(0);
  });
});
