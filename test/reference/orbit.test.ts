import { describe, expect, it } from "vitest";
import {
  type DoubleDouble,
  divide,
  fromDouble,
  multiply,
  sqrt,
  subtract,
  toDouble,
} from "../../src/arithmetic/double-double.js";
import { turn } from "../../src/arithmetic/elementary.js";
import { findEquations } from "../../src/equations/catalog/index.js";
import { compileSystem } from "../../src/kernel/system.js";
import type { PreparedScenario } from "../../src/measure/run.js";
import { methodsCatalog } from "../../src/methods/catalog/index.js";
import { preciseOrbit, referenceMethods } from "../../src/reference/orbit.js";
import { exactOrbit } from "../../src/truth/exact-orbit.js";
import { planarOrbit } from "../measure/scenarios.js";

const GM = 1.3e20;
const A = 5.8e10;
const MOST = 1e9;

function systemOf(name: string, parameters: readonly string[]) {
  return compileSystem(findEquations(name)!, { parameters, planar: true });
}
const off = (found: DoubleDouble, truth: DoubleDouble): number =>
  Math.abs(toDouble(subtract(found, truth)) / toDouble(truth));

describe.each(referenceMethods)("an orbit by %s", (method) => {
  // J. Kepler's third law, and an ellipse that does not turn (H. Goldstein, Classical Mechanics, ch. 3).
  it.each([0.001, 0.2056, 0.7, 0.97])("of Kepler with e = %d closes, after 2π sqrt(a³/GM)", (e) => {
    const system = systemOf("newtonian", ["GM"]);
    const scenario = planarOrbit(GM, A, e, 4);
    const orbit = preciseOrbit(method, system, scenario, scenario.precise.parameters, 1e-25, MOST);
    expect(orbit.end).toBe("done");
    expect(orbit.passages).toBe(5);
    expect(Math.abs(toDouble(orbit.advance!))).toBeLessThan(1e-23 / e / (1 - e));
    // The a of the start as its doubles have it: 1/a = 2/r - v²/GM.
    const [x, , , vy] = scenario.precise.state as [DoubleDouble, DoubleDouble, DoubleDouble, DoubleDouble];
    const mu = fromDouble(GM);
    const inverse = subtract(divide(fromDouble(2), x), divide(multiply(vy, vy), mu));
    const n = sqrt(multiply(mu, multiply(inverse, multiply(inverse, inverse))));
    // What is lost at periapsis counts 1/(1 - e) times in a.
    expect(off(orbit.period!, divide(turn, n))).toBeLessThan(1e-23 / (1 - e));
  });

  // Quadrature (`src/truth`), which shares no code with any stepping.
  it.each([
    ["post-newtonian-1", ["GM", "c"], [3e8]],
    ["post-newtonian-1", ["GM", "c", "mass-ratio"], [2e7, 0.25]],
    ["oblate", ["GM", "R", "J2", "J4"], [6e9, 0.01, -0.002]],
  ] as const)("of %s %j turns as quadrature has it", (name, parameters, added) => {
    const system = systemOf(name, parameters);
    for (const e of [0.05, 0.6]) {
      const scenario = planarOrbit(GM, A, e, 4, added);
      const { precise } = scenario;
      const values = Object.fromEntries(system.parameters.map((key, i) => [key, precise.parameters[i]!]));
      const truth = exactOrbit(name, values, precise.state)!;
      const orbit = preciseOrbit(method, system, scenario, precise.parameters, 1e-25, MOST);
      expect(Math.abs(toDouble(subtract(orbit.advance!, truth.advance)))).toBeLessThan(1e-22);
      expect(off(orbit.period!, truth.period)).toBeLessThan(1e-22);
    }
  });

  it("in the angle turns as quadrature has it", () => {
    const system = systemOf("schwarzschild-angle", ["GM", "c"]);
    const e = 0.4;
    const u = 1 / (A * (1 - e));
    const known: Record<string, number> = { GM, c: 1e7, "inverse-semi-latus-rectum": u / (1 + e) };
    const parameters = system.parameters.map((name) => fromDouble(known[name]!));
    const state = [fromDouble(u), fromDouble(0)];
    const scenario: PreparedScenario = {
      ...planarOrbit(GM, A, e, 4),
      apsidalAngle: "polar",
      period: 2 * Math.PI,
      precise: { state, parameters, nullParameters: null },
    };
    const values = Object.fromEntries(system.parameters.map((name, i) => [name, parameters[i]!]));
    const truth = exactOrbit("schwarzschild-angle", values, state)!;
    const orbit = preciseOrbit(method, system, scenario, parameters, 1e-25, MOST);
    expect(off(orbit.advance!, truth.advance)).toBeLessThan(1e-20);
  });

  it("is as near to truth as its tolerance asks, and no nearer than it can be", () => {
    const system = systemOf("newtonian", ["GM"]);
    const scenario = planarOrbit(GM, A, 0.3, 4);
    const errors = [1e-14, 1e-17, 1e-20, 1e-23].map((tolerance) => {
      const orbit = preciseOrbit(method, system, scenario, scenario.precise.parameters, tolerance, MOST);
      return Math.abs(toDouble(orbit.advance!)) / tolerance;
    });
    for (const error of errors) {
      expect(error).toBeLessThan(1e3);
      expect(error).toBeGreaterThan(1e-9);
    }
  });

  it("does not see an effect that is switched off", () => {
    const system = systemOf("post-newtonian-1", ["GM", "c"]);
    const scenario = planarOrbit(GM, A, 0.3, 4, [3e6], [GM, Number.POSITIVE_INFINITY]);
    const { nullParameters } = scenario.precise;
    const orbit = preciseOrbit(method, system, scenario, nullParameters!, 1e-24, MOST);
    expect(Math.abs(toDouble(orbit.advance!))).toBeLessThan(1e-21);
  });

  it("ends with a reason where it is too dear, or holds too few passages", () => {
    const system = systemOf("newtonian", ["GM"]);
    const long = planarOrbit(GM, A, 0.3, 1000);
    expect(preciseOrbit(method, system, long, long.precise.parameters, 1e-20, 1e4).end).toBe("too-dear");
    const short = planarOrbit(GM, A, 0.3, 1);
    const orbit = preciseOrbit(method, system, short, short.precise.parameters, 1e-20, MOST);
    expect(orbit.end).toBe("too-few-passages");
    expect(orbit.advance).toBeNull();
  });
});

it("agrees by both methods on an inclined orbit about an oblate body, from the node", () => {
  const system = compileSystem(findEquations("oblate")!, {
    parameters: ["GM", "R", "J2", "J3"],
    planar: false,
  });
  const v = Math.sqrt((GM / A) * 1.2);
  const state = [A, 0, 0, 0, v * Math.cos(0.7), v * Math.sin(0.7)].map(fromDouble);
  const parameters = [GM, 0.02 * A, 0.08, 0.03].map(fromDouble);
  const scenario: PreparedScenario = {
    ...planarOrbit(GM, A, 0.2, 6),
    state: state.map(toDouble),
    apsidalAngle: "from-node",
    precise: { state, parameters, nullParameters: null },
  };
  const [one, other] = referenceMethods.map(
    (method) => preciseOrbit(method, system, scenario, parameters, 1e-24, MOST).advance!,
  );
  expect(Math.abs(toDouble(one!))).toBeGreaterThan(1e-6);
  expect(Math.abs(toDouble(subtract(one!, other!)))).toBeLessThan(1e-20);
});

it("is by no method that a claim can name", () => {
  const names = methodsCatalog.map(({ name }) => name);
  for (const method of referenceMethods) expect(names).not.toContain(method);
});
