/** A figure and its margin as an author writes them, and the numbers that the text stands for. */
export interface Quote {
  readonly text: string;
  readonly value: number;
  readonly halfWidth: number;
}

/**
 * Writes a value with a margin of two significant digits, the value to the same place: it is then off by at
 * most a twentieth of the margin.
 */
export function quote(value: number, margin: number, unit: string): Quote {
  const place = Math.floor(Math.log10(margin)) - 1;
  const decimals = Math.max(0, -place);
  const round = (x: number): string =>
    place > 0 ? String(Math.round(x / 10 ** place) * 10 ** place) : x.toFixed(decimals);
  const [written, width] = [round(value), round(margin)];
  return { text: `${written} ± ${width} ${unit}`, value: Number(written), halfWidth: Number(width) };
}

/** Writes so many significant digits: the margin is then half a unit of the last. */
export function quoteDigits(value: number, digits: number, unit: string): Quote {
  const text = value.toExponential(digits - 1);
  const place = Number(text.split("e")[1]) - (digits - 1);
  return { text: `${text} ${unit}`, value: Number(text), halfWidth: 0.5 * 10 ** place };
}
