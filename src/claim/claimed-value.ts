import Fraction from "fraction.js";
import { nearestDouble } from "../formula/nearest-double.js";
import type { QuotedUnit } from "./claim.js";
import { nearest } from "./nearest.js";
import { echo } from "./problem.js";
import { type Misreading, sensibleDecimal } from "./quantity.js";
import { namedUnit, unitsCatalog } from "./units.js";

/** A quoted figure: value and margin in the quoted unit. */
export interface QuotedValue {
  readonly text: string;
  readonly value: number;
  readonly halfWidth: number;
  readonly digits: number;
  readonly unit: QuotedUnit;
}

const DECIMAL = String.raw`\d+\.?\d*|\.\d+`;
const EXPONENT = String.raw`[eE][+-]?\d+`;
const CONCISE = new RegExp(String.raw`^([+\-−]?(?:${DECIMAL}))\((\d+)\)(${EXPONENT})?\s+(\S.*)$`, "u");
const PLUS_MINUS = new RegExp(
  String.raw`^([+\-−]?(?:${DECIMAL}))(${EXPONENT})?\s*(?:±|\+/-|\+-)\s*((?:${DECIMAL})(?:${EXPONENT})?)\s+(\S.*)$`,
  "u",
);
const BARE = new RegExp(String.raw`^([+\-−]?(?:${DECIMAL}))(${EXPONENT})?\s+(\S.*)$`, "u");

const WANTED = "a figure with its unit, such as '104.41(2) arcsec/century'";

/**
 * Reads a quoted figure. Concise notation after the GUM (JCGM 100:2008, 7.2.2): in 104.41(2) the 2 counts
 * units of the last digit. Bare digits mean half a unit of the last one; the last digit of a bare integer is
 * its units digit, in exponent notation the last of the mantissa.
 */
export function parseClaimedValue(input: unknown): QuotedValue | Misreading {
  if (typeof input !== "string") {
    return typeof input === "number"
      ? { found: `${echo(input)} without a unit`, wanted: `its unit too, such as '${input} arcsec/century'` }
      : { found: echo(input), wanted: WANTED };
  }
  const text = input.trim().replaceAll(/\s+/g, " ");
  const concise = CONCISE.exec(text);
  const plusMinus = PLUS_MINUS.exec(text);
  const bare = BARE.exec(text);
  const [mantissa, exponent, unitText] = concise
    ? [concise[1]!, concise[3] ?? "", concise[4]!]
    : plusMinus
      ? [plusMinus[1]!, plusMinus[2] ?? "", plusMinus[4]!]
      : bare
        ? [bare[1]!, bare[2] ?? "", bare[3]!]
        : [null, "", ""];
  if (mantissa === null) return { found: echo(input), wanted: WANTED };
  const unit = parseQuotedUnit(unitText);
  if ("found" in unit) return unit;

  const value = sensibleDecimal(mantissa + exponent);
  const lastDigit = sensibleDecimal(`1e${-decimals(mantissa)}`)?.mul(
    sensibleDecimal(`1${exponent || "e0"}`) ?? 0,
  );
  const halfWidth = concise
    ? lastDigit?.mul(concise[2]!)
    : plusMinus
      ? sensibleDecimal(plusMinus[3]!)
      : lastDigit?.div(2);
  if (value === null || halfWidth === undefined || halfWidth === null || lastDigit?.equals(0)) {
    return { found: echo(input), wanted: "a figure of a sensible size" };
  }
  if (halfWidth.compare(0) <= 0) {
    return { found: `${echo(input)}, with a margin of zero`, wanted: "a margin larger than zero" };
  }
  return {
    text,
    value: nearestDouble(value),
    halfWidth: nearestDouble(new Fraction(halfWidth)),
    digits: significantDigits(mantissa),
    unit,
  };
}

const decimals = (mantissa: string): number => mantissa.split(".")[1]?.length ?? 0;

/** Digits from the first that is not zero on; of a zero, those after the point and one before. */
function significantDigits(mantissa: string): number {
  const digits = mantissa.replaceAll(/\D/g, "");
  return digits.replace(/^0+/, "").length || Math.max(1, decimals(mantissa));
}

const ANGLES = unitsCatalog.filter(({ unit }) => unit.dimension.angle === 1).map(({ name }) => name);
const TIMES = unitsCatalog.filter(({ unit }) => unit.dimension.time === 1).map(({ name }) => name);

/** `arcsec/century`, `arcmin/orbit`, also with spaces or "per". */
function parseQuotedUnit(text: string): QuotedUnit | Misreading {
  const [, angle, per] = /^(\S+?)\s*(?:\/|\bper\b)\s*(\S+)$/u.exec(text) ?? [];
  if (angle === undefined || per === undefined) {
    return {
      found: `the unit ${echo(text)}`,
      wanted: "an angle per orbit, d, yr or century, such as 'arcsec/century'",
    };
  }
  const angleUnit = namedUnit(angle);
  if (angleUnit === undefined || angleUnit.dimension.angle !== 1) {
    return { found: `the unit ${echo(angle)}`, wanted: suggestion(angle, ANGLES, "an angle") };
  }
  const perUnit = per === "orbit" ? null : namedUnit(per);
  if (perUnit === undefined || (perUnit !== null && perUnit.dimension.time !== 1)) {
    return { found: `per ${echo(per)}`, wanted: suggestion(per, ["orbit", ...TIMES], "a time or orbit") };
  }
  return {
    text: `${angle}/${per}`,
    angle,
    radians: nearestDouble(angleUnit.size) * Math.PI ** angleUnit.pi,
    per: perUnit === null ? "orbit" : nearestDouble(perUnit.size),
  };
}

function suggestion(name: string, known: readonly string[], what: string): string {
  const near = nearest(name, known);
  return near === null ? `${what}: ${known.join(", ")}` : `'${near}'?`;
}
