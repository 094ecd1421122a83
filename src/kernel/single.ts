import type { Code, Expression } from "./code.js";
import { type Arithmetic, lower, type Writer } from "./lowering.js";

/** 2^29 + 1 leaves the upper 24 of 53 bits. */
const CUT = 536_870_913;

/**
 * Rounds a double to the 24 bits of single precision (Veltkamp's splitting; T. J. Dekker, Numerische
 * Mathematik 18 (1971) 224). A sum, product, quotient or root of singles that was rounded to a double first
 * rounds to the same single, since 53 ≥ 2·24 + 2 (S. A. Figueroa, SIGNUM Newsletter 30(3) (1995) 21), but
 * for exact ties. The range stays that of a double: a code in single precision works in units in which
 * nothing overflows.
 */
function round(value: Expression, write: Writer): Expression {
  const shifted = write.multiply(CUT, value);
  return write.subtract(shifted, write.subtract(shifted, value));
}

export function roundToSingle(value: number): number {
  const shifted = CUT * value;
  return Number.isFinite(shifted) ? shifted - (shifted - value) : value;
}

const arithmetic: Arithmetic<Expression> = {
  constant(value, write) {
    if (typeof value === "number") return roundToSingle(value);
    if ("high" in value) return roundToSingle(value.high);
    return round(write.name(value), write);
  },
  named: (name) => name,
  operation(op, args, write) {
    const value = write.name({ op, args });
    return op === "negate" || op === "abs" ? value : round(value, write);
  },
  keep: (kind, name, value, { code }) => {
    code.statements.push({ do: kind, name, value });
  },
  store: (index, value, { code }) => code.store(index, value),
  leading: (value) => value,
};

/** The same code with every operation, and everything that is read, rounded to single precision. */
export const inSingle = (code: Code): Code => lower(code, arithmetic);
