import { type DoubleDouble, fromFraction, ZERO } from "../arithmetic/double-double.js";
import { operations } from "../arithmetic/operations.js";
import { Graph, type Node } from "../formula/graph.js";
import { parseFormula } from "../formula/parse.js";
import { evaluate, fold } from "../formula/walk.js";
import type { Expression } from "./code.js";

/**
 * Value of a coefficient such as "1/6" or "1/2 - sqrt(15)/10" to 31 digits; its high part is the double
 * nearest to it. Fractions are folded exactly.
 *
 * @throws FormulaError for a text with a name in it
 */
export function preciseConstant(text: string): DoubleDouble {
  const graph = new Graph();
  const formula = parseFormula(graph, text, () => null);
  const value = preciseValue(formula, () => ZERO);
  // What leaves the doubles' range has no low part to speak of.
  return Number.isNaN(value.low) ? { high: evaluate(formula, () => 0), low: 0 } : value;
}

/** Value of an expression in double-double. */
export function preciseValue(node: Node, lookUp: (name: string) => DoubleDouble): DoubleDouble {
  return fold<DoubleDouble>(node, ({ op, value, name }, args) => {
    if (op === "number") return fromFraction(value!);
    if (op === "symbol") return lookUp(name!);
    return operations[op](args[0]!, args[1]!);
  });
}

/** A coefficient as it stands in code: a plain number where a double holds it. */
export const constant = (text: string): Expression => plain(preciseConstant(text));

export const numberNode = (node: Node): Expression => plain(fromFraction(node.value!));

const plain = (value: DoubleDouble): Expression => (value.low === 0 ? value.high : value);
