import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { Graph } from "../../src/formula/graph.js";
import { parseFormula } from "../../src/formula/parse.js";
import { evaluate, inOrder } from "../../src/formula/walk.js";

const values: Readonly<Record<string, number>> = { x: 0.7302, y: -1.9177, z: 3.3031 };

/** Formulas with names, signs, and powers of two as factors and divisors: text that JavaScript reads alike. */
const formula = fc.letrec<{ text: string }>((tie) => {
  const power = fc.constantFrom("2", "4", "0.5", "0.25", "8", "1");
  const inner = tie("text");
  const joined = (shape: (a: string, b: string) => string, a = inner, b = inner) =>
    fc.tuple(a, b).map(([one, other]) => shape(one, other));
  return {
    text: fc.oneof(
      { maxDepth: 7, depthSize: "large" },
      fc.constantFrom(...Object.keys(values)),
      joined((a, b) => `(${a} + ${b})`),
      joined((a, b) => `(${a} - ${b})`),
      joined((a, b) => `(${a} * ${b})`),
      joined((a, b) => `(${a} / ${b})`),
      joined((p, a) => `(${p} * ${a})`, power),
      joined((p, a) => `(${p} / ${a})`, power),
      joined((a, p) => `(${a} / ${p})`, inner, power),
      inner.map((a) => `(-${a})`),
    ),
  };
}).text;

describe("simplifying", () => {
  it("changes no bit of what JavaScript makes of the same text", () => {
    let finite = 0;
    fc.assert(
      fc.property(formula, (text) => {
        const own = evaluate(parseFormula(new Graph(), text), (name) => values[name]!);
        const names = Object.keys(values);
        const outside = new Function(...names, `return ${text};`)(
          ...names.map((name) => values[name]),
        ) as number;
        // Zero times infinity is zero here by design, and a simplified zero has no sign.
        if (!Number.isFinite(outside) || Math.abs(outside) < 1e-290) return;
        finite++;
        expect(own).toBe(outside);
      }),
      { numRuns: 3000 },
    );
    expect(finite).toBeGreaterThan(1500);
  });

  it.each([
    ["x * y", "y * x"],
    ["x + y", "y + x"],
    ["x + x", "2 * x"],
    ["x / 8", "0.125 * x"],
    ["1 / (2 * x)", "0.5 / x"],
    ["-x + y", "y - x"],
    ["-x - y", "-(x + y)"],
    ["(-x) * (-y)", "x * y"],
    ["(x / 2) * (4 * y)", "2 * (x * y)"],
    ["x^0", "1"],
    ["x^1", "x"],
    ["0 * x + y", "y"],
  ])("makes one of %s and %s", (one, other) => {
    const graph = new Graph();
    expect(parseFormula(graph, one)).toBe(parseFormula(graph, other));
  });

  it.each([
    ["x / 3", "(1/3) * x"],
    ["(x + y) + z", "x + (y + z)"],
    ["(x * y) * z", "x * (y * z)"],
    ["3 * (5 * x)", "15 * x"],
  ])("keeps %s from %s, which round differently", (one, other) => {
    const graph = new Graph();
    expect(parseFormula(graph, one)).not.toBe(parseFormula(graph, other));
  });

  it("moves no power of two that could overflow alone", () => {
    const text = `(${"(2^32) * ".repeat(30)}x) * (${"(2^32) * ".repeat(30)}x)`;
    const node = parseFormula(new Graph(), text);
    // 2^960 x twice, where x is 2^-900.
    expect(evaluate(node, () => 2 ** -900)).toBe(2 ** 120);
  });

  it("holds whole and half powers to products and roots", () => {
    const operations = (text: string) => inOrder(parseFormula(new Graph(), text)).map(({ op }) => op);
    expect(operations("x^8").filter((op) => op === "multiply")).toHaveLength(3);
    expect(operations("x^(5/2)")).not.toContain("power");
    expect(operations("x^-3").filter((op) => op === "divide")).toHaveLength(1);
    expect(operations("x^0.3")).toContain("power");
  });
});
