import { Graph } from "./graph.js";
import { parseFormula } from "./parse.js";
import { evaluate } from "./walk.js";

/**
 * Value of a coefficient such as "1/6" or "1/2 - sqrt(15)/10". Fractions are folded exactly and rounded once.
 *
 * @throws FormulaError for a text with a name in it
 */
export function evaluateConstant(text: string): number {
  const graph = new Graph();
  return evaluate(
    parseFormula(graph, text, () => null),
    () => Number.NaN,
  );
}
