import { sampleStandardDeviation } from "simple-statistics";
import { studentT95 } from "../statistics/student-t.js";

/** Members of the last-bit ensemble. */
export const ENSEMBLE_SIZE = 8;

/**
 * Starting states that differ in the last bits: each component times 1 + k ε with small whole k.
 * Components that are zero stay so. The pattern is fixed, so that an audit repeats to the last digit.
 *
 * @param epsilon distance from 1 to the next number, 2^-52 of doubles
 * @returns `ENSEMBLE_SIZE` states, none of them the one given
 */
export function lastBitEnsemble(state: readonly number[], epsilon: number = Number.EPSILON): number[][] {
  return Array.from({ length: ENSEMBLE_SIZE }, (_, member) =>
    state.map((component, i) => {
      // ±1 and ±2 units, spread over the members so that no two states agree in every component.
      const units = [1, -1, 2, -2][(member + i * (1 + (member >> 2))) % 4]!;
      return component * (1 + units * epsilon);
    }),
  );
}

/**
 * 95 % half-width of one run's rounding error in a figure, from the figures of an ensemble.
 * Null with fewer than three members that gave one.
 */
export function roundingHalfWidth(figures: readonly (number | null)[]): number | null {
  const given = figures.filter((figure) => figure !== null);
  if (given.length < 3) return null;
  // A fresh run scatters round the true figure, the members round their own mean: hence 1 + 1/n.
  const scale = studentT95(given.length - 1) * Math.sqrt(1 + 1 / given.length);
  return scale * sampleStandardDeviation(given);
}
