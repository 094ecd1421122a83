import { fitLine } from "../../statistics/line.js";
import type { Estimator } from "./estimator.js";

/** The fewest grids that the procedure admits. Its own examples span a factor of 2 to 4 in h, and these 8. */
const RUNGS = 4;
/** Where an apparent order counts as one of a second-order method. */
const LOWEST_ORDER = 0.5;
const HIGHEST_ORDER = 2;
/** Up to here the safety factor is that of a reliable estimate. */
const RELIABLE_ORDER = 2.1;
const SAFETY = 1.25;
const SAFETY_UNRELIABLE = 3;

interface Fit {
  readonly order: number;
  /** The fitted error and the fitted figure of the finest grid. */
  readonly error: number;
  readonly figure: number;
  /** Standard deviation of the fit. */
  readonly deviation: number;
}

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

function deviationOf(residuals: readonly number[], weights: readonly number[], parameters: number): number {
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  // Weights add up to one, times the number of grids.
  const sum = residuals.reduce((s, r, i) => s + (weights[i]! / total) * residuals.length * r * r, 0);
  return Math.sqrt(sum / (residuals.length - parameters));
}

/** φ0 + C H^p at a given p. */
function fitPower(
  sizes: readonly number[],
  values: readonly number[],
  weights: readonly number[],
  order: number,
  parameters = 2,
): Fit {
  const powers = sizes.map((size) => size ** order);
  const { intercept, slope } = fitLine(powers, values, weights)!;
  const residuals = values.map((value, i) => value - intercept - slope * powers[i]!);
  const error = slope * powers.at(-1)!;
  return { order, error, figure: intercept + error, deviation: deviationOf(residuals, weights, parameters) };
}

/** φ0 + C H^p with p free: the smallest deviation over p, on a grid and then by golden section. */
function fitFreePower(sizes: readonly number[], values: readonly number[], weights: readonly number[]): Fit {
  const fitAt = (order: number): Fit => fitPower(sizes, values, weights, order, 3);
  const grid = Array.from({ length: 80 }, (_, i) => (i + 1) / 10);
  const start = grid.reduce((a, b) => (fitAt(b).deviation < fitAt(a).deviation ? b : a));
  let [low, high] = [start - 0.1 + 1e-3, start + 0.1];
  const golden = (Math.sqrt(5) - 1) / 2;
  while (high - low > 1e-6) {
    const [left, right] = [high - golden * (high - low), low + golden * (high - low)];
    if (fitAt(left).deviation < fitAt(right).deviation) high = right;
    else low = left;
  }
  return fitAt((low + high) / 2);
}

/** φ0 + C1 H + C2 H²: the residuals of H² and of φ on H leave one slope, C2. */
function fitTwoPowers(sizes: readonly number[], values: readonly number[], weights: readonly number[]): Fit {
  const rest = (y: readonly number[]): { intercept: number; slope: number; residuals: number[] } => {
    const { intercept, slope } = fitLine(sizes, y, weights)!;
    return { intercept, slope, residuals: y.map((v, i) => v - intercept - slope * sizes[i]!) };
  };
  const square = rest(sizes.map((size) => size * size));
  const figure = rest(values);
  let [cross, norm] = [0, 0];
  square.residuals.forEach((r, i) => {
    cross += weights[i]! * r * figure.residuals[i]!;
    norm += weights[i]! * r * r;
  });
  const second = cross / norm;
  const first = figure.slope - second * square.slope;
  const limit = figure.intercept - second * square.intercept;
  const fine = sizes.at(-1)!;
  const error = first * fine + second * fine * fine;
  const residuals = values.map((v, i) => v - limit - first * sizes[i]! - second * sizes[i]! ** 2);
  // Two expansions of one order each: the lower leads.
  return { order: 1, error, figure: limit + error, deviation: deviationOf(residuals, weights, 3) };
}
