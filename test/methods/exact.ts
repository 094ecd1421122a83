import { Decimal } from "decimal.js";
import { Graph } from "../../src/formula/graph.js";
import { parseFormula } from "../../src/formula/parse.js";
import { fold } from "../../src/formula/walk.js";

/** Decimals of 60 digits: exact enough to tell a coefficient from a mistyped one. */
export const Exact = Decimal.clone({ precision: 60 });

/** Value of a coefficient's text. */
export function exact(text: string): Decimal {
  return fold<Decimal>(
    parseFormula(new Graph(), text, () => null),
    (node, [a, b]) => {
      switch (node.op) {
        case "number": {
          const { n, d, s } = node.value!;
          return new Exact((s * n).toString()).div(d.toString());
        }
        case "add":
          return a!.plus(b!);
        case "subtract":
          return a!.minus(b!);
        case "multiply":
          return a!.times(b!);
        case "divide":
          return a!.div(b!);
        case "negate":
          return a!.neg();
        case "power":
          return a!.pow(b!);
        case "sqrt":
          return a!.sqrt();
        default:
          throw new Error(`a coefficient with ${node.op}`);
      }
    },
  );
}
