import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Start } from "../../src/claim/claim.js";
import type { EquationsDefinition } from "../../src/equations/definition.js";
import type { StepLoop } from "../../src/kernel/step-loop.js";
import type { GivenScenario } from "../../src/measure/start.js";
import { isPlanar, prepareScenario } from "../../src/measure/start.js";
import { handLoop, kepler } from "./hand-loop.js";
import { keplerState } from "./scenarios.js";

const inTime: EquationsDefinition = {
  name: "test-in-time",
  title: "",
  display: "",
  form: "time",
  source: "the tests",
  parameters: {
    GM: { symbol: "GM", unit: "m^3/s^2", meaning: "", range: "positive" },
    c: { symbol: "c", unit: "m/s", meaning: "", default: 299792458, vanishesAt: Infinity, range: "positive" },
  },
  coordinates: { x: { rate: "vx", unit: "m" }, y: { rate: "vy", unit: "m" }, z: { rate: "vz", unit: "m" } },
  conserved: {},
};
const inAngle: EquationsDefinition = {
  ...inTime,
  name: "test-in-angle",
  form: "angle",
  parameters: {
    ...inTime.parameters,
    K: { symbol: "K", unit: "1/m", meaning: "", fromStart: "inverse-semi-latus-rectum", range: "positive" },
  },
  coordinates: { u: { rate: "w", unit: "1/m" } },
};
const planar = { states: ["x", "y", "vx", "vy"], parameters: ["GM", "c"] };
const solid = { states: ["x", "y", "z", "vx", "vy", "vz"], parameters: ["GM", "c"] };
const polar = { states: ["u", "w"], parameters: ["GM", "c", "K"] };
/** Newton's motion in time; u'' + u = K in angle. */
function newtonian(system: {
  readonly states: readonly string[];
  readonly parameters: readonly string[];
}): StepLoop {
  if (system.states.length > 2) return handLoop("rk4", system.states.length, kepler);
  return handLoop("rk4", 2, (x, _v, out, parameters) => {
    out[0] = parameters[system.parameters.indexOf("K")]! - x[0]!;
  });
}
const elements = (given: Partial<Extract<Start, { kind: "elements" }>>): Start => ({
  kind: "elements",
  periapsis: 0.7,
  apoapsis: 1.3,
  inclination: 0,
  node: 0,
  argumentOfPeriapsis: 0,
  trueAnomaly: 0,
  turningPoints: false,
  ...given,
});
const scenario = (start: Start, equations = inTime): GivenScenario => ({
  equations,
  parameters: { GM: 2 },
  start,
  span: { kind: "orbits", count: 5, text: "5 orbits" },
});
function prepared(given: GivenScenario, system = planar, loop: () => StepLoop = () => newtonian(system)) {
  const made = prepareScenario(given, system, loop);
  if ("problem" in made) throw new Error(made.problem);
  return made;
}
function problem(
  given: GivenScenario,
  system = planar,
  loop: () => StepLoop = () => newtonian(system),
): string {
  const made = prepareScenario(given, system, loop);
  return "problem" in made ? made.problem : "none";
}
const degrees = (value: number): number => value * (Math.PI / 180);

describe("osculating elements", () => {
  it("start at periapsis on +x, counter-clockwise, with exact zeros", () => {
    const made = prepared(scenario(elements({})), solid);
    const speed = Math.sqrt((2 * 2 * 1.3) / (0.7 * (0.7 + 1.3)));
    expect(made.state).toEqual([0.7, 0, 0, 0, speed, 0]);
    expect(made.state.some((value) => Object.is(value, -0))).toBe(false);
    expect(made).toMatchObject({
      parameters: [2, 299792458],
      nullParameters: [2, Infinity],
      startsAtPeriapsis: true,
      semiMajorAxis: 1,
      apsidalAngle: "longitude",
      span: { kind: "orbits", count: 5 },
    });
    expect(made.eccentricity).toBeCloseTo(0.3, 15);
    // Kepler's third law.
    expect(made.period).toBeCloseTo(2 * Math.PI * Math.sqrt(1 / 2), 15);
  });

  it("at quarter angles in degrees leave no dust", () => {
    const [rp, v] = [0.7, Math.sqrt((2 * 2 * 1.3) / (0.7 * 2))];
    const state = (given: Parameters<typeof elements>[0]) => prepared(scenario(elements(given)), solid).state;
    expect(state({ argumentOfPeriapsis: degrees(90) })).toEqual([0, rp, 0, -v, 0, 0]);
    expect(state({ node: degrees(180) })).toEqual([-rp, 0, 0, 0, -v, 0]);
    expect(state({ inclination: degrees(90) })).toEqual([rp, 0, 0, 0, 0, v]);
    expect(state({ inclination: degrees(180) })).toEqual([rp, 0, 0, 0, -v, 0]);
    expect(state({ node: degrees(270), inclination: degrees(90) })).toEqual([0, -rp, 0, 0, 0, v]);
    const apoapsis = prepared(scenario(elements({ trueAnomaly: degrees(180) })), solid);
    expect(apoapsis.state).toEqual([-1.3, 0, 0, 0, -Math.sqrt((2 * 2 * 0.7) / (1.3 * 2)), 0]);
    expect(apoapsis.startsAtPeriapsis).toBe(false);
  });

  it("at any true anomaly lie on the ellipse of Kepler's equation", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 0.95, noNaN: true }),
        fc.double({ min: 0.001, max: 0.9, noNaN: true }),
        (part, e) => {
          const period = 2 * Math.PI * Math.sqrt(1 / 2);
          const expected = keplerState(2, 1, e, part * period);
          const trueAnomaly = Math.atan2(expected[1]!, expected[0]!);
          const made = prepared(scenario(elements({ periapsis: 1 - e, apoapsis: 1 + e, trueAnomaly })));
          for (const [i, value] of made.state.entries()) expect(value).toBeCloseTo(expected[i]!, 11);
          expect(made.startsAtPeriapsis).toBe(false);
        },
      ),
    );
  });

  it("turned into space keep the inclination, the node and the periapsis that were given", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 3.1, noNaN: true }),
        fc.double({ min: -3, max: 3, noNaN: true }),
        fc.double({ min: -3, max: 3, noNaN: true }),
        (inclination, node, argumentOfPeriapsis) => {
          const made = prepared(scenario(elements({ inclination, node, argumentOfPeriapsis })), solid);
          const [x, y, z, vx, vy, vz] = made.state as [number, number, number, number, number, number];
          // Murray and Dermott, Solar System Dynamics (1999), equations 2.131 to 2.139.
          const h = [y * vz - z * vy, z * vx - x * vz, x * vy - y * vx] as const;
          expect(Math.acos(h[2] / Math.hypot(...h))).toBeCloseTo(inclination, 7);
          const off = (a: number, b: number): number => Math.abs(Math.sin((a - b) / 2));
          expect(off(Math.atan2(h[0], -h[1]), node)).toBeLessThan(1e-12);
          const cosine = x * Math.cos(node) + y * Math.sin(node);
          expect(off(Math.atan2(z / Math.sin(inclination), cosine), argumentOfPeriapsis)).toBeLessThan(1e-12);
          expect(made.apsidalAngle).toBe("from-node");
        },
      ),
    );
  });

  it("are planar only where the inclination is exactly 0 or a half turn", () => {
    expect(isPlanar(scenario(elements({ node: 1, argumentOfPeriapsis: 2 })))).toBe(true);
    expect(isPlanar(scenario(elements({ inclination: degrees(180) })))).toBe(true);
    expect(isPlanar(scenario(elements({ inclination: 1e-9 })))).toBe(false);
    expect(prepared(scenario(elements({ inclination: 1e-9 })), solid).apsidalAngle).toBe("longitude");
    expect(isPlanar(scenario(elements({}), inAngle))).toBe(false);
  });

  it("in angle form give u = 1/rp, u' = 0 and GM/h² = 1/(rp (1 + e))", () => {
    const made = prepared(scenario(elements({}), inAngle), polar);
    expect(made.state).toEqual([1 / 0.7, 0]);
    expect(made.parameters[2]).toBeCloseTo(1 / (0.7 * 1.3), 15);
    expect(made.nullParameters).toEqual([2, Infinity, made.parameters[2]]);
    expect(made).toMatchObject({ period: 2 * Math.PI, apsidalAngle: "polar", startsAtPeriapsis: true });
    // A quarter turn on u = K and u' = -K e.
    const later = prepared(scenario(elements({ trueAnomaly: degrees(90) }), inAngle), polar);
    const K = later.parameters[2]!;
    expect(later.state[0]).toBe(K);
    expect(later.state[1]! / K).toBeCloseTo(-0.3, 15);
    expect(later.startsAtPeriapsis).toBe(false);
  });
});

describe("a starting state", () => {
  const state = (values: Record<string, number>, equations = inTime): GivenScenario =>
    scenario({ kind: "state", values }, equations);

  it("is taken as it stands, with the ellipse that osculates it", () => {
    const [x, y, vx, vy] = keplerState(2, 1, 0.4, 0.7) as [number, number, number, number];
    const made = prepared(state({ x, y, z: 0, vx, vy, vz: 0 }));
    expect(made.state).toEqual([x, y, vx, vy]);
    expect(made.semiMajorAxis).toBeCloseTo(1, 14);
    expect(made.eccentricity).toBeCloseTo(0.4, 14);
    expect(made.startsAtPeriapsis).toBe(false);
    expect(isPlanar(state({ x, y, vx, vy }))).toBe(true);
    expect(isPlanar(state({ x, y, z: 1e-300, vx, vy, vz: 0 }))).toBe(false);
  });

  it("is at periapsis where the radius is stationary and turns outward", () => {
    const speed = Math.sqrt((2 * 1.3) / 0.7);
    const at = (vx: number, vy: number) => prepared(state({ x: 0.7, y: 0, vx, vy })).startsAtPeriapsis;
    expect(at(0, speed)).toBe(true);
    expect(at(-1e-13, speed)).toBe(true);
    expect(at(1e-10, speed)).toBe(false);
    expect(prepared(state({ x: 1.3, y: 0, vx: 0, vy: Math.sqrt((2 * 0.7) / 1.3) })).startsAtPeriapsis).toBe(
      false,
    );
  });

  it("needs all its numbers, a bound orbit and a motion, and says so", () => {
    expect(problem(state({ x: 1, y: 0, vx: 0 }))).toBe("the starting state lacks vy");
    expect(problem(state({ x: 1, y: 0, vx: 0, vy: 2 }))).toMatch(/unbound/);
    expect(problem(state({ x: 1, y: 0, vx: 0, vy: 9 }))).toMatch(/unbound/);
    expect(problem(state({ x: 0, y: 0, vx: 0, vy: 1 }))).toMatch(/centre/);
    expect(problem(state({ x: 1, y: 0, vx: 0, vy: 0 }))).toMatch(/at rest/);
    expect(problem(state({ u: 1, w: 0 }, inAngle), polar)).toMatch(/needs all of u, w, K/);
    expect(problem(state({ u: 1, w: 0, K: 0.4 }, inAngle), polar)).toMatch(/unbound/);
    expect(prepared(state({ u: 1, w: 0, K: 0.8 }, inAngle), polar).eccentricity).toBeCloseTo(0.25, 15);
  });

  it("of equations without GM has the period of the pull that it feels", () => {
    const { GM: _, ...rest } = inTime.parameters;
    const equations = { ...inTime, parameters: rest };
    // The pull is Newton's with GM = 3; nobody tells.
    const loop = handLoop("rk4", 4, (x, v, out) => kepler(x, v, out, Float64Array.of(3)));
    const given = {
      ...state({ x: 0.7, y: 0, vx: 0, vy: Math.sqrt((3 * 1.3) / 0.7) }, equations),
      parameters: {},
    };
    const made = prepared(given, { states: planar.states, parameters: ["c"] }, () => loop);
    expect(Math.abs(made.period / (2 * Math.PI * Math.sqrt(1 / 3)) - 1)).toBeLessThan(1e-6);
    expect(made.startsAtPeriapsis).toBe(true);
    expect(problem({ ...given, start: elements({}) }, planar)).toMatch(
      /no parameter GM|needs the parameter GM/,
    );
  });
});

describe("a nearly circular start at the elements' periapsis", () => {
  // Pulled harder than by GM alone, the orbit falls in from there: e = 1e-4 under 1 + 1e-3 of the pull.
  const pulled = (extra: number): StepLoop =>
    handLoop("rk4", 4, (x, v, out, parameters) =>
      kepler(x, v, out, Float64Array.of(parameters[0]! * (1 + extra))),
    );
  const nearCircle = scenario(elements({ periapsis: 1 - 1e-4, apoapsis: 1 + 1e-4 }));

  it("is passage 0 only where the equations turn outward there", () => {
    expect(prepared(nearCircle, planar, () => pulled(1e-5)).startsAtPeriapsis).toBe(true);
    expect(prepared(nearCircle, planar, () => pulled(1e-3)).startsAtPeriapsis).toBe(false);
  });

  it("of no eccentricity has no apsis", () => {
    expect(problem(scenario(elements({ periapsis: 1, apoapsis: 1 })))).toMatch(/circle/);
  });
});

describe("a scenario", () => {
  it("has no null run where nothing can vanish", () => {
    const { c: _, ...rest } = inTime.parameters;
    const equations = { ...inTime, parameters: rest };
    const made = prepared(scenario(elements({}), equations), {
      states: planar.states,
      parameters: ["GM"],
    });
    expect(made.nullParameters).toBeNull();
  });

  it("spans a time in time and an angle in angle form, and nothing else", () => {
    const time = { kind: "time", length: 50, text: "50 s" } as const;
    const angle = { kind: "angle", length: 50, text: "50 rad" } as const;
    expect(prepared({ ...scenario(elements({})), span: time }).span).toEqual({ kind: "length", length: 50 });
    expect(prepared({ ...scenario(elements({}), inAngle), span: angle }, polar).span.kind).toBe("length");
    expect(problem({ ...scenario(elements({})), span: angle })).toMatch(/orbits or a time, not 50 rad/);
    expect(problem({ ...scenario(elements({}), inAngle), span: time }, polar)).toMatch(
      /or an angle, not 50 s/,
    );
  });

  it("refuses elements that make no sense", () => {
    expect(problem(scenario(elements({ periapsis: 2 })))).toMatch(/no less than the periapsis/);
    expect(problem(scenario(elements({ periapsis: 0 })))).toMatch(/more than 0/);
    expect(problem(scenario(elements({ apoapsis: Infinity })))).toMatch(/finite/);
    expect(problem(scenario(elements({ turningPoints: true, trueAnomaly: 1 })))).toMatch(/true anomaly/);
    expect(problem(scenario(elements({ node: 1 }), inAngle), polar)).toMatch(/no orientation/);
    expect(problem({ ...scenario(elements({})), parameters: {} })).toMatch(/GM/);
  });
});
