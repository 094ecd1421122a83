import type { Node } from "../formula/graph.js";
import { nearestDouble } from "../formula/nearest-double.js";
import { fold } from "../formula/walk.js";
import { type Code, literal } from "./code.js";

const INFIX: Readonly<Partial<Record<Node["op"], string>>> = {
  add: "+",
  subtract: "-",
  multiply: "*",
  divide: "/",
};

/**
 * Writes expressions as single assignments, each shared node once.
 *
 * @param prefix makes the names of this place unique; names are generated, never text of a formula
 * @param bind the name that a symbol goes by here
 * @param names of the nodes that have one already; those written here are added
 * @returns the names of the expressions' values
 */
export function writeExpressions(
  code: Code,
  nodes: readonly Node[],
  prefix: string,
  bind: (symbol: string) => string,
  names: Map<Node, string> = new Map(),
): string[] {
  return nodes.map((node) =>
    fold<string>(
      node,
      (n, args) => {
        if (n.op === "number") return literal(nearestDouble(n.value!));
        if (n.op === "symbol") return bind(n.name!);
        const name = `${prefix}${n.id}`;
        code.define(name, operation(n, args));
        return name;
      },
      names,
    ),
  );
}

function operation(node: Node, args: readonly string[]): string {
  const infix = INFIX[node.op];
  if (infix !== undefined) return `${args[0]} ${infix} ${args[1]}`;
  if (node.op === "negate") return `-${args[0]}`;
  if (node.op === "power") return `@pow(${args[0]}, ${args[1]})`;
  return `@${node.op}(${args[0]})`;
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
  bind: (symbol: string) => string,
): Map<Node, string> {
  const constant = new Map<Node, boolean>();
  const hoisted = new Map<Node, string>();
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
