import Fraction from "fraction.js";

/**
 * A decimal as an exact fraction.
 *
 * @param text digits with an optional sign, point and exponent, such as "-1.1e20"
 */
export function exactDecimal(text: string): Fraction {
  const [mantissa, exponent] = text.toLowerCase().split("e") as [string, string?];
  return new Fraction(mantissa).mul(new Fraction(10).pow(Number(exponent ?? 0))!);
}
