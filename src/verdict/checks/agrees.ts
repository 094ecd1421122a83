import type { Check } from "../../result/result.js";
import type { Evidence } from "../evidence.js";
import { check, NO_BEST, notChecked } from "./common.js";

/** Witnesses and extrapolations agree with the best value within their uncertainties. */
export function agrees({ best, ladders }: Evidence): Check {
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
  const outcome = worst.ratio <= 1 && best.sound ? "pass" : "fail";
  const says =
    outcome === "pass"
      ? `${compared.length} methods agree; the farthest, ${worst.method}, is off by ${distance}.`
      : `${worst.method} is off the best value by ${distance}.`;
  return check("agrees", outcome, says, worst.ratio, 1, "combined uncertainties");
}
