import type { MethodDefinition } from "../methods/definition.js";
import { type LoopStyle, styles } from "./arithmetic.js";
import { next, type StepBody, type StepContext } from "./body.js";
import { type Code, compare, plus, times } from "./code.js";
import { explicitRungeKutta } from "./explicit-runge-kutta.js";
import { openFrame } from "./frame.js";
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
  const { code, coordinates, rates, states, accelerate, radialRate } = openFrame(system);
  const n = states.length;
  code.variable("rate", { from: "io", index: 2 * n });
  code.variable("#taken", 0);
  code.variable("failed", 0);
  const moves = style.compensated ? compensatedMoves(states) : plainMoves;
  const body = bodyOf(method, {
    coordinates,
    rates,
    velocityDependent: system.velocityDependent,
    accelerate,
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
    const rate = radialRate(loop, "r", next);
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
