import type { MethodDefinition } from "../methods/definition.js";
import type { CompiledSystem } from "./system.js";
import { two } from "./wasm/instructions.js";
import { compileModule } from "./wasm/module.js";
import { MOST_STEPS, writeLoop } from "./write-loop.js";

/** Two runs of one method at one step, from their own starts with their own parameters. */
export interface PairLoop {
  readonly method: MethodDefinition;
  readonly dimension: number;
  readonly ioLength: number;
  readonly evaluationsPerStep: number;
  /**
   * Takes at most `steps` steps of either run, and stops after the first step over which the radial rate of
   * either turned from negative to zero or more. Each `io` is that of `StepLoop.advance`, and is left with the
   * bits that it would leave. Returns the number of steps taken of each.
   */
  advance(
    io: readonly [Float64Array, Float64Array],
    parameters: readonly [Float64Array, Float64Array],
    step: number,
    steps: number,
  ): number;
}

/**
 * Compiles a loop that steps two runs side by side, in the two halves of wide registers: the pair takes hardly
 * longer than one. Null where it cannot: an implicit method makes as many sweeps as its own run needs, and some
 * machines have no wide registers.
 */
export function compilePairLoop(system: CompiledSystem, method: MethodDefinition): PairLoop | null {
  if (method.family === "implicit-runge-kutta") return null;
  const { code, body } = writeLoop(system, method);
  const dimension = system.states.length;
  const ioLength = 2 * dimension + 3;
  const count = system.parameters.length;
  const compiled = compileModule(code, two, ioLength, count);
  if (compiled === null) return null;
  const { run, memory, parametersAt } = compiled;
  const inputs = 2 * dimension + 1;
  return {
    method,
    dimension,
    ioLength,
    evaluationsPerStep: body.evaluationsPerStep,
    advance([one, other], [parameters, others], step, steps) {
      for (let i = 0; i < inputs; i++) {
        memory[2 * i] = one[i]!;
        memory[2 * i + 1] = other[i]!;
      }
      for (let i = 0; i < count; i++) {
        memory[parametersAt + 2 * i] = parameters[i]!;
        memory[parametersAt + 2 * i + 1] = others[i]!;
      }
      const taken = run(step, Math.min(steps, MOST_STEPS));
      for (let i = 0; i < ioLength; i++) {
        one[i] = memory[2 * i]!;
        other[i] = memory[2 * i + 1]!;
      }
      return taken;
    },
  };
}
