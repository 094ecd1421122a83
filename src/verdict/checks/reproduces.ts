import type { Check } from "../../result/result.js";
import { ENDINGS, figure, size, steps } from "../../result/words.js";
import type { Evidence, SolutionEvidence } from "../evidence.js";
import { atMost, check, NO_SOLUTION, notChecked } from "./common.js";

/** The figure as quoted may be rounded (half a unit) from one computed within the margin's third. */
const SHARE = 4 / 3;

/** The stated method and step give the claimed figure. */
export function reproduces({ claimed, solution, nullExists }: Evidence): Check {
  if (solution === null) return notChecked("reproduces", NO_SOLUTION);
  if (solution.value === null) {
    return check(
      "reproduces",
      "fail",
      `${solution.method} at ${steps(solution.stepsPerOrbit)} gives no figure: ${solution.status === "ok" ? "its null run" : "its run"} ${ENDINGS[solution.status === "ok" ? solution.nullStatus : solution.status]}.`,
    );
  }
  const distance = Math.abs(claimed.value - solution.value);
  const limit = SHARE * claimed.halfWidth;
  const given = `${solution.method} at ${steps(solution.stepsPerOrbit)} gives ${figure(solution.value, claimed.halfWidth)} ${claimed.unit}`;
  const says =
    distance <= limit
      ? `${given}, within ${size(distance)} of the claim.`
      : `${given}, ${size(distance)} from the claim; ${size(limit)} is allowed.${nullExists ? hint(claimed, solution, limit) : ""}`;
  return atMost("reproduces", distance, limit, claimed.unit, says);
}

/** The other baseline may be the one that the author meant. */
function hint(claimed: Evidence["claimed"], { raw, null: base }: SolutionEvidence, limit: number): string {
  if (raw === null || base === null) return "";
  const subtracted = claimed.baseline === "subtracted";
  const other = subtracted ? raw : raw - base;
  if (Math.abs(claimed.value - other) > limit) return "";
  return subtracted
    ? " The run with its baseline included does give it."
    : " The run less its null run does give it: was the baseline subtracted?";
}
