import type { Node } from "../formula/graph.js";
import { fold } from "../formula/walk.js";
import type { Code, Expression } from "./code.js";
import { numberNode } from "./constants.js";

/**
 * Writes expressions as single assignments, each shared node once.
 *
 * @param prefix makes the names of this place unique; names are generated, never text of a formula
 * @param bind the name that a symbol goes by here
 * @param names of the nodes that have one already; those written here are added
 * @returns the expressions' values: names, or numbers
 */
export function writeExpressions(
  code: Code,
  nodes: readonly Node[],
  prefix: string,
  bind: (symbol: string) => Expression,
  names: Map<Node, Expression> = new Map(),
): Expression[] {
  return nodes.map((node) =>
    fold<Expression>(
      node,
      (n, args) => {
        if (n.op === "number") return numberNode(n);
        if (n.op === "symbol") return bind(n.name!);
        const name = `${prefix}${n.id}`;
        code.define(name, { op: n.op, args });
        return name;
      },
      names,
    ),
  );
}

/**
 * Writes, ahead of a loop, the largest subexpressions that depend on parameters alone.
 *
 * @returns the names of those nodes
 */
export function hoistParameters(
  code: Code,
  nodes: readonly Node[],
  isParameter: (symbol: string) => boolean,
  bind: (symbol: string) => Expression,
): Map<Node, Expression> {
  const constant = new Map<Node, boolean>();
  const hoisted = new Map<Node, Expression>();
  const visit = (node: Node): void => {
    if (node.args.length === 0) return;
    const fixed = fold<boolean>(
      node,
      (n, args) => (n.op === "symbol" ? isParameter(n.name!) : args.every(Boolean)),
      constant,
    );
    if (!fixed) for (const argument of node.args) visit(argument);
    else writeExpressions(code, [node], "p", bind, hoisted);
  };
  for (const node of nodes) visit(node);
  return hoisted;
}
