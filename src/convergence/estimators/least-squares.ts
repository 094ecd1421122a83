import type { Estimator } from "./estimator.js";
import { type Fit, fitFreePower, fitPower, fitTwoPowers } from "./power-fits.js";

/** The fewest grids that the procedure admits. Its own examples span a factor of 2 to 4 in h, and these 8. */
const RUNGS = 4;
/** Where an apparent order counts as one of a second-order method. */
const LOWEST_ORDER = 0.5;
const HIGHEST_ORDER = 2;
/** Up to here the safety factor is that of a reliable estimate. */
const RELIABLE_ORDER = 2.1;
const SAFETY = 1.25;
const SAFETY_UNRELIABLE = 3;

/**
 * The least-squares procedure for nominally second-order methods, carried out in the variable
 * H = h^(q/2), in which a method of order q is of second order.
 *
 * Fits φ = φ0 + C H^p, with equal weights and with weights 1/H, and takes the fit of the smaller deviation.
 * An order above 2 is replaced by the better of C H and C H²; one below 0.5 by the best of these and
 * C1 H + C2 H². With the data range Δ = (φmax - φmin) / (n - 1) and the deviation σ of the fit,
 * U = Fs |ε| + σ + |φ1 - φfit| where σ < Δ, and 3 σ/Δ (|ε| + σ + |φ1 - φfit|) elsewhere;
 * Fs = 1.25 for 0.5 <= p < 2.1, else 3. The degrees of freedom n - 3 (n - 2 of a single term) of σ and the
 * choice for p > 2 are from memory.
 */
export const leastSquares: Estimator = {
  name: "least-squares",
  source: "L. Eça and M. Hoekstra, J. Comput. Phys. 262, 104 (2014)",
  estimate(points, { order }) {
    const used = points.slice(-RUNGS);
    const values = used.map(({ value }) => value).filter((value) => value !== null);
    if (values.length < RUNGS) return null;
    const sizes = used.map((_, k) => 2 ** ((order / 2) * (used.length - 1 - k)));
    const range = (Math.max(...values) - Math.min(...values)) / (values.length - 1);
    const finest = used.at(-1)!;
    if (!(range > 0)) return null;
    const fit = bestFit(sizes, values);
    const off = fit.deviation + Math.abs(finest.value! - fit.figure);
    const reliable = fit.deviation < range;
    const safety =
      reliable && fit.order >= LOWEST_ORDER && fit.order < RELIABLE_ORDER ? SAFETY : SAFETY_UNRELIABLE;
    const uncertainty = reliable
      ? safety * Math.abs(fit.error) + off
      : ((3 * fit.deviation) / range) * (Math.abs(fit.error) + off);
    return { value: finest.value!, halfWidth: Math.hypot(uncertainty, finest.floor) };
  },
};

function bestFit(sizes: readonly number[], values: readonly number[]): Fit {
  const weightings = [sizes.map(() => 1), sizes.map((size) => 1 / size)];
  const free = tightest(weightings.map((weights) => fitFreePower(sizes, values, weights)));
  if (free.order >= LOWEST_ORDER && free.order <= HIGHEST_ORDER) return free;
  const fixed = weightings.flatMap((weights) => [
    fitPower(sizes, values, weights, 1),
    fitPower(sizes, values, weights, 2),
    ...(free.order < LOWEST_ORDER ? [fitTwoPowers(sizes, values, weights)] : []),
  ]);
  return tightest(fixed);
}

const tightest = (fits: readonly Fit[]): Fit => fits.reduce((a, b) => (b.deviation < a.deviation ? b : a));
