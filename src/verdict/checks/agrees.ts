import type { Check } from "../../result/result.js";
import type { Evidence, SolutionEvidence } from "../evidence.js";
import { check, NO_BEST, notChecked } from "./common.js";

/** Witnesses and extrapolations agree with the best value within their uncertainties. */
export function agrees({ best, ladders, solution }: Evidence): Check {
  if (best === null) return notChecked("agrees", NO_BEST);
  const compared = ladders.flatMap(({ method, extrapolated }) => {
    if (extrapolated === null) return [];
    const apart = Math.abs(extrapolated.value - best.value);
    const explained = extrapolated.halfWidth + best.halfWidth;
    return [{ method, ratio: apart === 0 ? 0 : apart / explained }];
  });
  if (compared.length < 2) return notChecked("agrees", "Fewer than two methods give a limit to compare.");
  const worst = compared.reduce((most, next) => (next.ratio > most.ratio ? next : most));
  const distance = `${worst.ratio.toPrecision(2)} of their combined uncertainty`;
  const agree = worst.ratio <= 1 && best.sound;
  const outcome = !agree ? "fail" : readsAlike(solution) ? "pass" : "caution";
  const aside =
    outcome === "caution"
      ? " But the drift of the eccentricity vector reads the author's run differently from its passages."
      : "";
  const says =
    outcome !== "fail"
      ? `${compared.length} methods agree; the farthest, ${worst.method}, is off by ${distance}.${aside}`
      : `${worst.method} is off the best value by ${distance}.`;
  return check("agrees", outcome, says, worst.ratio, 1, "combined uncertainties");
}

/** The two readings of the author's run lie within the half-width of the rougher one. */
function readsAlike(solution: SolutionEvidence | null): boolean {
  if (solution === null || solution.raw === null || solution.crossReading === null) return true;
  const { value, halfWidth } = solution.crossReading;
  return Math.abs(value - solution.raw) <= halfWidth + solution.rounding;
}
