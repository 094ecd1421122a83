import { type Code, type Condition, type Expression, isCounter, type Statement } from "./code.js";

/** A language that code is printed in. */
export type Dialect = "javascript" | "c";

/** Code as text. */
export function print(code: Code, dialect: Dialect): string {
  return code.statements.map((statement) => line(statement, dialect)).join("\n");
}

function line(statement: Statement, dialect: Dialect): string {
  const counts = "name" in statement && isCounter(statement.name);
  const value = "value" in statement ? expression(statement.value, dialect, counts) : "";
  switch (statement.do) {
    case "define":
    case "variable": {
      const keyword = counts && dialect === "c" ? "int" : KEYWORDS[dialect][statement.do];
      return `${keyword} ${plain(statement.name)} = ${value};`;
    }
    case "set":
      return `${plain(statement.name)} = ${value};`;
    case "store":
      return `io[${statement.index}] = ${value};`;
    case "loop":
      return `for (;;) {\n${print(statement.body, dialect)}\n}`;
    case "when":
      return `if (${condition(statement.condition, dialect)}) {\n${print(statement.body, dialect)}\n}`;
    case "leave":
      return "break;";
    case "return":
      return `return ${value};`;
  }
}

const KEYWORDS = {
  javascript: { define: "const", variable: "let" },
  c: { define: "const double", variable: "double" },
} as const;

const INFIX: Readonly<Record<string, string>> = { add: "+", subtract: "-", multiply: "*", divide: "/" };
const IN_C: Readonly<Record<string, string>> = { abs: "fabs", power: "pow" };
const IN_JAVASCRIPT: Readonly<Record<string, string>> = { power: "pow" };

/** An expression as text. Everything composite is in parentheses: the order of operations is the tree's. */
export function expression(value: Expression, dialect: Dialect, integer = false): string {
  if (typeof value === "string") return plain(value);
  if (typeof value === "number") return literal(value, dialect, integer);
  if ("high" in value) return literal(value.high, dialect, false);
  if ("from" in value) return `${value.from}[${value.index}]`;
  const args = value.args.map((argument) => expression(argument, dialect, integer));
  const infix = INFIX[value.op];
  if (infix !== undefined) return `(${args.join(` ${infix} `)})`;
  if (value.op === "negate") return `(-${args[0]})`;
  const name = dialect === "c" ? (IN_C[value.op] ?? value.op) : `Math.${IN_JAVASCRIPT[value.op] ?? value.op}`;
  return `${name}(${args.join(", ")})`;
}

function condition(test: Condition, dialect: Dialect): string {
  if ("both" in test) return `(${test.both.map((part) => condition(part, dialect)).join(" && ")})`;
  if ("either" in test) return `(${test.either.map((part) => condition(part, dialect)).join(" || ")})`;
  const integer = test.args.some(isCounter);
  return test.args.map((argument) => expression(argument, dialect, integer)).join(` ${test.compare} `);
}

const plain = (name: string): string => name.replace(/[$#]/, "");

/** A double as a literal that reads back to the same bits. */
function literal(value: number, dialect: Dialect, integer: boolean): string {
  if (!Number.isFinite(value)) {
    const infinity = dialect === "c" ? "INFINITY" : "Infinity";
    return value < 0 ? `(-${infinity})` : infinity;
  }
  const text = String(value);
  // A whole number would be an integer in C, and too large for one at 20 digits.
  const double = dialect === "c" && !integer && /^-?\d+$/.test(text) ? `${text}.0` : text;
  return value < 0 ? `(${double})` : double;
}
