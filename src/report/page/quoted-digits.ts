/** The claimed figure as written, cut where its digits stop standing. */
export interface QuotedDigits {
  readonly standing: string;
  readonly fallen: string;
  /** Exponent, margin and unit: what follows the digits. */
  readonly rest: string;
}

/** @param digits how many significant digits stand; null leaves the question open */
export function quotedDigits(text: string, digits: number | null): QuotedDigits {
  const [, mantissa = text] = /^([+\-−]?[\d.]+)/.exec(text) ?? [];
  const rest = text.slice(mantissa.length);
  if (digits === null) return { standing: mantissa, fallen: "", rest };
  let seen = 0;
  let end = 0;
  let started = false;
  for (const character of mantissa) {
    if (/[1-9]/.test(character)) started = true;
    if (started && /\d/.test(character)) {
      if (seen === digits) break;
      seen++;
    }
    end++;
  }
  // A point belongs to the digit after it.
  const cut = mantissa[end - 1] === "." ? end - 1 : end;
  return { standing: mantissa.slice(0, cut), fallen: mantissa.slice(cut), rest };
}
