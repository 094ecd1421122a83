/** A language that loop code is printed in. */
export type Dialect = "javascript" | "c";

/**
 * Loop code as a list of statements that print in either language with the same operations in the same
 * order. Expressions are written in what both share: names, literals, infix operators, parentheses, and
 * `@name(...)` for a function of the mathematical library.
 */
export class Code {
  readonly #lines: ((dialect: Dialect) => string)[] = [];

  /** A value that never changes. */
  define(name: string, value: string): void {
    this.#lines.push((to) => `${to === "c" ? "const double" : "const"} ${name} = ${expression(value, to)};`);
  }

  variable(name: string, value: string): void {
    this.#lines.push((to) => `${to === "c" ? "double" : "let"} ${name} = ${expression(value, to)};`);
  }

  counter(name: string): void {
    this.#lines.push((to) => `${to === "c" ? "int" : "let"} ${name} = 0;`);
  }

  set(name: string, value: string): void {
    this.#lines.push((to) => `${name} = ${expression(value, to)};`);
  }

  /** A line that is the same in both: a brace, a condition, a break. */
  line(text: string): void {
    this.#lines.push((to) => expression(text, to));
  }

  append(other: Code): void {
    this.#lines.push(...other.#lines);
  }

  print(dialect: Dialect): string {
    return this.#lines.map((line) => line(dialect)).join("\n");
  }
}

const IN_C: Readonly<Record<string, string>> = { abs: "fabs", infinity: "INFINITY" };
const IN_JAVASCRIPT: Readonly<Record<string, string>> = { infinity: "Infinity" };

function expression(text: string, dialect: Dialect): string {
  return text.replaceAll(/@(\w+)/g, (_, name: string) =>
    dialect === "c" ? (IN_C[name] ?? name) : (IN_JAVASCRIPT[name] ?? `Math.${name}`),
  );
}

/** A double as a literal that reads back to the same bits in both languages. */
export function literal(value: number): string {
  // C would read a long row of digits without a point as an integer too large for it.
  const text = Math.abs(value) < 2 ** 31 ? String(value) : value.toExponential();
  return value < 0 ? `(${text})` : text;
}

/** Sum of coefficient times name, left to right, without the terms of coefficient zero. */
export function weightedSum(coefficients: readonly number[], names: readonly string[]): string {
  const terms = coefficients
    .map((coefficient, i) => [coefficient, names[i]!] as const)
    .filter(([coefficient]) => coefficient !== 0)
    .map(([coefficient, name]) => (coefficient === 1 ? name : `${literal(coefficient)} * ${name}`));
  return terms.length === 0 ? "0" : terms.join(" + ");
}
