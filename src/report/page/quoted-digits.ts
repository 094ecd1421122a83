import type { ClaimResult } from "../../result/result.js";
import { digitsInWords } from "../terminal.js";

/** The claimed figure as written, cut after the last digit that stands. */
export interface QuotedDigits {
  /** Up to and with the last digit that stands; the sign and leading zeros go with it. */
  readonly standing: string;
  /** The quoted digits that do not stand. */
  readonly fallen: string;
  /** Margin, exponent and unit. */
  readonly rest: string;
  /** `k of n quoted digits stand`; empty where that cannot be said, and then nothing is cut. */
  readonly says: string;
}

/** Null when there is no claimed figure. */
export function quotedDigits(result: ClaimResult): QuotedDigits | null {
  const { claimed, digits } = result;
  if (claimed === null) return null;
  const says = digitsInWords(result);
  const number = /^\s*[-+−]?[\d.]*\d\.?/.exec(claimed.text)?.[0] ?? "";
  const rest = claimed.text.slice(number.length);
  if (says === "" || digits === null) return { standing: number, fallen: "", rest, says };
  const cut = endOfDigit(number, Math.min(digits, claimed.digits));
  return { standing: number.slice(0, cut), fallen: number.slice(cut), rest, says };
}

/** Where the k-th significant digit ends; 0 for none. */
function endOfDigit(number: string, k: number): number {
  if (k === 0) return 0;
  const first = number.search(/[1-9]/);
  let seen = 0;
  for (let at = Math.max(0, first); at < number.length; at++) {
    if (number[at] !== "." && ++seen === k) return at + 1;
  }
  return number.length;
}
