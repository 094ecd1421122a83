import { Decimal } from "decimal.js";
import type { Node } from "../../src/formula/graph.js";
import { fold } from "../../src/formula/walk.js";

/** Arithmetic of 60 digits: enough for central differences that are right to 20. */
export const Exact = Decimal.clone({ precision: 60 });

/** Value of an expression by decimal.js, whose functions are its own. */
export function decimalValue(node: Node, lookUp: (name: string) => Decimal): Decimal {
  return fold<Decimal>(node, (n, args) => {
    const [a, b] = args as [Decimal, Decimal];
    switch (n.op) {
      case "number":
        return new Exact(n.value!.n.toString()).div(n.value!.d.toString()).times(n.value!.s.toString());
      case "symbol":
        return lookUp(n.name!);
      case "add":
        return a.plus(b);
      case "subtract":
        return a.minus(b);
      case "multiply":
        return a.times(b);
      case "divide":
        return a.div(b);
      case "negate":
        return a.neg();
      case "power":
        return a.pow(b);
      case "log":
        return a.ln();
      default:
        return a[n.op]();
    }
  });
}
