import type { Decimal } from "decimal.js";
import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { Graph } from "../../src/formula/graph.js";
import { parseFormula } from "../../src/formula/parse.js";
import { appliesTo } from "../../src/kernel/applies-to.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import { methodsCatalog } from "../../src/methods/catalog/index.js";
import type { MethodDefinition } from "../../src/methods/definition.js";
import { decimalValue, Exact } from "../formula/in-decimal.js";
import { type Start, startOf } from "./starts.js";

/*
 * A step of every method against its definition, carried out by decimal.js in 60 digits: a plain loop over the
 * coefficients, with the accelerations written out by hand.
 */

type Vector = readonly Decimal[];
type Acceleration = (q: Vector, v: Vector) => Vector;

const sum = (terms: readonly Decimal[]): Decimal =>
  terms.reduce((total, term) => total.plus(term), new Exact(0));
const dot = (a: Vector, b: Vector): Decimal => sum(a.map((x, i) => x.times(b[i]!)));
const plus = (a: Vector, factor: Decimal, b: Vector): Vector => a.map((x, i) => x.plus(factor.times(b[i]!)));
const exact = (text: string): Decimal =>
  decimalValue(parseFormula(new Graph(), text), () => new Exact(Number.NaN));
/** The double itself: decimal.js would take a number for its shortest decimal. */
const ofDouble = (value: number): Decimal => new Exact(value.toPrecision(60));

const newton =
  ([GM]: Vector): Acceleration =>
  (q) =>
    q.map((x) => x.times(GM!).neg().div(dot(q, q).sqrt().pow(3)));

/** Of a test particle, harmonic coordinates: C. M. Will, Theory and Experiment (1993), eq. 7.47 at β = γ = 1. */
const postNewton =
  ([GM, c]: Vector): Acceleration =>
  (q, v) => {
    const r = dot(q, q).sqrt();
    const m = GM!.div(r);
    const along = GM!.div(r.pow(3)).times(dot(v, v).minus(m.times(4)).div(c!.pow(2)).plus(1));
    const across = GM!.times(4).times(dot(q, v)).div(r.pow(3)).div(c!.pow(2));
    return q.map((x, i) => across.times(v[i]!).minus(along.times(x)));
  };

const schwarzschild =
  ([GM, c, K]: Vector): Acceleration =>
  ([u]) => [K!.minus(u!).plus(GM!.times(3).div(c!.pow(2)).times(u!.pow(2)))];

/** One step by the definition; implicit stages iterated until 50 digits stand. */
function stepExactly(
  method: MethodDefinition,
  f: Acceleration,
  q: Vector,
  v: Vector,
  h: Decimal,
): [Vector, Vector] {
  if (method.family === "splitting") {
    for (const stage of method.stages) {
      if ("kick" in stage) v = plus(v, exact(stage.kick).times(h), f(q, v));
      else q = plus(q, exact(stage.drift).times(h), v);
    }
    return [q, v];
  }
  const a = method.a.map((row) => row.map(exact));
  const stages: [Vector, Vector][] = [];
  const sweeps = method.family === "implicit-runge-kutta" ? 40 : 1;
  if (sweeps > 1) for (const _ of method.b) stages.push([v, f(q, v)]);
  for (let sweep = 0; sweep < sweeps; sweep++) {
    a.forEach((row, i) => {
      const at = row.reduce<[Vector, Vector]>(
        ([x, y], weight, j) => [
          plus(x, weight.times(h), stages[j]![0]),
          plus(y, weight.times(h), stages[j]![1]),
        ],
        [q, v],
      );
      stages[i] = [at[1], f(...at)];
    });
  }
  method.b.forEach((weight, i) => {
    q = plus(q, exact(weight).times(h), stages[i]![0]);
    v = plus(v, exact(weight).times(h), stages[i]![1]);
  });
  return [q, v];
}

const STEPS = 4;

const systems: readonly [string, (parameters: Vector) => Acceleration, Start][] = [
  ["newtonian", newton, startOf(findEquations("newtonian")!, false)],
  ["post-newtonian-1", postNewton, startOf(findEquations("post-newtonian-1")!, false, ["GM", "c"])],
  ["schwarzschild-angle", schwarzschild, startOf(findEquations("schwarzschild-angle")!, false)],
];

describe.each(systems)("%s", (_, acceleration, start) => {
  const { system, state, parameters, period } = start;
  const methods = methodsCatalog.filter((method) => appliesTo(method, system).ok);

  it.each(methods.map((method) => [method.name, method] as const))(
    "is stepped by %s as defined",
    (_, method) => {
      const loop = compileStepLoop(system, method);
      const io = new Float64Array(loop.ioLength);
      io.set(state);
      const h = period / 90;
      expect(loop.advance(io, Float64Array.from(parameters), h, STEPS)).toBe(STEPS);

      const half = state.length / 2;
      const f = acceleration(parameters.map(ofDouble));
      let [q, v]: [Vector, Vector] = [state.slice(0, half).map(ofDouble), state.slice(half).map(ofDouble)];
      for (let step = 0; step < STEPS; step++) [q, v] = stepExactly(method, f, q, v, ofDouble(h));

      const error = (from: number, right: Vector): number =>
        Math.sqrt(sum(right.map((x, i) => x.minus(ofDouble(io[from + i]!)).pow(2))).toNumber());
      const size = (right: Vector): number => Math.sqrt(dot(right, right).toNumber());
      // Some tens of roundings a step, each half a unit of the last place.
      const bound = 40 * STEPS * 2 ** -53;
      expect(error(0, q)).toBeLessThan(bound * size(q));
      expect(error(half, v)).toBeLessThan(
        bound * Math.max(size(v), system.definition.form === "angle" ? size(q) : 0),
      );
    },
  );
});
