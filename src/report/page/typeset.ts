const SUPERSCRIPTS: Readonly<Record<string, string>> = {
  "-": "⁻",
  0: "⁰",
  1: "¹",
  2: "²",
  3: "³",
  4: "⁴",
  5: "⁵",
  6: "⁶",
  7: "⁷",
  8: "⁸",
  9: "⁹",
};

/** A whole number as an exponent. */
export const superscript = (exponent: number): string =>
  [...String(exponent)].map((character) => SUPERSCRIPTS[character]).join("");

/**
 * A sentence of ours with its numbers set as on paper: `1.15e-8` as 1.15 × 10⁻⁸, `c^2` as c², a minus sign for a hyphen
 * before a digit, no break between a number and its sign. Not for what the claim says in its own words.
 */
export function typeset(sentence: string): string {
  return sentence
    .replaceAll(
      /(?<![\w.])(-?\d+(?:\.\d+)?)e([+-]?\d+)(?!\w)/g,
      (_, mantissa: string, exponent: string) => `${mantissa}\u00a0×\u00a010${superscript(Number(exponent))}`,
    )
    .replaceAll(/\^(-?\d+)/g, (_, exponent: string) => superscript(Number(exponent)))
    .replaceAll(/(?<![\w.)-])-(?=\d)/g, "−")
    .replaceAll(/(?<=\d) (?=%)|(?<=±) (?=\d)/g, "\u00a0");
}

/** A power of ten on an axis: 10⁻³; the plain number where that is as short. */
export function powerOfTen(value: number): string {
  const exponent = Math.round(Math.log10(Math.abs(value)));
  const sign = value < 0 ? "−" : "";
  if (exponent >= 0 && exponent <= 3) return sign + String(10 ** exponent);
  return `${sign}10${superscript(exponent)}`;
}
