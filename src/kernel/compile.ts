import type { Node } from "../formula/graph.js";
import type { MethodDefinition } from "../methods/definition.js";
import { next, type StepBody, type StepContext } from "./body.js";
import { Code, type Dialect } from "./code.js";
import { explicitRungeKutta } from "./explicit-runge-kutta.js";
import { hoistParameters, writeExpressions } from "./expressions.js";
import { implicitRungeKutta } from "./implicit-runge-kutta.js";
import { splitting } from "./splitting.js";
import type { StepLoop } from "./step-loop.js";
import type { CompiledSystem } from "./system.js";

/** Compiles the step loop of a method over a system. */
export function compileStepLoop(system: CompiledSystem, method: MethodDefinition): StepLoop {
  const { body, text } = writeLoop(system, method, "javascript");
  // The text is ours to the last name: formulas enter it as numbered operations on numbered variables.
  const advance = new Function(`"use strict";\nreturn ${text};`)() as StepLoop["advance"];
  const dimension = system.states.length;
  return {
    method,
    dimension,
    ioLength: 2 * dimension + 3,
    evaluationsPerStep: body.evaluationsPerStep,
    advance,
  };
}

/**
 * The same loop as a C function `int NAME(double *io, const double *parameters, double h, int steps)`, for a
 * file that includes math.h.
 */
export function stepLoopInC(system: CompiledSystem, method: MethodDefinition, name: string): string {
  return writeLoop(system, method, "c").text.replace("int advance(", `int ${name}(`);
}

function writeLoop(
  system: CompiledSystem,
  method: MethodDefinition,
  dialect: Dialect,
): { readonly body: StepBody; readonly text: string } {
  const { accelerations, radialRate } = system;
  const { names, coordinates, rates } = plainNames(system);
  const states = [...coordinates, ...rates];
  const n = states.length;
  const isParameter = (symbol: string): boolean => system.symbols.includes(symbol);
  const plain = (symbol: string): string => names.get(symbol)!;

  const code = new Code();
  system.symbols.forEach((symbol, i) => {
    code.define(plain(symbol), `parameters[${i}]`);
  });
  states.forEach((state, i) => {
    code.variable(state, `io[${i}]`);
  });
  code.variable("rate", `io[${2 * n}]`);
  code.counter("taken");
  code.counter("failed");
  const hoisted = hoistParameters(code, accelerations, isParameter, plain);
  const at =
    (bind: (state: string) => string) =>
    (symbol: string): string =>
      isParameter(symbol) ? plain(symbol) : bind(plain(symbol));
  const write = (into: Code, nodes: readonly Node[], prefix: string, bind: (state: string) => string) =>
    writeExpressions(into, nodes, prefix, at(bind), new Map(hoisted));

  const body = bodyOf(method, {
    coordinates,
    rates,
    velocityDependent: system.velocityDependent,
    accelerate: (into, prefix, bind) => write(into, accelerations, prefix, bind),
  });
  code.append(body.before);
  if (body.implicit) code.variable("evaluations", String(body.evaluationsBefore));
  // The old state is written from where the loop is left: to carry it round would cost moves in every step.
  const leave = (state: (name: string) => string): void => {
    states.forEach((name, i) => {
      code.set(`io[${i}]`, state(name));
      code.set(`io[${n + i}]`, name);
    });
    code.set(`io[${2 * n}]`, "rate");
    const fixed = `${body.evaluationsBefore} + taken * ${body.evaluationsPerStep}`;
    code.set(`io[${2 * n + 1}]`, body.implicit ? "evaluations" : fixed);
    code.set(`io[${2 * n + 2}]`, "failed");
    code.line("return taken;");
  };
  code.line("while (taken < steps) {");
  code.append(body.step);
  const rate = write(code, [radialRate], "r", next)[0]!;
  code.define("before", "rate");
  code.set("rate", rate);
  code.line("taken++;");
  code.line("if (taken == steps || (before < 0 && rate >= 0)) {");
  leave(next);
  code.line("}");
  for (const state of states) code.set(state, next(state));
  code.line("}");
  leave((state) => state);
  return { body, text: `${HEADS[dialect]}\n${code.print(dialect)}\n}` };
}

/** Names of our own for everything that a definition names: a loop holds no text of a claim. */
function plainNames({ coordinates, rates, symbols }: CompiledSystem): {
  readonly names: ReadonlyMap<string, string>;
  readonly coordinates: readonly string[];
  readonly rates: readonly string[];
} {
  const number = (letter: string) => (name: string, i: number) => [name, `${letter}${i}`] as const;
  const q = coordinates.map(number("x"));
  const v = rates.map(number("v"));
  return {
    names: new Map([...q, ...v, ...symbols.map(number("P"))]),
    coordinates: q.map(([, name]) => name),
    rates: v.map(([, name]) => name),
  };
}

const HEADS: Readonly<Record<Dialect, string>> = {
  javascript: "function advance(io, parameters, h, steps) {",
  c: "int advance(double *io, const double *parameters, double h, int steps) {",
};

function bodyOf(method: MethodDefinition, context: StepContext): StepBody {
  switch (method.family) {
    case "explicit-runge-kutta":
      return explicitRungeKutta(method, context);
    case "implicit-runge-kutta":
      return implicitRungeKutta(method, context);
    case "splitting":
      return splitting(method, context);
  }
}
