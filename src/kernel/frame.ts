import type { Node } from "../formula/graph.js";
import type { StepContext } from "./body.js";
import { Code, type Expression } from "./code.js";
import { hoistParameters, writeExpressions } from "./expressions.js";
import type { CompiledSystem } from "./system.js";

/** The head of a function over a system, and how expressions of the system are written into it. */
export interface Frame {
  /** Reads the parameters, and the state from `io`; goes on from there. */
  readonly code: Code;
  /** Coordinates, and their rates; names of our own, since a loop holds no text of a claim. */
  readonly coordinates: readonly string[];
  readonly rates: readonly string[];
  /** Coordinates, then rates. */
  readonly states: readonly string[];
  readonly accelerate: StepContext["accelerate"];
  /** Writes x·v, or -u' in angle form. */
  radialRate(code: Code, prefix: string, bind: (state: string) => Expression): Expression;
}

/** Begins the code of a function of `$step` and `#steps`; the step goes by `h`. */
export function openFrame(system: CompiledSystem): Frame {
  const number = (letter: string) => (name: string, i: number) => [name, `${letter}${i}`] as const;
  const q = system.coordinates.map(number("x"));
  const v = system.rates.map(number("v"));
  const names = new Map<string, string>([...q, ...v, ...system.symbols.map(number("P"))]);
  const coordinates = q.map(([, name]) => name);
  const rates = v.map(([, name]) => name);
  const states = [...coordinates, ...rates];
  const isParameter = (symbol: string): boolean => system.symbols.includes(symbol);
  const plain = (symbol: string): string => names.get(symbol)!;

  const code = new Code();
  code.define("h", "$step");
  system.symbols.forEach((symbol, index) => {
    code.define(plain(symbol), { from: "parameters", index });
  });
  states.forEach((state, index) => {
    code.variable(state, { from: "io", index });
  });
  const hoisted = hoistParameters(code, system.accelerations, isParameter, plain);
  const write = (
    into: Code,
    nodes: readonly Node[],
    prefix: string,
    bind: (state: string) => Expression,
  ): Expression[] =>
    writeExpressions(
      into,
      nodes,
      prefix,
      (symbol) => (isParameter(symbol) ? plain(symbol) : bind(plain(symbol))),
      new Map(hoisted),
    );
  return {
    code,
    coordinates,
    rates,
    states,
    accelerate: (into, prefix, bind) => write(into, system.accelerations, prefix, bind),
    radialRate: (into, prefix, bind) => write(into, [system.radialRate], prefix, bind)[0]!,
  };
}
