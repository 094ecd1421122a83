import type { Check, CheckName, Verdict } from "../result/result.js";
import { MARGIN } from "./checks/common.js";
import type { Evidence, Grading } from "./evidence.js";
import { passes } from "./verdict.js";

/** Checks on which trust in a solution rests, whatever its figure. */
const TRUST: readonly CheckName[] = ["converges", "order", "agrees", "sampling"];
/** Not having stored data to look at is no fault of a solution. */
const OPTIONAL: readonly CheckName[] = ["sampling"];

/** The grade of the solution; null for a claim without one. The first rule that applies decides. */
export function gradeOf(evidence: Evidence, checks: readonly Check[], verdict: Verdict): Grading {
  const { solution, best } = evidence;
  if (solution === null) return { grade: null, rule: "There is no solution to grade." };
  const failed = checks.filter(({ outcome }) => outcome === "fail").map(({ name }) => name);
  const distrusted = failed.filter((name) => TRUST.includes(name));
  if (solution.value === null) return { grade: "E", rule: "The author's own run gives no figure." };
  if (best === null || !best.sound) {
    return {
      grade: "D",
      rule: "The evidence is thin: there is no sound value to measure the solution against.",
    };
  }
  if (failed.includes("stands-clear")) {
    return { grade: "E", rule: "The effect does not stand clear of the numerical error." };
  }
  if (verdict === "not-resolved") return { grade: "E", rule: "No digit of the figure stands." };
  if (distrusted.length > 1) return { grade: "E", rule: `${distrusted.join(" and ")} fail.` };
  if (distrusted.length === 1) return { grade: "D", rule: `${distrusted[0]} fails.` };
  const open = checks.filter(({ name, outcome }) => outcome === "not-checked" && !OPTIONAL.includes(name));
  if (open.length > 0) {
    return {
      grade: "D",
      rule: `The evidence is thin: ${open.map(({ name }) => name).join(", ")} not checked.`,
    };
  }
  if (failed.includes("reproduces")) {
    return { grade: "D", rule: "The stated solution does not give the claimed figure." };
  }
  if (failed.length > 0) {
    return {
      grade: "C",
      rule: `The effect stands, but digits are lost: ${failed.join(" and ")} ${failed.length > 1 ? "fail" : "fails"}.`,
    };
  }
  const tight = checks.find((check) => !hasMargin(check));
  if (tight !== undefined) {
    return {
      grade: "B",
      rule: `Every check passes, ${tight.name} with less than a tenth of its margin to spare.`,
    };
  }
  return { grade: "A", rule: "Every check passes with a tenth of its margin to spare." };
}

/** Whether a check passes with a tenth of its limit unused. */
function hasMargin(check: Check): boolean {
  if (check.outcome === "not-checked") return true;
  if (check.outcome === "caution" || !passes(check)) return false;
  if (check.figure === null || check.limit === null) return true;
  // Inside the window there are only whole rungs: a margin of a tenth means nothing there.
  if (check.name === "converges") return true;
  return check.name === "stands-clear"
    ? check.limit <= (1 - MARGIN) * check.figure
    : check.figure <= (1 - MARGIN) * check.limit;
}
