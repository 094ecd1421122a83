/**
 * The error left after the last of three successive differences, on the supposition that a lower power is
 * about to take over from the leading one.
 *
 * With D = A + B, where A falls by 2^P a rung and B by x = 2^q, D_k - D_(k-1) / 2^P = B_k (1 - x / 2^P) is free of
 * A, and x is the ratio of two of these. The error of the finest rung is A / (2^P - 1) + B / (x - 1). P is the
 * whole power that the exponents come from: the one above where they fall, the one below where they rise
 * (B has the other sign then).
 *
 * @returns 0 where the differences show no power below P
 */
export function remainderOfTwoPowers(coarse: number, middle: number, fine: number): number {
  const [before, here] = [Math.log2(coarse / middle), Math.log2(middle / fine)];
  const leading = 2 ** (here < before ? Math.ceil(here) : Math.floor(here));
  const rest = fine - middle / leading;
  const ratio = (middle - coarse / leading) / rest;
  if (!(ratio > 1 && ratio < leading)) return 0;
  // No order is below one.
  const falls = Math.max(2, ratio);
  if (falls >= leading) return 0;
  const lower = rest / (1 - falls / leading);
  return (fine - lower) / (leading - 1) + lower / (falls - 1);
}
