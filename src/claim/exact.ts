import type Fraction from "fraction.js";

/** Bits of the quotient before it is rounded to a double's 53. */
const BITS = 80;

/** The double nearest to a fraction, ties to even. */
export function nearestDouble(fraction: Fraction): number {
  const { n, d, s } = fraction;
  if (n === 0n) return 0;
  const shift = BITS - (n.toString(2).length - d.toString(2).length);
  const [top, bottom] = shift >= 0 ? [n << BigInt(shift), d] : [n, d << BigInt(-shift)];
  // A last bit for whatever is left over keeps a near tie from looking like one.
  const quotient = ((top / bottom) << 1n) | (top % bottom === 0n ? 0n : 1n);
  // In two halves, since 2^-shift alone may not be a double.
  const half = -Math.trunc((shift + 1) / 2);
  return Number(s) * Number(quotient) * 2 ** half * 2 ** (-(shift + 1) - half);
}
