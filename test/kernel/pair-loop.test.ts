import { describe, expect, it } from "vitest";
import { equationsCatalog, findEquations } from "../../src/equations/catalog/index.js";
import type { EquationsDefinition } from "../../src/equations/definition.js";
import { appliesTo } from "../../src/kernel/applies-to.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import { compilePairLoop, type PairLoop } from "../../src/kernel/pair-loop.js";
import { compileSystem } from "../../src/kernel/system.js";
import { findMethod, methodsCatalog } from "../../src/methods/catalog/index.js";
import type { MethodDefinition } from "../../src/methods/definition.js";
import { type Start, startOf } from "./starts.js";

const STEPS = 700;

/** The second run: a start aside, and every other parameter changed. */
function second({ state, parameters }: Start): [readonly number[], readonly number[]] {
  return [state.map((x, i) => x * (1 + 0.01 * (i + 1))), parameters.map((x, i) => (i % 2 === 1 ? 2 * x : x))];
}

function compare(start: Start, method: MethodDefinition, pair: PairLoop): void {
  const step = start.period / 100;
  const runs = [[start.state, start.parameters], second(start)] as const;
  const single = compileStepLoop(start.system, method);
  const parameters = runs.map(([, values]) => Float64Array.from(values)) as [Float64Array, Float64Array];
  const fresh = () =>
    runs.map(([state]) => {
      const io = new Float64Array(single.ioLength);
      io.set(state);
      return io;
    }) as [Float64Array, Float64Array];
  const together = fresh();
  const apart = fresh();
  const kept = 2 * single.dimension + 1;
  let [passages, left] = [0, STEPS];
  while (left > 0) {
    const taken = pair.advance(together, parameters, step, left);
    left -= taken;
    // The single loops stop at their own passages alone: a stop of the pair is one for them too, or for one of them.
    const stopped = apart.map((io, i) => {
      const own = single.advance(io, parameters[i]!, step, taken);
      expect(own).toBe(taken);
      return io[2 * single.dimension]! >= 0;
    });
    if (left > 0) {
      expect(stopped).toContain(true);
      passages++;
    }
    for (const i of [0, 1]) {
      expect([...together[i]!.slice(0, kept)]).toEqual([...apart[i]!.slice(0, kept)]);
      expect(together[i]![kept]).toBe(apart[i]![kept]);
    }
  }
  // Some seven orbits of each run; where the two take turns, twice as many stops.
  expect(passages).toBeGreaterThan(5);
}

describe.each(equationsCatalog.map((definition) => [definition.name, definition] as const))(
  "%s",
  (_, definition) => {
    const start = startOf(definition, false);
    const methods = methodsCatalog.filter(
      (method) => appliesTo(method, start.system).ok && method.family !== "implicit-runge-kutta",
    );
    it.each(methods.map((method) => [method.name, method] as const))(
      "runs two by %s side by side as it runs each, to the bit",
      (_, method) => {
        const pair = compilePairLoop(start.system, method);
        expect(pair).not.toBeNull();
        // Euler's orbits open: they pass no periapsis again.
        if (method.order > 1) compare(start, method, pair!);
      },
    );
  },
);

it("steps functions that the processor lacks in both runs", () => {
  const definition: EquationsDefinition = {
    name: "pendulums",
    title: "A pendulum and an exponential of it, invented",
    display: "u'' = -sin u exp(-k u^2) + 0 u^k",
    form: "angle",
    source: "invented",
    parameters: { k: { symbol: "k", unit: "1", meaning: "some number", range: "any" } },
    coordinates: { u: { rate: "w", unit: "1" } },
    acceleration: { u: "-sin(u) * exp(-k*u^2) + 1e-3 * abs(cos(u))^k" },
    conserved: {},
  };
  const system = compileSystem(definition, { parameters: ["k"], planar: false });
  const start: Start = { system, state: [0.5, 0.1], parameters: [0.1], period: 2 * Math.PI };
  const method = findMethod("rk4")!;
  compare(start, method, compilePairLoop(system, method)!);
});

it("is not had of an implicit method", () => {
  const { system } = startOf(findEquations("newtonian")!, true);
  expect(compilePairLoop(system, findMethod("gauss-legendre-6")!)).toBeNull();
});
