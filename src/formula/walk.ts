import type { Graph, Node } from "./graph.js";
import { nearestDouble } from "./nearest-double.js";

/** The nodes of an expression, each once and after its arguments; `known` ones and what is below them left out. */
export function inOrder(node: Node, known: { has(node: Node): boolean } = new Set()): Node[] {
  // A long sum is as deep as it has terms, too deep to recurse into.
  const order: Node[] = [];
  const met = new Set<Node>();
  const open: [Node, number][] = [];
  const enter = (n: Node): void => {
    if (met.has(n) || known.has(n)) return;
    met.add(n);
    open.push([n, 0]);
  };
  enter(node);
  for (let top = open.at(-1); top !== undefined; top = open.at(-1)) {
    const [n, visited] = top;
    if (visited < n.args.length) {
      top[1]++;
      enter(n.args[visited]!);
    } else {
      order.push(n);
      open.pop();
    }
  }
  return order;
}

/** Computes a value for a node from those of its arguments, each shared node once. */
export function fold<T>(
  node: Node,
  rule: (node: Node, args: readonly T[]) => T,
  known = new Map<Node, T>(),
): T {
  for (const n of inOrder(node, known)) {
    known.set(
      n,
      rule(
        n,
        n.args.map((argument) => known.get(argument)!),
      ),
    );
  }
  return known.get(node)!;
}

/** An expression with symbols replaced. */
export function substitute(graph: Graph, node: Node, replacements: ReadonlyMap<string, Node>): Node {
  return fold<Node>(node, (n, args) =>
    n.op === "symbol" ? (replacements.get(n.name!) ?? n) : graph.rebuild(n, args),
  );
}

/**
 * Whether an expression mentions a symbol that satisfies a condition.
 *
 * @param known gets the answer for every part of the expression
 */
export function mentions(
  node: Node,
  condition: (name: string) => boolean,
  known = new Map<Node, boolean>(),
): boolean {
  const rule = (n: Node, args: readonly boolean[]): boolean =>
    n.op === "symbol" ? condition(n.name!) : args.some(Boolean);
  return fold(node, rule, known);
}

/** Value of an expression in double precision. */
export function evaluate(node: Node, lookUp: (name: string) => number): number {
  return fold<number>(node, (n, args) => {
    const [a, b] = args as [number, number];
    switch (n.op) {
      case "number":
        return nearestDouble(n.value!);
      case "symbol":
        return lookUp(n.name!);
      case "add":
        return a + b;
      case "subtract":
        return a - b;
      case "multiply":
        return a * b;
      case "divide":
        return a / b;
      case "negate":
        return -a;
      case "power":
        return a ** b;
      default:
        return Math[n.op](a);
    }
  });
}
