import { fitLine } from "../../statistics/line.js";

/** A weighted least-squares fit of an error law to the figures of grids, coarsest first. */
export interface Fit {
  readonly order: number;
  /** The fitted error and the fitted figure of the finest grid. */
  readonly error: number;
  readonly figure: number;
  /** Standard deviation of the fit. */
  readonly deviation: number;
}

function deviationOf(residuals: readonly number[], weights: readonly number[], parameters: number): number {
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  // Weights add up to one, times the number of grids.
  const sum = residuals.reduce((s, r, i) => s + (weights[i]! / total) * residuals.length * r * r, 0);
  return Math.sqrt(sum / (residuals.length - parameters));
}

/** φ0 + C H^p at a given p. */
export function fitPower(
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
export function fitFreePower(
  sizes: readonly number[],
  values: readonly number[],
  weights: readonly number[],
): Fit {
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
export function fitTwoPowers(
  sizes: readonly number[],
  values: readonly number[],
  weights: readonly number[],
): Fit {
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
