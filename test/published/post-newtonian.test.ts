import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { differentiate } from "../../src/formula/differentiate.js";
import type { Node } from "../../src/formula/graph.js";
import { evaluate } from "../../src/formula/walk.js";
import { compileStepLoop } from "../../src/kernel/compile.js";
import { conservedObservables } from "../../src/kernel/observables.js";
import { compileSystem } from "../../src/kernel/system.js";
import { apsidalAdvance } from "../../src/measure/advance.js";
import { runPassages } from "../../src/measure/passages.js";
import { startOfDoubles } from "../../src/measure/precise-start.js";
import { findMethod } from "../../src/methods/catalog/index.js";

/*
 * Two bodies at first post-Newtonian order in harmonic coordinates: L. Blanchet, Living Rev. Relativ. 17, 2
 * (2014), eqs. 219-220 (relative acceleration) and 221-222 or (203) there (conserved energy and angular
 * momentum), each to order 1/c². T. Damour and N. Deruelle, Ann. Inst. H. Poincaré 43, 107 (1985), have the
 * advance: k = 3GM/(c²a(1-e²)) of a turn, whatever the mass ratio.
 */
const definition = findEquations("post-newtonian-1")!;
const GM = 1;
const A = 1;
const E = 0.4;
const STATE = [A * (1 - E), 0, 0, Math.sqrt((GM * (1 + E)) / (A * (1 - E)))];
const PERIOD = 2 * Math.PI;

function system(nu: number, c: number) {
  const compiled = compileSystem(definition, { parameters: ["GM", "c", "mass-ratio"], planar: true });
  return {
    compiled,
    parameters: [GM, c, nu],
    loop: compileStepLoop(compiled, findMethod("gauss-legendre-6")!),
  };
}

/** Largest relative change of each conserved quantity over one orbit. */
function variation(nu: number, c: number): Record<string, number> {
  const { compiled, parameters, loop } = system(nu, c);
  const quantities = conservedObservables(compiled, parameters);
  const io = new Float64Array(loop.ioLength);
  io.set(STATE);
  const start = quantities.map(({ value }) => Math.hypot(...value(io)));
  const worst: Record<string, number> = Object.fromEntries(quantities.map(({ name }) => [name, 0]));
  const steps = 2000;
  for (let taken = 0; taken < steps; ) {
    taken += loop.advance(io, Float64Array.from(parameters), PERIOD / steps, 1);
    quantities.forEach(({ name, value }, i) => {
      worst[name] = Math.max(worst[name]!, Math.abs(Math.hypot(...value(io)) / start[i]! - 1));
    });
  }
  return worst;
}

describe.each([0, 0.1, 0.25])("mass ratio %d", (nu) => {
  it.each(["energy", "angular-momentum"])(
    "conserves %s to order c^-4: its variation falls as that, and no faster",
    (name) => {
      const [slow, fast] = [variation(nu, 60)[name]!, variation(nu, 120)[name]!];
      expect(slow).toBeGreaterThan(1e-9);
      const order = Math.log2(slow / fast);
      expect(order).toBeGreaterThan(3.8);
      expect(order).toBeLessThan(4.2);
    },
  );

  it.each(["energy", "angular-momentum"])(
    "changes %s at every place at a rate of order c^-4 alone",
    (name) => {
      // dQ/dt = ∂Q/∂x · v + ∂Q/∂v · a, whose parts to order c^-2 cancel: what is left is c^-4 times one number.
      const { compiled } = system(nu, 1);
      const { graph, coordinates, rates, accelerations, conserved } = compiled;
      const quantity = conserved.find((of) => of.name === name)!.components.at(-1)!;
      const rate = (c: number, state: readonly number[]): number => {
        const values: Record<string, number> = { GM, c, nu };
        compiled.states.forEach((symbol, i) => {
          values[symbol] = state[i]!;
        });
        const at = (node: Node): number => evaluate(node, (symbol) => values[symbol]!);
        return coordinates.reduce(
          (sum, x, i) =>
            sum +
            at(differentiate(graph, quantity, x)) * values[rates[i]!]! +
            at(differentiate(graph, quantity, rates[i]!)) * at(accelerations[i]!),
          0,
        );
      };
      for (const state of [
        [0.7, 0.2, -0.4, 1.1],
        [-0.5, 0.9, -0.3, -0.8],
        [1.2, -0.1, 0.6, 0.5],
      ]) {
        const [near, far] = [rate(10, state), rate(20, state)];
        expect(Math.abs(near)).toBeGreaterThan(1e-6);
        expect(near / far).toBeCloseTo(16, 4);
      }
    },
  );

  it("turns the apsis by 6πGM/(c²a(1-e²)) to leading order, with a relative rest of order GM/(c²a)", () => {
    const rest = (c: number): number => {
      const { parameters, loop } = system(nu, c);
      const run = runPassages(
        loop,
        {
          state: STATE,
          parameters,
          nullParameters: null,
          precise: startOfDoubles({ state: STATE, parameters, nullParameters: null }),
          startsAtPeriapsis: true,
          period: PERIOD,
          semiMajorAxis: A,
          eccentricity: E,
          span: { kind: "orbits", count: 10 },
          apsidalAngle: "longitude",
        },
        parameters,
        PERIOD / 800,
      );
      return apsidalAdvance(run)!.perOrbit / ((6 * Math.PI * GM) / (c * c * A * (1 - E * E))) - 1;
    };
    const [slow, fast] = [rest(100), rest(200)];
    expect(Math.abs(slow)).toBeLessThan(20 / 100 ** 2);
    expect(Math.log2(slow / fast)).toBeGreaterThan(1.9);
    expect(Math.log2(slow / fast)).toBeLessThan(2.1);
  });
});

it("is Newton's where the speed of light has no limit", () => {
  const newton = compileSystem(findEquations("newtonian")!, { parameters: ["GM"], planar: true });
  const { loop } = system(0.25, Number.POSITIVE_INFINITY);
  const kepler = compileStepLoop(newton, findMethod("gauss-legendre-6")!);
  const [one, other] = [loop, kepler].map((each) => {
    const io = new Float64Array(each.ioLength);
    io.set(STATE);
    each.advance(
      io,
      Float64Array.from(each === loop ? [GM, Number.POSITIVE_INFINITY, 0.25] : [GM]),
      0.01,
      200,
    );
    return [...io.slice(0, 4)];
  });
  for (let i = 0; i < 4; i++) expect(one![i]!).toBeCloseTo(other![i]!, 13);
});
