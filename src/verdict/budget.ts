import type { Budget, BudgetPart } from "../result/result.js";
import { type Evidence, solutionError } from "./evidence.js";

/** The parts of the numerical uncertainty of the author's figure; null without one. */
export function budget(evidence: Evidence): Budget | null {
  const error = solutionError(evidence);
  const { solution, best } = evidence;
  if (error === null || solution === null || best === null) return null;
  const parts: Readonly<Record<BudgetPart, number | null>> = {
    truncation: Math.abs(error.value),
    rounding: solution.rounding,
    readingOff: solution.readingOff,
    methodSpread: best.halfWidth,
    sampling: null,
  };
  const known = Object.entries(parts).filter(([, part]) => part !== null) as [BudgetPart, number][];
  const [dominant] = known.reduce((most, next) => (next[1] > most[1] ? next : most));
  return { ...parts, total: Math.hypot(...known.map(([, part]) => part)), dominant };
}
