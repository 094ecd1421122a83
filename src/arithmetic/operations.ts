import type { FunctionName } from "../formula/graph.js";
import type { DoubleDouble } from "./double-double.js";
import * as pairs from "./double-double.js";
import * as elementary from "./elementary.js";

type OperationName = "add" | "subtract" | "multiply" | "divide" | "negate" | "power" | FunctionName;

/** Every operation of a formula on double-double numbers. */
export const operations: Readonly<Record<OperationName, (a: DoubleDouble, b: DoubleDouble) => DoubleDouble>> =
  {
    add: pairs.add,
    subtract: pairs.subtract,
    multiply: pairs.multiply,
    divide: pairs.divide,
    negate: pairs.negate,
    abs: pairs.absolute,
    sqrt: pairs.sqrt,
    power: elementary.power,
    sin: elementary.sin,
    cos: elementary.cos,
    tan: elementary.tan,
    asin: elementary.asin,
    acos: elementary.acos,
    atan: elementary.atan,
    exp: elementary.exp,
    log: elementary.log,
  };
