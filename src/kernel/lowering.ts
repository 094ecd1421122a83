import type { Machine } from "../arithmetic/machine.js";
import { Code, type Condition, type Expression, isCounter, type Operation, type Statement } from "./code.js";

/**
 * An arithmetic other than the doubles' own, as a way to write its values and operations in doubles.
 *
 * @typeParam V how one of its values stands in code
 */
export interface Arithmetic<V> {
  constant(value: Exclude<Expression, string | Operation>, write: Writer): V;
  /** What a name stands for. */
  named(name: string): V;
  operation(op: Operation["op"], args: readonly V[], write: Writer): V;
  /** The statements that give a name a value; store one in `io`. */
  keep(kind: "define" | "variable" | "set", name: string, value: V, write: Writer): void;
  store(index: number, value: V, write: Writer): void;
  /** The double that a comparison looks at. */
  leading(value: V): Expression;
}

/** Writes operations on doubles, one statement each, into the code at hand. */
export interface Writer extends Machine<Expression> {
  readonly code: Code;
  /** Gives an expression a name of its own. */
  name(value: Expression): string;
}

/** The same code in another arithmetic: counters stay what they are, all else is written in its operations. */
export function lower<V>(code: Code, arithmetic: Arithmetic<V>): Code {
  let names = 0;
  const writerOf = (into: Code): Writer => {
    const name = (value: Expression): string => {
      const own = `t${names++}_`;
      into.define(own, value);
      return own;
    };
    const operation =
      (op: Operation["op"]) =>
      (...args: readonly Expression[]): Expression =>
        name({ op, args });
    return {
      code: into,
      name,
      constant: (value) => value,
      add: operation("add"),
      subtract: operation("subtract"),
      multiply: operation("multiply"),
      divide: operation("divide"),
      sqrt: operation("sqrt"),
    };
  };

  const written = (expression: Expression, write: Writer): V => {
    if (typeof expression === "string") return arithmetic.named(expression);
    if (typeof expression === "number" || !("op" in expression))
      return arithmetic.constant(expression, write);
    const args = expression.args.map((argument) => written(argument, write));
    return arithmetic.operation(expression.op, args, write);
  };
  const conditionOf = (condition: Condition, write: Writer): Condition => {
    if ("both" in condition) return { both: pair(condition.both, write) };
    if ("either" in condition) return { either: pair(condition.either, write) };
    if (condition.args.some(isCounter)) return condition;
    const [a, b] = condition.args.map((argument) => arithmetic.leading(written(argument, write)));
    return { compare: condition.compare, args: [a!, b!] };
  };
  const pair = ([one, other]: readonly [Condition, Condition], write: Writer) =>
    [conditionOf(one, write), conditionOf(other, write)] as const;

  const statement = (given: Statement, into: Code): void => {
    const write = writerOf(into);
    switch (given.do) {
      case "define":
      case "variable":
      case "set":
        if (isCounter(given.name)) into.statements.push(given);
        else arithmetic.keep(given.do, given.name, written(given.value, write), write);
        return;
      case "store":
        arithmetic.store(given.index, written(given.value, write), write);
        return;
      case "loop":
        into.loop((body) => all(given.body, body));
        return;
      case "when":
        into.when(conditionOf(given.condition, write), (body) => all(given.body, body));
        return;
      case "leave":
      case "return":
        into.statements.push(given);
    }
  };
  const all = (from: Code, into: Code): void => {
    for (const given of from.statements) statement(given, into);
  };
  const result = new Code();
  all(code, result);
  return result;
}
