import type Fraction from "fraction.js";

/** A double's significand, and the exponent of its smallest bit. */
const SIGNIFICAND_BITS = 53;
const SMALLEST_EXPONENT = -1074;

/** The double nearest to a fraction, ties to even; beyond the doubles ±Infinity. */
export function nearestDouble({ n, d, s }: Fraction): number {
  if (n === 0n) return 0;
  // The exponent of the last bit that the double can hold, or one less: a bit too many rounds all the same
  // since the remainder below goes in as one more bit.
  const exponent = Math.max(bits(n) - bits(d) - SIGNIFICAND_BITS - 1, SMALLEST_EXPONENT - 2);
  const shift = BigInt(Math.abs(exponent));
  const [top, bottom] = exponent < 0 ? [n << shift, d] : [n, d << shift];
  const scaled = ((top / bottom) << 1n) | (top % bottom === 0n ? 0n : 1n);
  const last = exponent - 1;
  const drop = Math.max(bits(scaled) - SIGNIFICAND_BITS, SMALLEST_EXPONENT - last, 0);
  const significand = halfToEven(scaled, BigInt(drop));
  // In two exact factors: 2^-1074 times 2^53 is a double where 2^1023 times 2^53 is not.
  const power = last + drop;
  const half = Math.trunc(power / 2);
  return Number(s) * Number(significand) * 2 ** half * 2 ** (power - half);
}

/** value / 2^drop to the nearest integer. */
function halfToEven(value: bigint, drop: bigint): bigint {
  const whole = value >> drop;
  const twice = (value - (whole << drop)) << 1n;
  const one = 1n << drop;
  return twice > one || (twice === one && whole % 2n === 1n) ? whole + 1n : whole;
}

/** Number of binary digits of a positive integer. */
export function bits(value: bigint): number {
  const hex = value.toString(16);
  return 4 * (hex.length - 1) + (32 - Math.clz32(Number.parseInt(hex[0]!, 16)));
}
