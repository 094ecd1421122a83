import type { Check } from "../../result/result.js";
import type { Evidence, SolutionEvidence } from "../evidence.js";
import { check, NO_BEST, notChecked } from "./common.js";

/**
 * Of many 95 % intervals one will miss now and then, hardly ever by several times its half-width. Such a miss
 * calls for caution; so does one of a hundredth of what the digits allow, a third of the margin, which decides
 * nothing.
 */
const UNLUCKY = 3;
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
  const misses = compared.filter(({ ratio }) => ratio > 1);
  const grave = misses.filter(
    ({ ratio, apart }) => ratio > UNLUCKY && apart > NEGLIGIBLE * claimed.halfWidth,
  );
  const agree = best.sound && grave.length === 0;
  const outcome = !agree ? "fail" : misses.length === 0 && readsAlike(solution) ? "pass" : "caution";
  const caution =
    misses.length > 0
      ? worst.apart <= NEGLIGIBLE * claimed.halfWidth
        ? " That is more than they explain, and too little for a digit to hang on."
        : ` One of ${compared.length} such intervals may miss by so much.`
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
