import type { FunctionName, Graph, Node } from "./graph.js";
import { inOrder } from "./walk.js";

/**
 * Derivative of an expression with respect to a symbol, by the rules of the calculus; shared subexpressions
 * stay shared.
 */
export function differentiate(graph: Graph, node: Node, symbol: string): Node {
  const known = new Map<Node, Node>();
  const of = (n: Node): Node => known.get(n)!;
  const rule = (n: Node): Node => {
    const [a, b] = n.args as [Node, Node];
    switch (n.op) {
      case "number":
        return graph.zero;
      case "symbol":
        return n.name === symbol ? graph.one : graph.zero;
      case "add":
        return graph.add(of(a), of(b));
      case "subtract":
        return graph.subtract(of(a), of(b));
      case "negate":
        return graph.negate(of(a));
      case "multiply":
        return graph.add(graph.multiply(of(a), b), graph.multiply(a, of(b)));
      case "divide":
        return graph.multiply(graph.subtract(of(a), graph.multiply(n, of(b))), inverse(graph, b));
      case "power":
        return power(n, a, b);
      default:
        return chain(graph, n.op, n, a, of(a));
    }
  };
  const power = (n: Node, base: Node, exponent: Node): Node => {
    if (exponent.value !== null) {
      const lower = graph.power(base, graph.subtract(exponent, graph.one));
      return graph.multiply(graph.multiply(exponent, lower), of(base));
    }
    const growth = graph.multiply(of(exponent), graph.call("log", base));
    return graph.multiply(n, graph.add(growth, graph.divide(graph.multiply(exponent, of(base)), base)));
  };
  for (const n of inOrder(node)) known.set(n, rule(n));
  return of(node);
}

/** A reciprocal is shared by all derivatives that need it, where a quotient each would divide each time. */
function inverse(graph: Graph, node: Node): Node {
  return graph.divide(graph.one, node);
}

/** d f(a) = f'(a) da; `n` is f(a) itself. */
function chain(graph: Graph, name: FunctionName, n: Node, a: Node, da: Node): Node {
  if (da === graph.zero) return da;
  const square = (x: Node): Node => graph.multiply(x, x);
  const cosineOfArc = (): Node => graph.call("sqrt", graph.subtract(graph.one, square(a)));
  switch (name) {
    case "sqrt":
      return graph.multiply(da, graph.multiply(graph.number("0.5"), inverse(graph, n)));
    case "sin":
      return graph.multiply(graph.call("cos", a), da);
    case "cos":
      return graph.negate(graph.multiply(graph.call("sin", a), da));
    case "tan":
      return graph.multiply(graph.add(graph.one, square(n)), da);
    case "asin":
      return graph.divide(da, cosineOfArc());
    case "acos":
      return graph.negate(graph.divide(da, cosineOfArc()));
    case "atan":
      return graph.divide(da, graph.add(graph.one, square(a)));
    case "exp":
      return graph.multiply(n, da);
    case "log":
      return graph.divide(da, a);
    case "abs":
      return graph.multiply(graph.divide(a, n), da);
  }
}
