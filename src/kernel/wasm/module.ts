import type { Code, Operation } from "../code.js";
import { section, sized, text, unsigned, vector } from "./bytes.js";
import { encodeFunction } from "./function.js";
import { type Instructions, integer, one } from "./instructions.js";

/** A compiled function with the memory that it works on. */
export interface Compiled {
  run(step: number, steps: number): number;
  /** `io`, then the parameters; of two runs side by side their elements in turn. */
  readonly memory: Float64Array;
  /** Where the parameters begin in the memory, in elements. */
  readonly parametersAt: number;
}

const MAGIC = [0x00, 0x61, 0x73, 0x6d, 0x01, 0x00, 0x00, 0x00];
const PAGE = 65_536;
const RUN = 0;
/** Functions of the mathematical library, of one double and of two. */
const OF_ONE = 1;
const OF_TWO = 2;
const functionType = (takes: readonly number[], gives: number): number[] => [
  0x60,
  ...vector(takes.map((type) => [type])),
  1,
  gives,
];

/**
 * Compiles code of a function of `$step` and `#steps`.
 *
 * Whether the machine does it at once or bit by bit, every operation is the one of the code, rounded once:
 * WebAssembly leaves no other choice.
 *
 * @param ioLength elements of `io`
 * @param parameters how many there are
 * @returns null where the machine has no such instructions
 */
export function compileModule(
  code: Code,
  set: Instructions,
  ioLength: number,
  parameters: number,
): Compiled | null {
  const parametersAt = ioLength * set.lanes;
  const bytes = encodeModule(code, set, parametersAt, parameters);
  if (set !== one && !WebAssembly.validate(bytes)) return null;
  const { exports } = new WebAssembly.Instance(new WebAssembly.Module(bytes), { math: mathematics });
  return {
    run: exports.run as Compiled["run"],
    memory: new Float64Array((exports.memory as WebAssembly.Memory).buffer),
    parametersAt,
  };
}

const mathematics: Readonly<Partial<Record<Operation["op"], unknown>>> = {
  power: Math.pow,
  sin: Math.sin,
  cos: Math.cos,
  tan: Math.tan,
  asin: Math.asin,
  acos: Math.acos,
  atan: Math.atan,
  exp: Math.exp,
  log: Math.log,
};

function encodeModule(code: Code, set: Instructions, parametersAt: number, parameters: number): Uint8Array {
  const { bytes, imports } = encodeFunction(code, set, parametersAt * 8);
  const double = one.valueType;
  const pages = Math.ceil(((parametersAt + parameters * set.lanes) * 8) / PAGE);
  return Uint8Array.from([
    ...MAGIC,
    ...section(
      1,
      vector([
        functionType([double, integer.valueType], integer.valueType),
        functionType([double], double),
        functionType([double, double], double),
      ]),
    ),
    ...section(
      2,
      vector(imports.map((name) => [...text("math"), ...text(name), 0, name === "power" ? OF_TWO : OF_ONE])),
    ),
    ...section(3, vector([[RUN]])),
    ...section(5, vector([[0, ...unsigned(pages)]])),
    ...section(
      7,
      vector([
        [...text("memory"), 2, 0],
        [...text("run"), 0, ...unsigned(imports.length)],
      ]),
    ),
    ...section(10, vector([sized(bytes)])),
  ]);
}
