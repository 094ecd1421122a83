import type { Check } from "../../result/result.js";
import { bestInWords, size } from "../../result/words.js";
import { type Evidence, solutionError } from "../evidence.js";
import { check, NO_BEST, NO_SOLUTION, notChecked } from "./common.js";

/** The effect must be so many times the numerical error. */
const TIMES = 10;

/** The effect is larger than the numerics. */
export function standsClear(evidence: Evidence): Check {
  const { claimed, solution, best } = evidence;
  if (solution === null) return notChecked("stands-clear", NO_SOLUTION);
  if (best === null) return notChecked("stands-clear", NO_BEST);
  const error = solutionError(evidence);
  if (Math.abs(claimed.value) <= claimed.halfWidth) {
    return check("stands-clear", "pass", "Not asked: the claim's own interval contains zero.");
  }
  if (error === null) return check("stands-clear", "fail", "The author's solution gives no figure.");
  const effect = Math.abs(best.value);
  const limit = TIMES * error.bound;
  const clear = effect >= limit;
  const ratio = effect / error.bound;
  const says = clear
    ? `The effect, ${bestInWords(best, claimed)} ${claimed.unit}, is ${size(ratio)} times the numerical error.`
    : `The effect, ${bestInWords(best, claimed)} ${claimed.unit}, is only ${size(ratio)} times the numerical error, ${size(error.bound)}; ${TIMES} are asked.`;
  return check("stands-clear", clear ? "pass" : "fail", says, effect, limit, claimed.unit);
}
