import type { Estimator } from "./estimator.js";
import { finestTriplet, richardsonError } from "./triplet.js";

/** Fs of three grids. */
const SAFETY = 1.25;

/**
 * U = 1.25 |φ2 - φ1| / (r^p - 1) about the finest figure φ1. With one refinement ratio r = 2 the procedure's
 * q(p) is ln((r^p - s)/(r^p - s)) = 0, so that p = |ln|e32 / e21|| / ln r needs no iteration; oscillating
 * differences (s < 0) are treated alike. Rounding is added in squares, as other parts of an uncertainty
 * are (common practice).
 */
export const gridConvergenceIndex: Estimator = {
  name: "grid-convergence-index",
  source:
    "P. J. Roache, Verification and Validation in Computational Science and Engineering (1998); " +
    "I. B. Celik et al., J. Fluids Eng. 130, 078001 (2008)",
  estimate(points) {
    const triplet = finestTriplet(points);
    if (triplet === null) return null;
    const index = SAFETY * Math.abs(richardsonError(triplet));
    return { value: triplet.finest, halfWidth: Math.hypot(index, triplet.floor) };
  },
};
