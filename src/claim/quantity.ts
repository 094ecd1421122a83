import type Fraction from "fraction.js";
import { exactDecimal } from "../formula/decimal.js";
import { nearestDouble } from "../formula/nearest-double.js";
import { nearest } from "./nearest.js";
import { echo } from "./problem.js";
import { NO_UNIT, parseUnit, sameDimension, type Unit, unitsCatalog } from "./units.js";

/** A number with its unit, as read. */
export interface Quantity {
  /** In SI: the double nearest to the exact product, where no π is in it. */
  readonly value: number;
  /** As written, and its size in SI. */
  readonly unit: string;
  readonly unitSize: number;
}

/** What is wrong with a text that should hold a quantity. */
export interface Misreading {
  readonly found: string;
  readonly wanted: string;
}

const NUMBER = /^\s*([+\-−]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)\s*(.*?)\s*$/su;
/** Decimal exponents beyond this are not quantities of any orbit; a double ends at 308. */
const LARGEST_EXPONENT = 60;

/** A decimal as an exact fraction; null when it is too large or too small to mean anything. */
export function sensibleDecimal(text: string): Fraction | null {
  const plain = text.replace("−", "-");
  const exponent = Number(/[eE]([+-]?\d+)$/.exec(plain)?.[1] ?? 0);
  if (Math.abs(exponent) > LARGEST_EXPONENT || plain.length > 100) return null;
  return exactDecimal(plain);
}

/**
 * Reads a quantity such as `0.21 au` or `1.1e20 m^3/s^2`.
 *
 * @param wanted the SI unit whose dimension it must have, `1` for a pure number
 */
export function parseQuantity(input: unknown, wanted: string): Quantity | Misreading {
  const target = wanted === "1" ? NO_UNIT : (parseUnit(wanted) as Unit);
  const example = wanted === "1" ? "a plain number" : `a number with a unit, such as '1 ${wanted}'`;
  if (typeof input !== "string" && typeof input !== "number") return { found: echo(input), wanted: example };
  const [, number, unitText] = NUMBER.exec(String(input)) ?? [];
  if (number === undefined || unitText === undefined) return { found: echo(input), wanted: example };
  const unit = unitText === "" ? NO_UNIT : parseUnit(unitText);
  if ("unknown" in unit) {
    const near = nearest(unit.unknown, unitsOf(target));
    return {
      found: `the unit ${echo(unit.unknown)}`,
      wanted: near === null ? `a unit of ${wanted}` : `'${near}'?`,
    };
  }
  if (!sameDimension(unit.dimension, target.dimension)) {
    return unitText === ""
      ? {
          found: `${echo(input)} without a unit`,
          wanted: `a unit of ${wanted}, such as '${number} ${wanted}'`,
        }
      : {
          found: `the unit ${echo(unitText)}`,
          wanted: wanted === "1" ? "no unit: a pure number" : `a unit of ${wanted}`,
        };
  }
  const exact = sensibleDecimal(number);
  if (exact === null)
    return { found: echo(input), wanted: `a size between 1e-${LARGEST_EXPONENT} and 1e${LARGEST_EXPONENT}` };
  const pi = Math.PI ** unit.pi;
  return {
    value: nearestDouble(exact.mul(unit.size)) * pi,
    unit: unitText,
    unitSize: nearestDouble(unit.size) * pi,
  };
}

/** Units that can stand in a quantity of the dimension of another. */
function unitsOf({ dimension }: Unit): string[] {
  const kinds = (["length", "time", "angle"] as const).filter((kind) => dimension[kind] !== 0);
  return unitsCatalog
    .filter(({ unit }) => kinds.some((kind) => unit.dimension[kind] !== 0))
    .map(({ name }) => name);
}
