import type { DoubleDouble } from "../arithmetic/double-double.js";
import { operations } from "../arithmetic/operations.js";
import { functionNames } from "../formula/graph.js";
import type { MethodDefinition } from "../methods/definition.js";
import { styles } from "./arithmetic.js";
import type { Code, Operation } from "./code.js";
import { inDoubleDouble } from "./double-double.js";
import { withoutInfinity } from "./infinity.js";
import type { CompiledSystem } from "./system.js";
import { one } from "./wasm/instructions.js";
import { compileModule, type Mathematics } from "./wasm/module.js";
import { MOST_STEPS, writeLoop } from "./write-loop.js";

/** Code of a function of `$step` and `#steps`, compiled to run in double-double. */
export interface PreciseFunction {
  /** Elements of `io` without their low parts. */
  readonly ioLength: number;
  /**
   * @param io the high parts, then the low ones; read at the call, written at the return
   * @param parameters in the order of the system, none of them infinite
   */
  run(io: Float64Array, parameters: readonly DoubleDouble[], step: DoubleDouble, steps: number): number;
}

/** Keeps the low part of its last result for the call of `rest` that follows. */
function mathematics(): Mathematics {
  let rest = 0;
  const keep = ({ high, low }: DoubleDouble): number => {
    rest = low;
    return high;
  };
  const wrapped = [...functionNames, "power" as const].map((name) => [
    name,
    (...[a, aLow, b, bLow]: number[]) =>
      keep(operations[name]({ high: a!, low: aLow! }, { high: b ?? 0, low: bLow ?? 0 })),
  ]);
  return { ...(Object.fromEntries(wrapped) as Record<Operation["op"], () => number>), rest: () => rest };
}

export const withoutInfinities = (values: readonly DoubleDouble[]): DoubleDouble[] =>
  values.map(({ high, low }) => ({ high: withoutInfinity(high), low }));

/** @param parameters how many there are */
export function compilePrecise(code: Code, ioLength: number, parameters: number): PreciseFunction {
  const lengths = { io: ioLength, parameters };
  const lowered = inDoubleDouble(code, lengths);
  const compiled = compileModule(lowered, one, 2 * ioLength, 2 * parameters + 1, mathematics())!;
  const { run, memory, parametersAt } = compiled;
  return {
    ioLength,
    run(io, values, step, steps) {
      for (let i = 0; i < 2 * ioLength; i++) memory[i] = io[i]!;
      values.forEach(({ high, low }, i) => {
        memory[parametersAt + i] = high;
        memory[parametersAt + parameters + i] = low;
      });
      memory[parametersAt + 2 * parameters] = step.low;
      const taken = run(step.high, Math.min(steps, MOST_STEPS));
      for (let i = 0; i < 2 * ioLength; i++) io[i] = memory[i]!;
      return taken;
    },
  };
}

/** The step loop of a method in double-double: `StepLoop.advance` to 31 digits, `io` with its low parts behind. */
export function compilePreciseLoop(system: CompiledSystem, method: MethodDefinition): PreciseFunction {
  const { code } = writeLoop(system, method, styles.doubleDouble);
  return compilePrecise(code, 2 * system.states.length + 3, system.parameters.length);
}
