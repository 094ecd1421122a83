import type Fraction from "fraction.js";
import { nearestDouble } from "../formula/nearest-double.js";
import type { QuotedUnit } from "./claim.js";
import { echo } from "./problem.js";
import { type Misreading, sensibleDecimal, tidied } from "./quantity.js";
import { parseQuotedUnit } from "./quoted-unit.js";

/** A quoted figure: value and margin in the quoted unit. */
export interface QuotedValue {
  readonly text: string;
  readonly value: number;
  readonly halfWidth: number;
  readonly digits: number;
  readonly unit: QuotedUnit;
}

const DECIMAL = String.raw`(?:\d+\.?\d*|\.\d+)`;
const EXPONENT = String.raw`(?:[eE][+-]?\d+)`;
const VALUE = `(?<mantissa>[+-]?${DECIMAL})`;
/** A unit begins with a letter: digits and marks before it belong to the number, or are wrong. */
const UNIT = String.raw`\s*(?<unit>\p{L}.*)`;
const WITH_MARGIN = String.raw`${VALUE}(?<exponent>${EXPONENT}?) ?(?:±|\+/-|\+-) ?(?<margin>${DECIMAL}${EXPONENT}?)`;

/** The ways to write a figure with its margin; the first three after the GUM (JCGM 100:2008, 7.2.2). */
const FORMS = [
  // 100.02147(35)
  { kind: "last-digits", form: String.raw`${VALUE} ?\((?<margin>\d+)\)(?<exponent>${EXPONENT}?)` },
  // 100.02147(0.00035)
  { kind: "same-decade", form: String.raw`${VALUE} ?\((?<margin>\d*\.\d+)\)(?<exponent>${EXPONENT}?)` },
  // (100.02147 ± 0.00035)
  { kind: "margin", form: String.raw`\( ?${WITH_MARGIN} ?\)` },
  { kind: "margin", form: WITH_MARGIN },
  { kind: "bare", form: `${VALUE}(?<exponent>${EXPONENT}?)` },
].map(({ kind, form }) => ({ kind, pattern: new RegExp(`^${form}${UNIT}$`, "u") }));

const WANTED = "a figure with its unit, such as '104.41(2) arcsec/century'";

/**
 * Reads a quoted figure. In concise notation, 104.41(2), the 2 counts units of the last digit. Bare digits
 * mean half a unit of the last one; the last digit of a bare integer is its units digit, in exponent notation
 * the last of the mantissa.
 */
export function parseClaimedValue(input: string): QuotedValue | Misreading {
  const text = tidied(input) ?? "";
  for (const { kind, pattern } of FORMS) {
    const { mantissa, exponent = "", margin = "", unit } = pattern.exec(text)?.groups ?? {};
    if (mantissa === undefined || unit === undefined) continue;
    const quoted = parseQuotedUnit(unit);
    if ("found" in quoted) return quoted;
    const value = sensibleDecimal(mantissa + exponent);
    const halfWidth = marginOf(kind, mantissa, exponent, margin);
    if (value === null || halfWidth === null) {
      return { found: echo(input), wanted: "a figure of a size between 1e-60 and 1e60" };
    }
    if (halfWidth.equals(0)) {
      return { found: `${echo(input)}, with a margin of zero`, wanted: "a margin larger than zero" };
    }
    return {
      text: input.trim().replaceAll(/\s+/gu, " "),
      value: nearestDouble(value),
      halfWidth: nearestDouble(halfWidth),
      digits: significantDigits(mantissa),
      unit: quoted,
    };
  }
  return { found: echo(input), wanted: WANTED };
}

/** The margin in the quoted unit; null when it is too large or too small to mean anything. */
function marginOf(kind: string, mantissa: string, exponent: string, margin: string): Fraction | null {
  if (kind === "margin") return sensibleDecimal(margin);
  if (kind === "same-decade") return sensibleDecimal(margin + exponent);
  const power = Number(exponent.slice(1) || 0) - decimals(mantissa);
  return kind === "bare" ? sensibleDecimal(`5e${power - 1}`) : sensibleDecimal(`${margin}e${power}`);
}

const decimals = (mantissa: string): number => mantissa.split(".")[1]?.length ?? 0;

/** Digits from the first that is not zero on; of a zero, those after the point and at least one. */
function significantDigits(mantissa: string): number {
  const digits = mantissa.replaceAll(/\D/g, "");
  return digits.replace(/^0+/, "").length || Math.max(1, decimals(mantissa));
}
