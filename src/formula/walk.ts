import type { Graph, Node } from "./graph.js";

/** Computes a value for a node from those of its arguments, each shared node once. */
export function fold<T>(
  node: Node,
  rule: (node: Node, args: readonly T[]) => T,
  known = new Map<Node, T>(),
): T {
  const ready = known.get(node);
  if (ready !== undefined) return ready;
  const result = rule(
    node,
    node.args.map((argument) => fold(argument, rule, known)),
  );
  known.set(node, result);
  return result;
}

/** An expression with symbols replaced. */
export function substitute(graph: Graph, node: Node, replacements: ReadonlyMap<string, Node>): Node {
  return fold<Node>(node, (n, args) =>
    n.op === "symbol" ? (replacements.get(n.name!) ?? n) : graph.rebuild(n, args),
  );
}

/** Whether an expression mentions a symbol that satisfies a condition. */
export function mentions(node: Node, condition: (name: string) => boolean): boolean {
  return fold<boolean>(node, (n, args) => (n.op === "symbol" ? condition(n.name!) : args.some(Boolean)));
}

/** Value of an expression in double precision. */
export function evaluate(node: Node, lookUp: (name: string) => number): number {
  return fold<number>(node, (n, args) => {
    const [a, b] = args as [number, number];
    switch (n.op) {
      case "number":
        return n.value!.valueOf();
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
