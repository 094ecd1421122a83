import type { MethodDefinition } from "../methods/definition.js";
import { type LoopArithmetic, styles } from "./arithmetic.js";
import { withoutInfinity } from "./infinity.js";
import { inSingle } from "./single.js";
import type { StepLoop } from "./step-loop.js";
import type { CompiledSystem } from "./system.js";
import { print } from "./text.js";
import { one } from "./wasm/instructions.js";
import { compileModule } from "./wasm/module.js";
import { MOST_STEPS, type WrittenLoop, writeLoop } from "./write-loop.js";

/**
 * Compiles the step loop of a method over a system, to WebAssembly: as fast as warm JavaScript of the same
 * operations, and from the first step on, where JavaScript is interpreted for some thousands.
 */
export function compileStepLoop(
  system: CompiledSystem,
  method: MethodDefinition,
  arithmetic: LoopArithmetic = "double",
): StepLoop {
  const { code, body } = loopIn(system, method, arithmetic);
  const dimension = system.states.length;
  const ioLength = 2 * dimension + 3;
  const count = system.parameters.length;
  const { run, memory, parametersAt } = compileModule(code, one, ioLength, count)!;
  const inputs = 2 * dimension + 1;
  // Rounding to single precision makes no sense of an infinite double.
  const finite = arithmetic === "single" ? withoutInfinity : (value: number): number => value;
  return {
    method,
    dimension,
    ioLength,
    evaluationsPerStep: body.evaluationsPerStep,
    advance(io, parameters, step, steps) {
      for (let i = 0; i < inputs; i++) memory[i] = io[i]!;
      for (let i = 0; i < count; i++) memory[parametersAt + i] = finite(parameters[i]!);
      const taken = run(step, Math.min(steps, MOST_STEPS));
      for (let i = 0; i < ioLength; i++) io[i] = memory[i]!;
      return taken;
    },
  };
}

function loopIn(system: CompiledSystem, method: MethodDefinition, arithmetic: LoopArithmetic): WrittenLoop {
  const written = writeLoop(system, method, styles[arithmetic]);
  return arithmetic === "single" ? { ...written, code: inSingle(written.code) } : written;
}

/**
 * The same loop as a C function `int NAME(double *io, const double *parameters, double step, int steps)`, for
 * a file that includes math.h. It leaves the same bits where formulas keep to + - * / and square roots; in
 * other functions libraries differ.
 */
export function stepLoopInC(
  system: CompiledSystem,
  method: MethodDefinition,
  name: string,
  arithmetic: LoopArithmetic = "double",
): string {
  const head = `int ${name}(double *io, const double *parameters, double step, int steps)`;
  return `${head} {\n${print(loopIn(system, method, arithmetic).code, "c")}\n}\n`;
}
