import type { DoubleDouble } from "../arithmetic/double-double.js";
import type { FunctionName } from "../formula/graph.js";

/**
 * Loop code as a tree, printed as text or encoded for WebAssembly with the same operations in the same
 * order. A name that begins with `#` is a counter, an integer; all else are doubles, of which a constant may be
 * given to twice the digits: where doubles are meant its high part counts. Counters, and names that
 * begin with `$`, are one for all runs that a loop steps side by side; any other has a value for each.
 */
export type Expression = string | number | DoubleDouble | Operation | Load;

export interface Operation {
  readonly op: "add" | "subtract" | "multiply" | "divide" | "negate" | "power" | FunctionName | "rest";
  readonly args: readonly Expression[];
}

/** An element of an array that the function is given. */
export interface Load {
  readonly from: "io" | "parameters";
  readonly index: number;
}

export interface Comparison {
  readonly compare: "<" | "<=" | ">=" | "==" | "!=";
  readonly args: readonly [Expression, Expression];
}
export type Condition =
  | Comparison
  | { readonly both: readonly [Condition, Condition] }
  | { readonly either: readonly [Condition, Condition] };

export type Statement =
  /** A value that never changes; `variable` one that may. */
  | { readonly do: "define" | "variable" | "set"; readonly name: string; readonly value: Expression }
  | { readonly do: "store"; readonly index: number; readonly value: Expression }
  /** Goes round until a `leave` in it, or a return. */
  | { readonly do: "loop"; readonly body: Code }
  | { readonly do: "when"; readonly condition: Condition; readonly body: Code }
  | { readonly do: "leave" }
  | { readonly do: "return"; readonly value: Expression };

export const isCounter = (value: Expression): boolean => typeof value === "string" && value.startsWith("#");

/** A list of statements, written from first to last. */
export class Code {
  readonly statements: Statement[] = [];

  define(name: string, value: Expression): void {
    this.statements.push({ do: "define", name, value });
  }

  variable(name: string, value: Expression): void {
    this.statements.push({ do: "variable", name, value });
  }

  set(name: string, value: Expression): void {
    this.statements.push({ do: "set", name, value });
  }

  /** Writes an element of `io`. */
  store(index: number, value: Expression): void {
    this.statements.push({ do: "store", index, value });
  }

  loop(write: (body: Code) => void): void {
    const body = new Code();
    write(body);
    this.statements.push({ do: "loop", body });
  }

  when(condition: Condition, write: (body: Code) => void): void {
    const body = new Code();
    write(body);
    this.statements.push({ do: "when", condition, body });
  }

  /** Leaves the innermost loop. */
  leave(): void {
    this.statements.push({ do: "leave" });
  }

  return(value: Expression): void {
    this.statements.push({ do: "return", value });
  }

  append(other: Code): void {
    this.statements.push(...other.statements);
  }
}

export const plus = (...args: readonly Expression[]): Expression =>
  args.reduce((sum, term) => ({ op: "add", args: [sum, term] }));
export const minus = (a: Expression, b: Expression): Expression => ({ op: "subtract", args: [a, b] });
export const times = (a: Expression, b: Expression): Expression => ({ op: "multiply", args: [a, b] });
export const compare = (a: Expression, sign: Comparison["compare"], b: Expression): Comparison => ({
  compare: sign,
  args: [a, b],
});

/** Sum of coefficient times value, left to right, without the terms of coefficient zero. */
export function weightedSum(coefficients: readonly Expression[], values: readonly Expression[]): Expression {
  const terms = coefficients.flatMap((coefficient, i): Expression[] => {
    if (coefficient === 0) return [];
    return [coefficient === 1 ? values[i]! : times(coefficient, values[i]!)];
  });
  return terms.length === 0 ? 0 : plus(...terms);
}
