import type { ClaimResult } from "../../result/result.js";
import { digitsInWords } from "../terminal.js";
import { clean } from "../text.js";
import { type QuotedDigits, quotedDigits } from "./quoted-digits.js";

/** The claimed figure as the pages show it. */
export interface Quote extends QuotedDigits {
  /** `k of n quoted digits stand`; empty where that cannot be said, and then no digit is told from another. */
  readonly says: string;
}

export function quoteOf(result: ClaimResult): Quote | null {
  const { claimed, digits } = result;
  if (claimed === null) return null;
  const says = digitsInWords(result);
  const standing = says === "" || digits === null ? null : Math.min(digits, claimed.digits);
  return { ...quotedDigits(clean(claimed.text), standing), says };
}
