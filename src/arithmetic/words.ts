import Fraction from "fraction.js";
import { nearestDouble } from "../formula/nearest-double.js";

/** To 100 digits: Abramowitz and Stegun, Handbook of Mathematical Functions (1964), table 1.1, gives the first 25. */
export const PI = new Fraction(
  "3.141592653589793238462643383279502884197169399375105820974944592307816406286208998628034825342117068",
);
export const LN2 = new Fraction(
  "0.693147180559945309417232121458176568075500134360255254120680009493393621969694715605863326996418687",
);

/** A double as the fraction that it is; the library's own reading of a number looks for a simple one nearby. */
function fractionOf(value: number): Fraction {
  let scaled = value;
  let halvings = 0;
  // A double is a whole number of at most 53 bits times a power of two.
  while (!Number.isInteger(scaled)) {
    scaled *= 2;
    halvings++;
  }
  return new Fraction(BigInt(scaled), 1n << BigInt(halvings));
}

/** A fraction as a sum of doubles, each the nearest to what the ones before leave. */
export function wordsOf(value: Fraction, count: number): number[] {
  const words: number[] = [];
  let rest = value;
  for (let i = 0; i < count; i++) {
    const word = nearestDouble(rest);
    words.push(word);
    rest = rest.sub(fractionOf(word));
  }
  return words;
}
