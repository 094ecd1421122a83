import type { Estimator } from "./estimator.js";
import { finestTriplet, richardsonError } from "./triplet.js";

/**
 * FS(P) with P = p / p_th, the apparent order over the formal one: FS1 P + FS0 (1 - P) up to P = 1 and
 * FS1 P + FS2 (P - 1) beyond, with FS0 = 2.45, FS1 = 1.6, FS2 = 14.8.
 */
export const safetyFactor = (ratio: number): number =>
  ratio <= 1 ? 2.45 - 0.85 * ratio : 16.4 * ratio - 14.8;

/**
 * U = FS(P) |φ2 - φ1| / (r^p - 1) about the finest figure φ1, for monotone convergence only. Rounding is
 * added in squares, as other parts of an uncertainty are (common practice).
 */
export const factorOfSafety: Estimator = {
  name: "factor-of-safety",
  source: "T. Xing and F. Stern, J. Fluids Eng. 132, 061403 (2010)",
  estimate(points, { order }) {
    const triplet = finestTriplet(points);
    if (triplet === null || !(triplet.e32 / triplet.e21 > 0)) return null;
    const uncertainty = safetyFactor(triplet.order / order) * Math.abs(richardsonError(triplet));
    return { value: triplet.finest, halfWidth: Math.hypot(uncertainty, triplet.floor) };
  },
};
