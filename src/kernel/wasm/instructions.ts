import type { Comparison, Operation } from "../code.js";
import { double, signed, unsigned } from "./bytes.js";

/**
 * Instructions on doubles, one at a time or two side by side. Both are IEEE 754 operations rounded once, the
 * same in every lane (WebAssembly Core Specification 2.0, W3C, 4.3.3; opcodes in 5.4.7 and 5.4.8).
 */
export interface Instructions {
  readonly lanes: 1 | 2;
  readonly valueType: number;
  /** Bytes that a value takes in memory. */
  readonly size: number;
  readonly operations: Readonly<Partial<Record<Operation["op"], readonly number[]>>>;
  readonly comparisons: Readonly<Record<Comparison["compare"], readonly number[]>>;
  readonly both: readonly number[];
  readonly either: readonly number[];
  constant(value: number): number[];
  /** From the address on the stack plus an offset in bytes. */
  load(offset: number): number[];
  store(offset: number): number[];
}

/** Of counters. */
export const integer: Instructions = {
  lanes: 1,
  valueType: 0x7f,
  size: 4,
  operations: { add: [0x6a] },
  comparisons: { "==": [0x46], "!=": [0x47], "<": [0x48], "<=": [0x4c], ">=": [0x4e] },
  both: [0x71],
  either: [0x72],
  constant: (value) => [0x41, ...signed(value)],
  load: () => [],
  store: () => [],
};

export const one: Instructions = {
  lanes: 1,
  valueType: 0x7c,
  size: 8,
  operations: {
    abs: [0x99],
    negate: [0x9a],
    sqrt: [0x9f],
    add: [0xa0],
    subtract: [0xa1],
    multiply: [0xa2],
    divide: [0xa3],
  },
  comparisons: { "==": [0x61], "!=": [0x62], "<": [0x63], "<=": [0x65], ">=": [0x66] },
  both: [0x71],
  either: [0x72],
  constant: (value) => [0x44, ...double(value)],
  load: (offset) => [0x2b, 3, ...unsigned(offset)],
  store: (offset) => [0x39, 3, ...unsigned(offset)],
};

const wide = (code: number): number[] => [0xfd, ...unsigned(code)];

export const two: Instructions = {
  lanes: 2,
  valueType: 0x7b,
  size: 16,
  operations: {
    abs: wide(0xec),
    negate: wide(0xed),
    sqrt: wide(0xef),
    add: wide(0xf0),
    subtract: wide(0xf1),
    multiply: wide(0xf2),
    divide: wide(0xf3),
  },
  comparisons: {
    "==": wide(0x47),
    "!=": wide(0x48),
    "<": wide(0x49),
    "<=": wide(0x4b),
    ">=": wide(0x4c),
  },
  both: wide(0x4e),
  either: wide(0x50),
  constant: (value) => [...wide(0x0c), ...double(value), ...double(value)],
  load: (offset) => [...wide(0x00), 4, ...unsigned(offset)],
  store: (offset) => [...wide(0x0b), 4, ...unsigned(offset)],
};

/** A counter as a double. */
export const fromInteger = [0xb7];
/** A double into both lanes; of two lanes that hold truths, whether either does. */
export const splat = wide(0x14);
export const anyTrue = wide(0x53);
export const extractLane = (lane: number): number[] => [...wide(0x21), lane];
export const replaceLane = (lane: number): number[] => [...wide(0x22), lane];

export const control = {
  unreachable: [0x00],
  block: [0x02, 0x40],
  loop: [0x03, 0x40],
  if: [0x04, 0x40],
  end: [0x0b],
  return: [0x0f],
  branch: (depth: number): number[] => [0x0c, ...unsigned(depth)],
  call: (index: number): number[] => [0x10, ...unsigned(index)],
  get: (local: number): number[] => [0x20, ...unsigned(local)],
  set: (local: number): number[] => [0x21, ...unsigned(local)],
  /** The address 0, to which all offsets are added. */
  base: [0x41, 0x00],
} as const;
