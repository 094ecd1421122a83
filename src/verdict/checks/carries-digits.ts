import type { Check } from "../../result/result.js";
import { size, steps } from "../../result/words.js";
import { type Evidence, solutionError } from "../evidence.js";
import { atMost, check, NO_BEST, NO_SOLUTION, notChecked } from "./common.js";

/** The numerical error is at most a third of the margin that the author stands behind. */
export function carriesDigits(evidence: Evidence): Check {
  const { claimed, solution, best } = evidence;
  if (solution === null) return notChecked("carries-digits", NO_SOLUTION);
  if (best === null) return notChecked("carries-digits", NO_BEST);
  const error = solutionError(evidence);
  if (error === null) return check("carries-digits", "fail", "The author's solution gives no figure.");
  const limit = claimed.halfWidth / 3;
  const says = `The numerical error of ${solution.method} at ${steps(solution.stepsPerOrbit)} is at most ${size(error.bound)} ${claimed.unit}; a third of the quoted margin is ${size(limit)}.`;
  return atMost("carries-digits", error.bound, limit, claimed.unit, says);
}
