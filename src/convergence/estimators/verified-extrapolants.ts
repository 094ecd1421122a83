import { analyseLadder } from "../ladder.js";
import type { Estimator } from "./estimator.js";

/**
 * What an audit uses. It needs neither the formal order nor the symmetry of the method, which a ladder of files
 * or of a program does not tell: both are measured.
 */
export const verifiedExtrapolants: Estimator = {
  name: "verified-extrapolants",
  source:
    "the last of the extrapolants of L. F. Richardson and J. A. Gaunt, Phil. Trans. R. Soc. A 226, 299 (1927), " +
    "whose own convergence is seen, with the safety factors of P. J. Roache (1998)",
  estimate: (points) => analyseLadder(points).limit,
};
