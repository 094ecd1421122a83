import * as word from "../arithmetic/double-word.js";
import type { Code, Expression, Load } from "./code.js";
import { type Arithmetic, lower, type Writer } from "./lowering.js";

type Pair = word.Pair<Expression>;

/** Name of the low part of a value, beside that of the high part. */
const lowOf = (name: string): string => `${name}_low`;

/** How many elements `io` and the parameters have; the low parts follow in the same order. */
export interface Lengths {
  readonly io: number;
  readonly parameters: number;
}

/** Where the low part of `$step` is among the parameters: after the low parts of them all. */
const stepRestAt = ({ parameters }: Lengths): number => 2 * parameters;

function arithmeticOf(lengths: Lengths): Arithmetic<Pair> {
  const lowLoad = ({ from, index }: Load): Load => ({ from, index: index + lengths[from] });
  return {
    constant(value, write) {
      if (typeof value === "number") return { high: value, low: 0 };
      if ("high" in value) return value;
      return { high: write.name(value), low: write.name(lowLoad(value)) };
    },
    named(name) {
      if (name.startsWith("#")) return { high: name, low: 0 };
      if (name === "$step") return { high: name, low: { from: "parameters", index: stepRestAt(lengths) } };
      return { high: name, low: lowOf(name) };
    },
    operation(op, args, write) {
      const [a, b] = args as readonly [Pair, Pair];
      switch (op) {
        case "add":
          return word.add(write, a, b);
        case "subtract":
          return word.add(write, a, negated(b, write));
        case "multiply":
          return word.multiply(write, a, b);
        case "divide":
          return word.divide(write, a, b);
        case "sqrt":
          return word.squareRoot(write, a);
        case "negate":
          return negated(a, write);
        case "abs":
          return absolute(a, write);
        default: {
          // A function of the library gives the high part and keeps the low one to be asked for.
          const parts = args.flatMap(({ high, low }) => [high, low]);
          const high = write.name({ op, args: parts });
          return { high, low: write.name({ op: "rest", args: [] }) };
        }
      }
    },
    keep(kind, name, value, write) {
      // Both parts are read before either is written.
      const low = kind === "set" ? write.name(value.low) : value.low;
      write.code.statements.push({ do: kind, name, value: value.high });
      write.code.statements.push({ do: kind, name: lowOf(name), value: low });
    },
    store(index, { high, low }, { code }) {
      code.store(index, high);
      code.store(lengths.io + index, low);
    },
    leading: ({ high }) => high,
  };
}

const negated = ({ high, low }: Pair, write: Writer): Pair => ({
  high: write.name({ op: "negate", args: [high] }),
  low: write.name({ op: "negate", args: [low] }),
});

function absolute(value: Pair, write: Writer): Pair {
  const high = write.name(value.high);
  const low = `${high}low`;
  write.code.variable(low, value.low);
  write.code.when({ compare: "<", args: [high, 0] }, (then) => {
    then.set(low, { op: "negate", args: [low] });
  });
  return { high: write.name({ op: "abs", args: [high] }), low };
}

/**
 * The same code in double-double arithmetic. `io`, the parameters and the step have their low parts after the
 * high ones.
 */
export const inDoubleDouble = (code: Code, lengths: Lengths): Code => lower(code, arithmeticOf(lengths));
