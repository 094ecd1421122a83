import type { ClaimResult } from "../result/result.js";
import { budget } from "./budget.js";
import { allChecks } from "./checks/index.js";
import { standingDigits } from "./digits.js";
import { type Evidence, solutionError } from "./evidence.js";
import { gradeOf } from "./grade.js";
import { remedy } from "./remedy.js";
import { conclude } from "./verdict.js";

/** All of a result that follows from the numbers. */
export type Judgement = Pick<
  ClaimResult,
  "verdict" | "grade" | "digits" | "reason" | "gradeRule" | "checks" | "budget" | "remedy" | "asSolved"
>;

/** Judges a claim on its evidence. A pure function: the same numbers give the same judgement. */
export function judge(evidence: Evidence): Judgement {
  const { best, claimed, solution } = evidence;
  const checks = allChecks(evidence);
  const { verdict, reason } = conclude(evidence, checks);
  const { grade, rule } = gradeOf(evidence, checks, verdict);
  const error = solutionError(evidence);
  return {
    verdict,
    reason,
    grade,
    gradeRule: rule,
    digits:
      error === null || best === null
        ? null
        : standingDigits(best.value, error.bound, Math.abs(claimed.value - best.value)),
    checks,
    budget: budget(evidence),
    remedy: remedy(evidence),
    asSolved: {
      value: solution?.value ?? null,
      null: solution?.null ?? null,
      error: error?.value ?? null,
      halfWidth: error?.halfWidth ?? null,
    },
  };
}
