import type { FunctionName, Graph, Node } from "./graph.js";
import { inOrder, mentions } from "./walk.js";

/**
 * Derivatives of an expression with respect to symbols, by the rules of the calculus taken from the expression
 * down to its symbols (reverse accumulation; A. Griewank and A. Walther, Evaluating Derivatives, 2nd ed. (SIAM,
 * 2008), 3.2): what the derivatives have in common is shared.
 */
export function gradient(graph: Graph, node: Node, symbols: readonly string[]): Node[] {
  const known = new Map<Node, boolean>();
  const depends = (n: Node): boolean => known.get(n)!;
  mentions(node, (name) => symbols.includes(name), known);
  /** Derivative of the whole expression with respect to each of its parts. */
  const derivatives = new Map([[node, graph.one]]);
  for (const n of inOrder(node).reverse()) {
    const outer = derivatives.get(n);
    if (outer === undefined || !depends(n)) continue;
    const parts = rule(graph, n, outer, depends);
    n.args.forEach((argument, i) => {
      if (!depends(argument)) return;
      const before = derivatives.get(argument);
      derivatives.set(argument, before === undefined ? parts[i]!() : graph.add(before, parts[i]!()));
    });
  }
  return symbols.map((name) => derivatives.get(graph.symbol(name)) ?? graph.zero);
}

/** Derivative of an expression with respect to a symbol. */
export function differentiate(graph: Graph, node: Node, symbol: string): Node {
  return gradient(graph, node, [symbol])[0]!;
}

/** Derivative with respect to each argument of `n`, times `outer`, which is that with respect to `n`. */
function rule(graph: Graph, n: Node, outer: Node, depends: (n: Node) => boolean): readonly (() => Node)[] {
  const [a, b] = n.args as [Node, Node];
  switch (n.op) {
    case "number":
    case "symbol":
      return [];
    case "add":
      return [() => outer, () => outer];
    case "subtract":
      return [() => outer, () => graph.negate(outer)];
    case "negate":
      return [() => graph.negate(outer)];
    case "multiply":
      return [() => graph.multiply(outer, b), () => graph.multiply(outer, a)];
    case "divide":
      return quotient(graph, n, outer);
    case "power":
      return power(graph, n, outer, depends(b));
    default:
      return [() => chain(graph, n.op as FunctionName, n, a, outer)];
  }
}

/** A reciprocal is shared by all derivatives that need it, where a quotient each would divide each time. */
const inverse = (graph: Graph, node: Node): Node => graph.divide(graph.one, node);

function quotient(graph: Graph, n: Node, outer: Node): readonly (() => Node)[] {
  const [a, b] = n.args as [Node, Node];
  const ofNumerator = (): Node => graph.multiply(outer, inverse(graph, b));
  if (a === graph.one) return [ofNumerator, () => graph.negate(graph.multiply(outer, graph.multiply(n, n)))];
  return [ofNumerator, () => graph.negate(graph.multiply(ofNumerator(), n))];
}

function power(graph: Graph, n: Node, outer: Node, exponentVaries: boolean): readonly (() => Node)[] {
  const [base, exponent] = n.args as [Node, Node];
  const lower = (): Node =>
    exponentVaries
      ? graph.multiply(n, inverse(graph, base))
      : graph.power(base, graph.subtract(exponent, graph.one));
  return [
    () => graph.multiply(outer, graph.multiply(exponent, lower())),
    () => graph.multiply(outer, graph.multiply(n, graph.call("log", base))),
  ];
}

/** f'(a) times `outer`; `n` is f(a) itself. */
function chain(graph: Graph, name: FunctionName, n: Node, a: Node, outer: Node): Node {
  const square = (x: Node): Node => graph.multiply(x, x);
  const cosineOfArc = (): Node => graph.call("sqrt", graph.subtract(graph.one, square(a)));
  const times = (slope: Node): Node => graph.multiply(outer, slope);
  switch (name) {
    case "sqrt":
      return times(graph.multiply(graph.number("0.5"), inverse(graph, n)));
    case "sin":
      return times(graph.call("cos", a));
    case "cos":
      return times(graph.negate(graph.call("sin", a)));
    case "tan":
      return times(graph.add(graph.one, square(n)));
    case "asin":
      return graph.divide(outer, cosineOfArc());
    case "acos":
      return graph.negate(graph.divide(outer, cosineOfArc()));
    case "atan":
      return graph.divide(outer, graph.add(graph.one, square(a)));
    case "exp":
      return times(n);
    case "log":
      return graph.divide(outer, a);
    case "abs":
      return times(graph.divide(a, n));
  }
}
