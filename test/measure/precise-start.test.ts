import { describe, expect, it } from "vitest";
import { prepare } from "../../src/audit/prepare.js";
import { parseClaim } from "../../src/claim/read.js";
import { Decimal, type Exact, errorInU2 } from "../arithmetic/exact.js";

function prepared(scenario: string, figure = "1 arcsec/orbit") {
  const text = `cupel: claim/1
title: An invented orbit
claimed: { quantity: apsidal-advance, value: ${figure} }
scenario: ${scenario}
`;
  const read = parseClaim(new TextEncoder().encode(text), "made-up.yaml");
  if (!read.ok) throw new Error(JSON.stringify(read.problems));
  const made = prepare(read.claim);
  if ("problem" in made) throw new Error(made.problem);
  return made;
}

// IAU 2012 Resolution B2; the degree by the SI Brochure, table 8. decimal.js at 120 digits is the truth.
const AU = new Decimal("149597870700");
const DEGREE = Decimal.acos(-1).div(180);
/** Some tens of double-double operations, each of a few u². */
const BOUND = 100;

describe("a start to 31 digits", () => {
  it("is that of its elements, in space", () => {
    const { scenario } = prepared(
      "{ equations: oblate, parameters: { GM: 1.1e20 m^3/s^2, R: 0.003 au, J2: 1.7e-4 }, span: 3 orbits, " +
        "start: { semi-major-axis: 0.27 au, eccentricity: 0.31, inclination: 37.3 deg, node: 211 deg, " +
        "argument-of-periapsis: 4000 arcsec, true-anomaly: 77 deg } }",
    );
    // C. D. Murray and S. F. Dermott, Solar System Dynamics (1999), 2.8: eqs. 2.20, 2.32, 2.119 to 2.122.
    const a = AU.times("0.27");
    const e = new Decimal("0.31");
    const [i, node, w, nu] = [
      DEGREE.times("37.3"),
      DEGREE.times(211),
      DEGREE.times(4000).div(3600),
      DEGREE.times(77),
    ] as [Exact, Exact, Exact, Exact];
    const p = a.times(e.pow(2).neg().plus(1));
    const r = p.div(e.times(nu.cos()).plus(1));
    const speed = new Decimal("1.1e20").div(p).sqrt();
    const turn = (along: Exact, across: Exact): Exact[] => {
      const x = along.times(w.cos()).minus(across.times(w.sin()));
      const y = along.times(w.sin()).plus(across.times(w.cos()));
      return [
        x.times(node.cos()).minus(y.times(i.cos()).times(node.sin())),
        x.times(node.sin()).plus(y.times(i.cos()).times(node.cos())),
        y.times(i.sin()),
      ];
    };
    const truth = [
      ...turn(r.times(nu.cos()), r.times(nu.sin())),
      ...turn(speed.times(nu.sin()).neg(), speed.times(e.plus(nu.cos()))),
    ];
    scenario.precise.state.forEach((component, k) => {
      expect(errorInU2(component, truth[k]!)).toBeLessThan(BOUND);
      // The doubles that are stepped are the same start.
      expect(Math.abs(scenario.state[k]! / component.high - 1)).toBeLessThan(1e-14);
    });
    const GM = scenario.precise.parameters[0]!;
    expect(errorInU2(GM, new Decimal("1.1e20"))).toBeLessThanOrEqual(1);
  });

  it("is that of its elements in the angle, K with it", () => {
    const { scenario, system } = prepared(
      "{ equations: schwarzschild-angle, parameters: { GM: 1.1e20 m^3/s^2, c: 299792.458 km/s }, span: 3 orbits, " +
        "start: { periapsis: 0.21 au, apoapsis: 0.34 au } }",
    );
    const [rp, ra] = [AU.times("0.21"), AU.times("0.34")];
    const [u, w] = scenario.precise.state;
    expect(errorInU2(u!, rp.pow(-1))).toBeLessThan(BOUND);
    expect(w!.high + 0).toBe(0);
    const values = new Map(system.parameters.map((name, k) => [name, scenario.precise.parameters[k]!]));
    const K = rp.plus(ra).div(rp.times(ra).times(2));
    expect(errorInU2(values.get("inverse-semi-latus-rectum")!, K)).toBeLessThan(BOUND);
    expect(values.get("c")).toEqual({ high: 299_792_458, low: 0 });
    const off = scenario.precise.nullParameters!;
    expect(off[system.parameters.indexOf("c")]).toEqual({ high: Number.POSITIVE_INFINITY, low: 0 });
    expect(off[system.parameters.indexOf("GM")]).toEqual(values.get("GM"));
  });

  it("is that of its state, unit by unit", () => {
    const { scenario } = prepared(
      "{ equations: newtonian, parameters: { GM: 1.1e20 m^3/s^2 }, span: 3 orbits, " +
        "start: { state: { x: 0.21 au, y: 0 au, vx: 0 au/d, vy: 0.0171 au/d } } }",
    );
    const speed = AU.times("0.0171").div(86_400);
    expect(errorInU2(scenario.precise.state[3]!, speed)).toBeLessThanOrEqual(2);
  });

  it("is its doubles where exact turning points were searched for", () => {
    const { scenario } = prepared(
      "{ equations: post-newtonian-1, parameters: { GM: 1.1e20 m^3/s^2, c: 299792458 m/s }, span: 3 orbits, " +
        "start: { periapsis: 0.21 au, apoapsis: 0.34 au, turning-points: true } }",
    );
    expect(scenario.precise.state).toEqual(scenario.state.map((high) => ({ high, low: 0 })));
  });
});
