import { mean } from "simple-statistics";

/** A straight line fitted by least squares: y = intercept + slope · x. */
export interface Line {
  readonly slope: number;
  readonly intercept: number;
  /** Standard error of the slope; null for a fit of two points, which leaves no degree of freedom. */
  readonly slopeError: number | null;
  readonly degrees: number;
}

/**
 * Weighted least-squares line through at least two points with different abscissae.
 * Both coordinates are centred first: uncentred sums lose the slope at large abscissae.
 *
 * @param weights relative weights (1/variance); equal when left out
 * @returns null when fewer than two points or all abscissae are equal
 *
 * @example fitLine([0, 1, 2], [1, 3, 5]) // slope 2, intercept 1
 */
export function fitLine(
  x: readonly number[],
  y: readonly number[],
  weights: readonly number[] = x.map(() => 1),
): Line | null {
  if (x.length < 2) return null;
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const centre = (values: readonly number[]): number => {
    // A plain mean first keeps the weighted one clear of cancellation.
    const plain = mean(values as number[]);
    return plain + values.reduce((sum, value, i) => sum + (weights[i]! / total) * (value - plain), 0);
  };
  const xCentre = centre(x);
  const yCentre = centre(y);
  let sxx = 0;
  let sxy = 0;
  for (let i = 0; i < x.length; i++) {
    const dx = x[i]! - xCentre;
    sxx += weights[i]! * dx * dx;
    sxy += weights[i]! * dx * (y[i]! - yCentre);
  }
  if (!(sxx > 0)) return null;
  const slope = sxy / sxx;
  const degrees = x.length - 2;
  let residual = 0;
  for (let i = 0; i < x.length; i++) {
    const off = y[i]! - yCentre - slope * (x[i]! - xCentre);
    residual += weights[i]! * off * off;
  }
  return {
    slope,
    intercept: yCentre - slope * xCentre,
    slopeError: degrees > 0 ? Math.sqrt(residual / degrees / sxx) : null,
    degrees,
  };
}
