import { describe, expect, it } from "vitest";
import { earlySteps, stateAfter, stateDistance } from "../../src/measure/early-state.js";
import { eccentricityDrift } from "../../src/measure/eccentricity-vector.js";
import { handLoop, kepler, postNewtonian } from "./hand-loop.js";
import { ARCSEC, keplerState, planarOrbit } from "./scenarios.js";

describe("the early state", () => {
  it.each([
    ["euler", 1, 4096],
    ["leapfrog", 2, 128],
    ["rk4", 4, 128],
  ] as const)("of %s converges at the order %i to Kepler's equation", (method, order, coarsest) => {
    const scenario = planarOrbit(1, 1, 0.3, 3);
    const step = scenario.period / coarsest;
    const steps = earlySteps(step, scenario.period);
    const exact = keplerState(1, 1, 0.3, steps * step);
    const loop = handLoop(method, 4, kepler);
    const errors = [1, 2, 4].map((finer) => {
      const end = stateAfter(loop, scenario, [1], step / finer, steps * finer);
      if (end.status !== "done") throw new Error(end.status);
      return stateDistance(scenario, end.state, exact);
    });
    for (const i of [1, 2]) {
      const exponent = Math.log2(errors[i - 1]! / errors[i]!);
      expect(exponent).toBeGreaterThan(order - 0.3);
      expect(exponent).toBeLessThan(order + 0.3);
    }
  });

  it("lies on a whole coarsest step between one orbit and three, away from the apsides", () => {
    for (const n of [8, 16, 31.7, 200, 4096]) {
      const orbits = earlySteps(1 / n, 1) / n;
      expect(orbits).toBeGreaterThan(1.2);
      expect(orbits).toBeLessThan(1.4);
    }
    expect(earlySteps(5, 1)).toBe(1);
  });

  it("measures distance in parts of the orbit's size and speed", () => {
    const scenario = planarOrbit(8, 2, 0.3, 3);
    // Size 2, mean speed sqrt(GM/a) = 2.
    expect(stateDistance(scenario, [0, 0, 0, 0], [2e-3, 0, 0, 0])).toBeCloseTo(1e-3, 15);
    expect(stateDistance(scenario, [0, 0, 0, 0], [0, 0, 3e-3 * 2, 4e-3 * 2])).toBeCloseTo(5e-3, 15);
    const polar = { ...scenario, apsidalAngle: "polar" } as const;
    expect(stateDistance(polar, [1, 0], [1 + 1e-6, 0])).toBeCloseTo(1e-6 * 2 * (1 - 0.09), 15);
  });

  it("is not had from a run that blows up", () => {
    const scenario = planarOrbit(1, 1, 0.3, 3);
    const bad = handLoop("rk4", 4, (_x, _v, out) => out.fill(Number.NaN));
    expect(stateAfter(bad, scenario, [1], 0.1, 10)).toEqual({ status: "non-finite" });
  });
});

describe("the drift of the eccentricity vector", () => {
  it("of leapfrog, e = 0.3, 200 steps, 100 orbits, end less start, is -429.4 arcsec an orbit", () => {
    // Independent prototype of the same problem; within its half-width of the slope's -433.29.
    const scenario = planarOrbit(1, 1, 0.3, 100);
    const drift = eccentricityDrift(handLoop("leapfrog", 4, kepler), scenario, [1], scenario.period / 200)!;
    expect(drift.perOrbit / ARCSEC).toBeCloseTo(-429.4, 1);
    expect(Math.abs(drift.perOrbit / ARCSEC + 433.29)).toBeLessThan(drift.halfWidth / ARCSEC);
  });

  it("agrees with 6πGM/(c²p) at first post-Newtonian order, in and out of the plane", () => {
    // Einstein's advance; Weinberg, Gravitation and Cosmology (1972), 8.6.11. Next order: a few GM/(c²a).
    const c = 3000;
    const orbit = planarOrbit(1, 1, 0.3, 20, [c]);
    const expected = (6 * Math.PI) / (c * c * (1 - 0.09));
    const planar = eccentricityDrift(handLoop("rk4", 4, postNewtonian), orbit, [1, c], orbit.period / 4096)!;
    expect(Math.abs(planar.perOrbit - expected)).toBeLessThan(planar.halfWidth);
    expect(Math.abs(planar.perOrbit / expected - 1)).toBeLessThan(1e-3);
    const [x, , , v] = orbit.state as [number, number, number, number];
    const tilted = { ...orbit, state: [0.6 * x, 0, 0.8 * x, 0, v, 0] };
    const solid = eccentricityDrift(handLoop("rk4", 6, postNewtonian), tilted, [1, c], orbit.period / 4096)!;
    expect(solid.perOrbit).toBeCloseTo(planar.perOrbit, 13);
  });

  it("follows whole turns", () => {
    const scenario = planarOrbit(1, 1, 0.3, 200);
    const drift = eccentricityDrift(handLoop("leapfrog", 4, kepler), scenario, [1], scenario.period / 20)!;
    expect(drift.perOrbit * 200).toBeLessThan(-2 * Math.PI);
  });

  it("in angle form takes u = K (1 + e cos(φ - ω)) apart", () => {
    // u'' + u = K + δ u turns the apsis by 2π (1/sqrt(1 - δ) - 1) an orbit.
    const delta = 1e-5;
    const K = 1 / 0.91;
    const loop = handLoop("rk4", 2, (x, _v, out) => {
      out[0] = K - (1 - delta) * x[0]!;
    });
    const scenario = {
      ...planarOrbit(1, 1, 0.3, 30),
      state: [1 / 0.7, 0],
      period: 2 * Math.PI,
      apsidalAngle: "polar",
    } as const;
    const drift = eccentricityDrift(loop, scenario, [], (2 * Math.PI) / 2048)!;
    expect(Math.abs(drift.perOrbit - 2 * Math.PI * (1 / Math.sqrt(1 - delta) - 1))).toBeLessThan(
      drift.halfWidth,
    );
    expect(drift.perOrbit / (Math.PI * delta)).toBeCloseTo(1, 2);
  });
});
