/** No double carries more. */
const MOST = 17;

/**
 * Significant digits that stand: the largest k for which half a unit of the k-th digit of the best value is
 * at least the numerical error E and at least the distance of the claim. 0 when not even the first does;
 * null when the best value is 0, which has no first digit.
 */
export function standingDigits(best: number, error: number, distance: number): number | null {
  if (best === 0) return null;
  const worst = Math.max(error, distance);
  const first = Math.floor(Math.log10(Math.abs(best)));
  let digits = 0;
  while (digits < MOST && 0.5 * 10 ** (first - digits) >= worst) digits++;
  return digits;
}
