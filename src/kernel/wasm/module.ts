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
/** Most doubles that a function of the mathematical library takes. */
const MOST_TAKEN = 4;
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
  mathematics: Mathematics = ofDoubles,
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

/** Functions that the processor lacks. */
export type Mathematics = Readonly<Partial<Record<Operation["op"], (...args: number[]) => number>>>;

const ofDoubles: Mathematics = {
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
        ...Array.from({ length: MOST_TAKEN + 1 }, (_, takes) =>
          functionType(Array<number>(takes).fill(double), double),
        ),
      ]),
    ),
    ...section(2, vector(imports.map(({ op, takes }) => [...text("math"), ...text(op), 0, RUN + 1 + takes]))),
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
