import type { Estimator } from "./estimator.js";
import { factorOfSafety } from "./factor-of-safety.js";
import { gridConvergenceIndex } from "./grid-convergence-index.js";
import { leastSquares } from "./least-squares.js";
import { verifiedExtrapolants } from "./verified-extrapolants.js";

export type { Estimator } from "./estimator.js";

/** The published procedures, and the one that `analyseLadder` uses. */
export const estimators: readonly Estimator[] = [
  gridConvergenceIndex,
  factorOfSafety,
  leastSquares,
  verifiedExtrapolants,
];
