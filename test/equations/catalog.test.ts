import { describe, expect, it } from "vitest";
import { equationsCatalog, findEquations } from "../../src/equations/catalog/index.js";
import type { EquationsDefinition } from "../../src/equations/definition.js";
import { differentiate } from "../../src/formula/differentiate.js";
import type { Node } from "../../src/formula/graph.js";
import { evaluate } from "../../src/formula/walk.js";
import { type CompiledSystem, compileSystem } from "../../src/kernel/system.js";

type Values = Readonly<Record<string, number>>;

const STATE: Values = { x: 0.8, y: -0.5, z: 0.3, vx: 0.4, vy: 0.7, vz: -0.2, u: 0.9, w: 0.15 };
const PARAMETERS: Values = { GM: 1.3, c: 3, nu: 0.2, R: 0.6, J2: 0.1, J3: 0.05, J4: -0.04, K: 0.7 };

const compile = (definition: EquationsDefinition): CompiledSystem =>
  compileSystem(definition, { parameters: Object.keys(definition.parameters), planar: false });
const value = (node: Node, values: Values): number => evaluate(node, (name) => values[name]!);

/** Powers of metre and second in a unit such as m^2/s^2. */
function dimension(unit: string): readonly [metres: number, seconds: number] {
  const powers = { m: 0, s: 0 };
  unit.split("/").forEach((part, i) => {
    const [, name, power] = /^(m|s)(?:\^(\d+))?$/.exec(part) ?? [];
    if (name === undefined) {
      if (part !== "1") throw new Error(`a unit that is not of metres and seconds: ${unit}`);
      return;
    }
    powers[name as "m" | "s"] += (i === 0 ? 1 : -1) * Number(power ?? 1);
  });
  return [powers.m, powers.s];
}

describe.each(equationsCatalog.map((definition) => [definition.name, definition] as const))(
  "%s",
  (_, definition) => {
    const system = compile(definition);
    const given: Values = { ...STATE, ...PARAMETERS };
    const [metre, second] = [3, 7];
    const factor = (unit: string, perSecond = 0): number => {
      const [m, s] = dimension(unit);
      return metre ** m * second ** (s - perSecond);
    };
    const inTime = definition.form === "time";
    const scaled: Record<string, number> = { ...given };
    for (const { symbol, unit } of Object.values(definition.parameters)) scaled[symbol]! *= factor(unit);
    for (const [name, { rate, unit }] of Object.entries(definition.coordinates)) {
      scaled[name]! *= factor(unit);
      scaled[rate]! *= factor(unit, inTime ? 1 : 0);
    }

    it("has formulas of the dimensions that it declares: other units of length and time change no physics", () => {
      const units = Object.values(definition.coordinates).map(({ unit }) => unit);
      system.accelerations.forEach((node, i) => {
        const unit = factor(units[i]!, inTime ? 2 : 0);
        expect(value(node, scaled) / (value(node, given) * unit)).toBeCloseTo(1, 12);
      });
      for (const { name, components } of system.conserved) {
        const unit = definition.conserved[name]?.unit ?? "m^2/s^2";
        for (const node of components) {
          expect(value(node, scaled) / (value(node, given) * factor(unit)), name).toBeCloseTo(1, 12);
        }
      }
    });

    it("conserves at every place what it says, unless only to an order", () => {
      const { graph, coordinates, rates, accelerations, conserved } = system;
      const exact = conserved.filter(({ truncatedAt }) => truncatedAt === null);
      for (const { name, components } of exact) {
        for (const node of components) {
          const terms = coordinates.flatMap((x, i) => [
            value(differentiate(graph, node, x), given) * given[rates[i]!]!,
            value(differentiate(graph, node, rates[i]!), given) * value(accelerations[i]!, given),
          ]);
          const size = Math.max(...terms.map(Math.abs));
          expect(size, name).toBeGreaterThan(0.001);
          expect(Math.abs(terms.reduce((sum, term) => sum + term)), name).toBeLessThan(
            1e-14 * size * terms.length,
          );
        }
      }
      expect(exact.length > 0).toBe(definition.name !== "post-newtonian-1");
    });

    it("is Newton's problem where the effect vanishes", () => {
      const newton = compile(findEquations(inTime ? "newtonian" : "newtonian-angle")!);
      const off: Record<string, number> = { ...given };
      for (const { symbol, vanishesAt } of Object.values(definition.parameters)) {
        if (vanishesAt !== undefined) off[symbol] = vanishesAt;
      }
      system.accelerations.forEach((node, i) => {
        expect(value(node, off) / value(newton.accelerations[i]!, given)).toBeCloseTo(1, 14);
      });
    });

    it("says where it is published, with a year or a book, and what each parameter means", () => {
      expect(definition.source).toMatch(/\b1[89]\d\d|20\d\d|Principia/);
      for (const { meaning } of Object.values(definition.parameters))
        expect(meaning.length).toBeGreaterThan(5);
    });
  },
);

it("has no two systems of one name", () => {
  expect(new Set(equationsCatalog.map(({ name }) => name)).size).toBe(equationsCatalog.length);
});
