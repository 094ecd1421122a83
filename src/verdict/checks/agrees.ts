import type { Check } from "../../result/result.js";
import type { Evidence, SolutionEvidence } from "../evidence.js";
import { check, NO_BEST, notChecked } from "./common.js";

/**
 * Of many 95 % intervals one will miss now and then. A miss of a hundredth of what the digits allow, a third of
 * the margin, decides nothing: it calls for caution and fails no one.
 */
const NEGLIGIBLE = 1 / 300;

/** Witnesses and extrapolations agree with the best value within their uncertainties. */
export function agrees({ best, claimed, ladders, solution }: Evidence): Check {
  if (best === null) return notChecked("agrees", NO_BEST);
  const compared = ladders.flatMap(({ method, extrapolated }) => {
    if (extrapolated === null) return [];
    const apart = Math.abs(extrapolated.value - best.value);
    const explained = extrapolated.halfWidth + best.halfWidth;
    return [{ method, apart, ratio: apart === 0 ? 0 : apart / explained }];
  });
  if (compared.length < 2) return notChecked("agrees", "Fewer than two methods give a limit to compare.");
  const worst = compared.reduce((most, next) => (next.ratio > most.ratio ? next : most));
  const distance = `${worst.ratio.toPrecision(2)} of their combined uncertainty`;
  const farthest = Math.max(...compared.filter(({ ratio }) => ratio > 1).map(({ apart }) => apart), 0);
  const agree = best.sound && farthest <= NEGLIGIBLE * claimed.halfWidth;
  const outcome = !agree ? "fail" : farthest === 0 && readsAlike(solution) ? "pass" : "caution";
  const caution =
    farthest > 0
      ? " That is more than they explain, and too little for a digit to hang on."
      : " But the drift of the eccentricity vector reads the author's run differently from its passages.";
  const aside = outcome === "caution" ? caution : "";
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
