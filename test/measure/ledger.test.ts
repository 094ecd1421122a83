import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import type { Observable } from "../../src/kernel/observables.js";
import { compileSystem } from "../../src/kernel/system.js";
import { runLedger } from "../../src/measure/ledger.js";
import { runPassages } from "../../src/measure/passages.js";
import { findMethod } from "../../src/methods/catalog/index.js";
import { planarOrbit } from "./scenarios.js";

const system = compileSystem(findEquations("newtonian")!, { parameters: ["GM"], planar: true });
const loopOf = (method: string) => compileStepLoop(system, findMethod(method)!);

const watched: readonly Observable[] = [
  {
    name: "energy",
    truncatedAt: null,
    value: ({ 0: x, 1: y, 2: vx, 3: vy }) => [(vx! * vx! + vy! * vy!) / 2 - 1 / Math.hypot(x!, y!)],
  },
  {
    name: "angular-momentum",
    truncatedAt: null,
    value: ({ 0: x, 1: y, 2: vx, 3: vy }) => [x! * vy! - y! * vx!],
  },
  {
    name: "eccentricity-vector",
    truncatedAt: null,
    value: ({ 0: x, 1: y, 2: vx, 3: vy }) => {
      const along = vx! * vx! + vy! * vy! - 1 / Math.hypot(x!, y!);
      const across = x! * vx! + y! * vy!;
      return [along * x! - across * vx!, along * y! - across * vy!];
    },
  },
];

function ledger(method: "leapfrog" | "rk4" | "euler", e: number, perOrbit: number, orbits: number) {
  const scenario = planarOrbit(1, 1, e, orbits);
  const loop = loopOf(method);
  const step = scenario.period / perOrbit;
  const run = runPassages(loop, scenario, [1], step);
  const [energy, momentum, vector] = runLedger(loop, scenario, [1], step, run, watched);
  return { energy: energy!, momentum: momentum!, vector: vector!, run };
}

describe("the ledger of Kepler's problem", () => {
  it("of leapfrog: energy bounded, angular momentum at rounding, eccentricity vector turning", () => {
    // e = 0.3, 200 steps, 100 orbits: the independent prototype kept the energy at 5e-4 and the angular
    // momentum to 1e-13, and turned the apsis by -433.29 arcsec an orbit.
    const { energy, momentum, vector } = ledger("leapfrog", 0.3, 200, 100);
    expect(energy.pattern).toBe("bounded-oscillation");
    expect(energy.largest).toBeGreaterThan(4e-4);
    expect(energy.largest).toBeLessThan(6e-4);
    expect(Math.abs(energy.perOrbit)).toBeLessThan(1e-10);
    expect(energy.exponent).toBeNull();
    expect(momentum.pattern).toBe("rounding-level");
    expect(momentum.largest).toBeLessThan(1e-13);
    expect(vector.pattern).toBe("linear-drift");
    expect((Math.abs(vector.perOrbit) * 180 * 3600) / Math.PI).toBeCloseTo(433.29, 0);
    expect(vector.exponent).toBeCloseTo(1, 2);
  });

  it("of leapfrog stays bounded at high eccentricity, peaks and all", () => {
    expect(ledger("leapfrog", 0.7, 800, 60).energy.pattern).toBe("bounded-oscillation");
    expect(ledger("leapfrog", 0.9, 2048, 60).energy.pattern).toBe("bounded-oscillation");
  });

  it("of rk4: energy and angular momentum drift linearly, at the fifth power of the step", () => {
    const coarse = ledger("rk4", 0.2, 128, 40);
    const fine = ledger("rk4", 0.2, 256, 40);
    for (const { energy, momentum } of [coarse, fine]) {
      for (const entry of [energy, momentum]) {
        expect(entry.pattern).toBe("linear-drift");
        expect(entry.exponent).toBeCloseTo(1, 2);
      }
    }
    const order = Math.log2(coarse.energy.perOrbit / fine.energy.perOrbit);
    expect(order).toBeGreaterThan(4.8);
    expect(order).toBeLessThan(5.2);
  });

  it("of rk4 at e = 0.9 jumps at periapsis", () => {
    const { energy } = ledger("rk4", 0.9, 2048, 50);
    expect(energy.pattern).toBe("jumps-at-periapsis");
    expect(energy.exponent).toBeCloseTo(1, 1);
  });

  it("of rk4 at a step so fine that rounding is all", () => {
    expect(ledger("rk4", 0.3, 16384, 40).energy.pattern).toBe("rounding-level");
  });

  it("of Euler grows, and the energy's growth slows as the orbit widens", () => {
    const { energy } = ledger("euler", 0.3, 4096, 20);
    expect(["linear-drift", "faster-growth"]).toContain(energy.pattern);
    expect(energy.perOrbit).toBeGreaterThan(1e-3);
    expect(energy.exponent).toBeLessThan(1);
  });

  it("does not call a run without two whole orbits bounded", () => {
    const { energy, run } = ledger("leapfrog", 0.9, 100, 10);
    expect(run.status).toBe("escaped");
    expect(energy.largest).toBeGreaterThan(0.1);
    expect(energy.pattern).toBe("linear-drift");
  });
});

describe("a ledger entry", () => {
  it("thins its series and keeps its ends and its peaks", () => {
    const { energy } = ledger("leapfrog", 0.3, 200, 100);
    expect(energy.series.orbits.length).toBeLessThanOrEqual(600);
    expect(energy.series.change.length).toBe(energy.series.orbits.length);
    expect(Math.max(...energy.series.change.map(Math.abs))).toBe(energy.largest);
    expect(energy.series.orbits[0]).toBeLessThan(0.2);
    expect(energy.series.orbits.at(-1)).toBeGreaterThan(99.5);
    expect([...energy.series.orbits].sort((a, b) => a - b)).toEqual(energy.series.orbits);
  });

  it("of a vector that starts near nothing is relative to what it is made of", () => {
    const { vector } = ledger("leapfrog", 1e-9, 200, 20);
    expect(vector.relativeTo).toBe("parts");
    // leapfrog shifts a circle's osculating vector by about h²/4 to h²/6; the parts add up to about 5.
    expect(vector.largest).toBeLessThan(1e-3);
    expect(ledger("leapfrog", 0.3, 200, 5).vector.relativeTo).toBe("start");
  });

  it("of a quantity known only to some order counts the change from orbit to orbit alone", () => {
    const scenario = planarOrbit(1, 1, 0.3, 20);
    const loop = loopOf("rk4");
    const step = scenario.period / 16384;
    const run = runPassages(loop, scenario, [1], step);
    // Energy with a term of 1e-6 left out, as a post-Newtonian energy is at the second order.
    const truncated: Observable = {
      name: "energy",
      truncatedAt: "(GM/(c^2 a))^2",
      value: (state) => [watched[0]!.value(state)[0]! + 1e-6 / Math.hypot(state[0]!, state[1]!) ** 2],
    };
    const [entry] = runLedger(loop, scenario, [1], step, run, [truncated]);
    expect(entry!.largest).toBeLessThan(1e-12);
    expect(entry!.pattern).toBe("rounding-level");
    expect(Math.max(...entry!.series.change.map(Math.abs))).toBeGreaterThan(1e-6);
  });
});
