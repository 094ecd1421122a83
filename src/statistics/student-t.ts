/**
 * Probability that |t| stays within `t` for Student's distribution of `degrees` (a whole number, 1 or more).
 * Finite series of Abramowitz and Stegun, Handbook of Mathematical Functions (1964), 26.7.3 and 26.7.4.
 */
function studentTWithin(t: number, degrees: number): number {
  const theta = Math.atan(t / Math.sqrt(degrees));
  const cosine = Math.cos(theta);
  let term = degrees % 2 === 0 ? 1 : cosine;
  let sum = degrees === 1 ? 0 : term;
  for (let k = degrees % 2 === 0 ? 2 : 3; k <= degrees - 2; k += 2) {
    term *= ((k - 1) / k) * cosine * cosine;
    sum += term;
  }
  return degrees % 2 === 0 ? Math.sin(theta) * sum : (2 / Math.PI) * (theta + Math.sin(theta) * sum);
}

/** Beyond this many degrees of freedom the factor differs from the normal one by less than 0.3 %. */
const NEARLY_NORMAL = 1000;
const NORMAL_95 = 1.959963984540054;

/**
 * Factor k such that a 95 % interval is value ± k · standard error.
 *
 * @example studentT95(10) // 2.228
 */
export function studentT95(degrees: number): number {
  if (!(degrees >= 1))
    throw new RangeError(`Student's t needs at least one degree of freedom, not ${degrees}`);
  if (degrees > NEARLY_NORMAL) return NORMAL_95;
  let low = 0;
  let high = 64;
  for (;;) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) return high;
    if (studentTWithin(middle, Math.floor(degrees)) < 0.95) low = middle;
    else high = middle;
  }
}
