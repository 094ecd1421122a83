import ellipk from "@stdlib/math-base-special-ellipk";
import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { appliesTo } from "../../src/kernel/applies-to.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import { conservedObservables } from "../../src/kernel/observables.js";
import { compileSystem } from "../../src/kernel/system.js";
import { apsidalAdvance } from "../../src/measure/advance.js";
import { earlySteps, stateAfter, stateDistance } from "../../src/measure/early-state.js";
import { eccentricityDrift } from "../../src/measure/eccentricity-vector.js";
import { runLedger } from "../../src/measure/ledger.js";
import { runPassages } from "../../src/measure/passages.js";
import type { GivenScenario } from "../../src/measure/start.js";
import { isPlanar, openParameters, prepareScenario } from "../../src/measure/start.js";
import { findMethod, methodsCatalog } from "../../src/methods/catalog/index.js";
import { handLoop, postNewtonian } from "./hand-loop.js";
import { ARCSEC, CENTURY, keplerState } from "./scenarios.js";

interface Given {
  readonly equations: string;
  readonly parameters: Readonly<Record<string, number>>;
  readonly start: Partial<Extract<GivenScenario["start"], { kind: "elements" }>>;
  readonly orbits: number;
}

/** A scenario of the catalog by elements, and its runs by any method. */
function bench({ equations, parameters, start, orbits }: Given) {
  const scenario: GivenScenario = {
    equations: findEquations(equations)!,
    parameters,
    start: {
      kind: "elements",
      periapsis: 0.7,
      apoapsis: 1.3,
      inclination: 0,
      node: 0,
      argumentOfPeriapsis: 0,
      trueAnomaly: 0,
      turningPoints: false,
      ...start,
    },
    span: { kind: "orbits", count: orbits, text: "" },
  };
  const system = compileSystem(scenario.equations, {
    parameters: openParameters(scenario),
    planar: isPlanar(scenario),
  });
  const loop = (method: string) => compileStepLoop(system, findMethod(method)!);
  const made = prepareScenario(scenario, system, () => loop("dormand-prince-8"));
  if ("problem" in made) throw new Error(made.problem);
  const run = (method: string, perOrbit: number, effect: "on" | "off" = "on") =>
    runPassages(
      loop(method),
      made,
      effect === "on" ? made.parameters : made.nullParameters!,
      made.period / perOrbit,
    );
  const advance = (method: string, perOrbit: number, effect: "on" | "off" = "on") =>
    apsidalAdvance(run(method, perOrbit, effect))!;
  return { system, made, loop, run, advance };
}

const kepler = bench({ equations: "newtonian", parameters: { GM: 1 }, start: {}, orbits: 100 });

describe("the state order of every method", () => {
  // Where truncation rules: above the saturation of the phase and below rounding.
  const coarsest: Record<string, number> = { euler: 4096, "symplectic-euler": 1024 };
  it.each(methodsCatalog.map(({ name, order }) => [name, order] as const))(
    "%s has the order %i against Kepler's equation at the early time",
    (name, order) => {
      const { made, loop } = kepler;
      const perOrbit = coarsest[name] ?? (order === 5 ? 256 : 64);
      const step = made.period / perOrbit;
      const steps = earlySteps(step, made.period);
      const exact = keplerState(1, 1, 0.3, steps * step);
      const errors = [1, 2].map((finer) => {
        const after = stateAfter(loop(name), made, made.parameters, step / finer, steps * finer);
        if (after.status !== "done") throw new Error(after.status);
        return stateDistance(made, after.state, exact);
      });
      const exponent = Math.log2(errors[0]! / errors[1]!);
      expect(exponent).toBeGreaterThan(order - 0.5);
      expect(exponent).toBeLessThan(order + 0.35);
    },
  );
});

describe("the advance", () => {
  it("converges at 4 with rk4, and at 6 with dormand-prince-5 whose state converges at 5", () => {
    const order = (method: string, perOrbit: number): number =>
      Math.log2(kepler.advance(method, perOrbit).perOrbit / kepler.advance(method, 2 * perOrbit).perOrbit);
    expect(order("rk4", 256)).toBeCloseTo(4, 1);
    expect(order("dormand-prince-5", 128)).toBeCloseTo(6, 1);
    expect(order("dormand-prince-5", 256)).toBeCloseTo(6, 1);
  });

  it("of Mercury's orbit is 42.98 arcsec a century with the high orders, and less its null run with rk4", () => {
    // 42.98: Nobili and Will, Nature 320, 39 (1986).
    const mercury = bench({
      equations: "post-newtonian-1",
      parameters: { GM: 1.32712440018e20, c: 299792458 },
      start: {
        periapsis: 0.38709893 * 149597870700 * (1 - 0.20563),
        apoapsis: 0.38709893 * 149597870700 * 1.20563,
      },
      orbits: 20,
    });
    const figure = (method: string, effect: "on" | "off"): number =>
      mercury.advance(method, 256, effect).perTime * (CENTURY / ARCSEC);
    expect(figure("dormand-prince-8", "on").toFixed(2)).toBe("42.98");
    expect(Math.abs(figure("dormand-prince-8", "off"))).toBeLessThan(1e-6);
    expect(Math.abs(figure("gauss-legendre-6", "on") - figure("dormand-prince-8", "on"))).toBeLessThan(5e-4);
    // The independent prototype: 62.0226 raw, 19.0418 null; 42.98046 by the osculating period.
    expect(Math.abs(figure("rk4", "on") / 62.0226 - 1)).toBeLessThan(1e-5);
    expect(Math.abs(figure("rk4", "off") - 19.0418)).toBeLessThan(1e-4);
    const perOrbit = mercury.advance("dormand-prince-8", 512).perOrbit;
    expect((perOrbit / mercury.made.period) * (CENTURY / ARCSEC)).toBeCloseTo(42.98046, 5);
  });

  it.each([
    [15, 25],
    [15, 45],
    [8, 20],
    [1e3, 1.5e3],
    [1e7, 1.5e7],
  ])(
    "of Schwarzschild's orbit between %f and %f GM/c² is that of the complete elliptic integral",
    (rp, ra) => {
      // u'² = 2 m (u - u1)(u2 - u)(u3 - u): Δφ = 4 K(k) / sqrt(2 m (u3 - u1)), k² = (u2 - u1)/(u3 - u1).
      const [u1, u2] = [1 / ra, 1 / rp];
      const u3 = 1 / 2 - u1 - u2;
      const exact = (4 * ellipk((u2 - u1) / (u3 - u1))) / Math.sqrt(2 * (u3 - u1));
      const orbit = bench({
        equations: "schwarzschild-angle",
        parameters: { GM: 1, c: 1 },
        start: { periapsis: rp, apoapsis: ra, turningPoints: true },
        orbits: 20,
      });
      for (const method of ["dormand-prince-8", "gauss-legendre-6"]) {
        const { perOrbit } = orbit.advance(method, 512);
        expect(Math.abs((perOrbit + 2 * Math.PI) / exact - 1)).toBeLessThan(2e-15);
        // The advance alone keeps what 2π leaves of its digits.
        expect(Math.abs(perOrbit - (exact - 2 * Math.PI))).toBeLessThan(2e-14);
      }
    },
  );

  it("of an oblate body's satellite, from the node, is (3/4) J2 (R/p)² (5 cos² i - 1) of a turn", () => {
    // Kaula, Theory of Satellite Geodesy (1966), eq. 3.74, the secular motion of the argument of perigee.
    for (const inclination of [0.5, Math.atan(2), Math.PI / 2, 2.5]) {
      const orbit = bench({
        equations: "oblate",
        parameters: { GM: 1, R: 1, J2: 1e-6 },
        start: { periapsis: 1.6, apoapsis: 2.4, inclination, argumentOfPeriapsis: 1 },
        orbits: 20,
      });
      const theory = (2 * Math.PI * 0.75e-6 * (5 * Math.cos(inclination) ** 2 - 1)) / (2 * 0.96) ** 2;
      // Next order in J2.
      expect(Math.abs(orbit.advance("dormand-prince-8", 512).perOrbit - theory)).toBeLessThan(1e-11);
    }
  });

  it("agrees with the drift of the eccentricity vector within its half-width", () => {
    const orbit = bench({
      equations: "schwarzschild-angle",
      parameters: { GM: 1, c: 1 },
      start: { periapsis: 15, apoapsis: 45, turningPoints: true },
      orbits: 20,
    });
    const { perOrbit, radialPeriod } = orbit.advance("dormand-prince-8", 256);
    const { made, loop } = orbit;
    const drift = eccentricityDrift(
      loop("dormand-prince-8"),
      made,
      made.parameters,
      made.period / 256,
      radialPeriod,
    )!;
    expect(Math.abs(drift.perOrbit - perOrbit)).toBeLessThan(drift.halfWidth);
    expect(drift.halfWidth / perOrbit).toBeLessThan(0.1);
  });
});

describe("exact turning points", () => {
  it.each([
    [5000, 0],
    [30, 0.4],
    [12, 1],
  ])(
    "in time, c = %f, are reached by an integration that shares nothing with the search",
    (c, inclination) => {
      const orbit = bench({
        equations: "post-newtonian-1",
        parameters: { GM: 1, c },
        start: { turningPoints: true, inclination, argumentOfPeriapsis: 0.7 },
        orbits: 4,
      });
      const { made } = orbit;
      const hand = handLoop("rk4", made.state.length, postNewtonian);
      const parameters = [1, c];
      const found = runPassages(hand, made, parameters, made.period / 8192);
      for (const r of found.distances) expect(Math.abs(r / 0.7 - 1)).toBeLessThan(1e-11);
      // The motion is the same forwards and backwards from an apsis: half a radial period on lies the other.
      const half = apsidalAdvance(found)!.radialPeriod / 2;
      const apoapsis = stateAfter(hand, made, parameters, half / 8192, 8192);
      if (apoapsis.status !== "done") throw new Error(apoapsis.status);
      const position = apoapsis.state.slice(0, made.state.length / 2);
      expect(Math.abs(Math.hypot(...position) / 1.3 - 1)).toBeLessThan(1e-11);
    },
  );
});

describe("a run of every method", () => {
  it.each(methodsCatalog.map(({ name }) => [name] as const))(
    "%s passes through the same bits however its steps are cut into calls",
    (name) => {
      const { made, loop } = kepler;
      const whole = loop(name);
      const single: typeof whole = {
        ...whole,
        advance: (io, parameters, step, steps) => whole.advance(io, parameters, step, Math.min(1, steps)),
      };
      const bits = (by: typeof whole) => {
        // Implicit steps start from the one before, in the same call; that costs sweeps, not bits.
        const {
          seconds: _,
          evaluations: __,
          ...rest
        } = runPassages(by, { ...made, span: { kind: "orbits", count: 9 } }, [1], made.period / 97);
        return rest;
      };
      expect(bits(single)).toEqual(bits(whole));
    },
  );
});

describe("the ledger of every method", () => {
  const patterns = (orbit: ReturnType<typeof bench>, method: string, perOrbit: number) => {
    const { system, made, loop } = orbit;
    const run = orbit.run(method, perOrbit);
    const watched = conservedObservables(system, made.parameters);
    const read = runLedger(loop(method), made, made.parameters, made.period / perOrbit, run, watched);
    return Object.fromEntries(read.map((entry) => [entry.quantity, entry]));
  };

  it.each(methodsCatalog.filter(({ symplectic }) => symplectic).map(({ name }) => [name] as const))(
    "%s, symplectic, keeps the energy bounded and the angular momentum to rounding",
    (name) => {
      const { energy, "angular-momentum": momentum } = patterns(kepler, name, 128);
      expect(["bounded-oscillation", "rounding-level"]).toContain(energy!.pattern);
      expect(Math.abs(energy!.perOrbit)).toBeLessThan(1e-7 * energy!.largest + 1e-15);
      expect(momentum!.pattern).toBe("rounding-level");
    },
  );

  it.each([
    ["midpoint", 3],
    ["heun", 3],
    ["rk4", 5],
    ["dormand-prince-5", 5],
  ])("%s drifts in energy as the power %i of the step", (name, power) => {
    const [coarse, fine] = [256, 512].map((n) => patterns(kepler, name, n).energy!);
    for (const entry of [coarse!, fine!]) {
      expect(["linear-drift", "jumps-at-periapsis"]).toContain(entry.pattern);
      expect(entry.exponent).toBeCloseTo(1, 0);
    }
    const order = Math.log2(coarse!.perOrbit / fine!.perOrbit);
    expect(order).toBeGreaterThan(power - 0.25);
    expect(order).toBeLessThan(power + 0.25);
  });

  it("takes no post-Newtonian energy's own swing for a drift", () => {
    const strong = bench({
      equations: "post-newtonian-1",
      parameters: { GM: 1, c: 30 },
      start: {},
      orbits: 100,
    });
    for (const method of ["gauss-legendre-6", "dormand-prince-8"]) {
      const { energy, "angular-momentum": momentum } = patterns(strong, method, 512);
      for (const entry of [energy!, momentum!]) {
        expect(entry.truncatedAt).not.toBeNull();
        expect(entry.pattern).toBe("rounding-level");
        // It does swing, by (GM/(c² r))² or so.
        expect(Math.max(...entry.series.change.map(Math.abs))).toBeGreaterThan(1e-7);
      }
    }
    expect(patterns(strong, "rk4", 512).energy!.pattern).toBe("linear-drift");
  });
});

it("methods that split the motion do not apply where the acceleration depends on the velocity", () => {
  const { system } = bench({
    equations: "post-newtonian-1",
    parameters: { GM: 1, c: 30 },
    start: {},
    orbits: 3,
  });
  expect(appliesTo(findMethod("leapfrog")!, system).ok).toBe(false);
});
