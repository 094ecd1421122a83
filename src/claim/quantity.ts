import Fraction from "fraction.js";
import { type DoubleDouble, fromFraction } from "../arithmetic/double-double.js";
import { exactDecimal } from "../formula/decimal.js";
import { nearestDouble } from "../formula/nearest-double.js";
import { nearest } from "./nearest.js";
import { echo } from "./problem.js";
import { NO_UNIT, parseUnit, sameDimension, type Unit, unitsCatalog } from "./units.js";

/** A number with its unit, as read. */
export interface Quantity {
  /** In SI: the double nearest to the exact product of number and unit. */
  readonly value: number;
  /** The same to 31 digits. */
  readonly precise: DoubleDouble;
  /** As written, and its size in SI. */
  readonly unit: string;
  readonly unitSize: number;
}

/** What is wrong with a text that should hold a quantity. */
export interface Misreading {
  readonly found: string;
  readonly wanted: string;
}

const NUMBER = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)(?: ?(\p{L}.*)| (1 ?\/.*))?$/u;
/** A quantity is a number and a unit; what is longer is no such thing and need not be looked at. */
const LONGEST = 100;
/** Sizes beyond 10^60 either way are not of any orbit, in any unit; squares and cubes of them are still doubles. */
const LARGEST_EXPONENT = 60;
const LARGEST = new Fraction(10).pow(LARGEST_EXPONENT)!;

/** The text of a quantity, tidied: one space for many, a hyphen for the minus sign; null when far too long. */
export function tidied(input: string): string | null {
  const text = input.trim();
  return text.length > LONGEST ? null : text.replaceAll(/\s+/gu, " ").replaceAll("−", "-");
}

/** A decimal as an exact fraction; null when it is too large or too small to mean anything. */
export function sensibleDecimal(text: string): Fraction | null {
  const exponent = Number(/[eE]([+-]?\d+)$/.exec(text)?.[1] ?? 0);
  if (Math.abs(exponent) > LARGEST_EXPONENT + LONGEST) return null;
  const value = exactDecimal(text);
  const size = value.abs();
  return size.equals(0) || (size.lte(LARGEST) && size.gte(LARGEST.inverse())) ? value : null;
}

/**
 * Reads a quantity such as `0.21 au` or `1.1e20 m^3/s^2`.
 *
 * @param wanted the SI unit whose dimension it must have, `1` for a pure number
 */
export function parseQuantity(input: string | number, wanted: string): Quantity | Misreading {
  const target = wanted === "1" ? NO_UNIT : (parseUnit(wanted) as Unit);
  const example = wanted === "1" ? "a plain number" : `a number with a unit, such as '1 ${wanted}'`;
  const [, number, named, inverse] = NUMBER.exec(tidied(String(input)) ?? "") ?? [];
  const unitText = named ?? inverse ?? "";
  if (number === undefined) return { found: echo(input), wanted: example };
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
  const product = exact.mul(unit.size);
  return {
    value: nearestDouble(product),
    precise: fromFraction(product),
    unit: unitText,
    unitSize: nearestDouble(unit.size),
  };
}

/** Units that can stand in a quantity of the dimension of another. */
function unitsOf({ dimension }: Unit): string[] {
  const kinds = (["length", "time", "angle"] as const).filter((kind) => dimension[kind] !== 0);
  return unitsCatalog
    .filter(({ unit }) => kinds.some((kind) => unit.dimension[kind] !== 0))
    .map(({ name }) => name);
}

export const valuesOf = (quantities: Readonly<Record<string, Quantity>>): Record<string, number> =>
  Object.fromEntries(Object.entries(quantities).map(([name, { value }]) => [name, value]));

export const preciseOf = (quantities: Readonly<Record<string, Quantity>>): Record<string, DoubleDouble> =>
  Object.fromEntries(Object.entries(quantities).map(([name, { precise }]) => [name, precise]));
