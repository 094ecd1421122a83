/**
 * A value with its half-width in the concise notation of the GUM (JCGM 100:2008, 7.2.2): 104.41(2). The
 * half-width is rounded up to one digit, to two where the first is a 1.
 *
 * @example concise(42.98041, 0.0013) // "42.9804(13)"
 */
export function concise(value: number, halfWidth: number): string {
  const exponent = Math.floor(Math.log10(halfWidth));
  const place = halfWidth / 10 ** exponent < 2 ? exponent - 1 : exponent;
  if (place > 0) {
    // Digits before the point that are not known take an exponent.
    const shift = Math.floor(Math.log10(Math.max(Math.abs(value), halfWidth)));
    return `${concise(value / 10 ** shift, halfWidth / 10 ** shift)}e${shift}`;
  }
  // A hair less than a whole number of units is that number, not the next.
  const units = Math.ceil(halfWidth * 10 ** -place - 1e-9);
  return `${value.toFixed(-place)}(${units})`;
}
