import type { Check } from "../../result/result.js";
import { ENDINGS, size } from "../../result/words.js";
import type { Evidence } from "../evidence.js";
import { atMost, check, NO_SOLUTION, notChecked } from "./common.js";

/** Far below the margin: a tenth of it. */
const FAR_BELOW = 0.1;

/** With the effect switched off the solution shows next to nothing, or the claim takes off what it shows. */
export function nullRun({ claimed, solution, nullExists }: Evidence): Check {
  if (solution === null) return notChecked("null", NO_SOLUTION);
  const limit = FAR_BELOW * claimed.halfWidth;
  if (solution.null === null) {
    return check("null", "fail", `The null run gives no figure: it ${ENDINGS[solution.nullStatus]}.`);
  }
  const shown = `${size(solution.null)} ${claimed.unit}`;
  if (claimed.baseline === "subtracted") {
    const says = `The null run shows ${shown}, and the claim subtracts it.`;
    return check("null", "pass", says, Math.abs(solution.null), null, claimed.unit);
  }
  const what = nullExists ? "With the effect switched off" : "Nothing can be switched off here; by itself";
  const says = `${what} the same method and step turn the apsis by ${shown}; ${size(limit)} is allowed.`;
  return atMost("null", Math.abs(solution.null), limit, claimed.unit, says);
}
