import type { Node } from "../formula/graph.js";
import type { MethodDefinition } from "../methods/definition.js";
import { type LoopStyle, styles } from "./arithmetic.js";
import { next, type StepBody, type StepContext } from "./body.js";
import { Code, compare, type Expression, plus, times } from "./code.js";
import { explicitRungeKutta } from "./explicit-runge-kutta.js";
import { hoistParameters, writeExpressions } from "./expressions.js";
import { implicitRungeKutta } from "./implicit-runge-kutta.js";
import { compensatedMoves, plainMoves } from "./moves.js";
import { splitting } from "./splitting.js";
import type { CompiledSystem } from "./system.js";

/** The step loop of a method over a system, as code of a function of `$step` and `#steps`. */
export interface WrittenLoop {
  readonly code: Code;
  readonly body: StepBody;
}

/** A counter has 32 bits. */
export const MOST_STEPS = 2 ** 31 - 1;

export function writeLoop(
  system: CompiledSystem,
  method: MethodDefinition,
  style: LoopStyle = styles.double,
): WrittenLoop {
  const { accelerations, radialRate } = system;
  const { names, coordinates, rates } = plainNames(system);
  const states = [...coordinates, ...rates];
  const n = states.length;
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
  code.variable("rate", { from: "io", index: 2 * n });
  code.variable("#taken", 0);
  code.variable("failed", 0);
  const hoisted = hoistParameters(code, accelerations, isParameter, plain);
  const at =
    (bind: (state: string) => Expression) =>
    (symbol: string): Expression =>
      isParameter(symbol) ? plain(symbol) : bind(plain(symbol));
  const write = (into: Code, nodes: readonly Node[], prefix: string, bind: (state: string) => Expression) =>
    writeExpressions(into, nodes, prefix, at(bind), new Map(hoisted));

  const moves = style.compensated ? compensatedMoves(states) : plainMoves;
  const body = bodyOf(method, {
    coordinates,
    rates,
    velocityDependent: system.velocityDependent,
    accelerate: (into, prefix, bind) => write(into, accelerations, prefix, bind),
    move: moves.move,
    style,
  });
  moves.before(code);
  code.append(body.before);
  if (body.implicit) code.variable("evaluations", body.evaluationsBefore);

  // The old state is written from where the loop is left: to carry it round would cost moves in every step.
  const finish = (into: Code, state: (name: string) => string): void => {
    states.forEach((name, i) => {
      into.store(i, state(name));
      into.store(n + i, name);
    });
    into.store(2 * n, "rate");
    const fixed = plus(body.evaluationsBefore, times("#taken", body.evaluationsPerStep));
    into.store(2 * n + 1, body.implicit ? "evaluations" : fixed);
    into.store(2 * n + 2, "failed");
    into.return("#taken");
  };
  code.when(compare("#steps", "<=", 0), (none) => finish(none, (state) => state));
  code.loop((loop) => {
    loop.append(body.step);
    const rate = write(loop, [radialRate], "r", next)[0]!;
    loop.define("before", "rate");
    loop.set("rate", rate);
    loop.set("#taken", plus("#taken", 1));
    const passed = { both: [compare("before", "<", 0), compare("rate", ">=", 0)] } as const;
    loop.when({ either: [compare("#taken", "==", "#steps"), passed] }, (last) => finish(last, next));
    for (const state of states) loop.set(state, next(state));
    moves.after(loop);
  });
  // Only a step that failed comes here.
  if (body.implicit) finish(code, (state) => state);
  return { code, body };
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
