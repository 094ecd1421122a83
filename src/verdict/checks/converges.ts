import type { Check } from "../../result/result.js";
import { steps } from "../../result/words.js";
import type { Evidence } from "../evidence.js";
import { check, NO_SOLUTION, notChecked } from "./common.js";

/** A window exists and the author's step lies in it or finer. */
export function converges({ solution, ladders }: Evidence): Check {
  if (solution === null) return notChecked("converges", NO_SOLUTION);
  const { window, rungs, shape, says } = ladders[0]!;
  if (window === null) {
    return check("converges", "fail", `No step of the ladder is in a regime of convergence. ${says}`);
  }
  const from = rungs[window[0]]!.stepsPerOrbit;
  const inside = solution.rung >= window[0];
  const regime = shape === "at-rounding" ? "The figure sinks to rounding" : "The figure converges";
  const sentence = inside
    ? `${regime} from ${steps(from)} on; the author's ${Math.round(solution.stepsPerOrbit)} is inside.`
    : `${regime} only from ${steps(from)} on; the author's ${Math.round(solution.stepsPerOrbit)} is coarser.`;
  return check("converges", inside ? "pass" : "fail", sentence, solution.stepsPerOrbit, from, "steps/orbit");
}
