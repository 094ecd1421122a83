import type { Check, DriftPattern, LedgerEntry } from "../../result/result.js";
import { size } from "../../result/words.js";
import type { Evidence } from "../evidence.js";
import { atMost, check, NO_BEST, NO_SOLUTION, notChecked } from "./common.js";

/** The eccentricity vector turns with the apsis: its drift is the figure's own error, seen by other checks. */
const THE_FIGURE_ITSELF = "eccentricity-vector";

const WORDS: Readonly<Record<DriftPattern, string>> = {
  "rounding-level": "stays at rounding",
  "bounded-oscillation": "oscillates and stays bounded",
  "linear-drift": "drifts linearly",
  "random-walk": "walks at random",
  "faster-growth": "grows faster than linearly",
  "jumps-at-periapsis": "jumps at each periapsis",
};

/** Symplectic and symmetric methods promise no secular drift; explicit ones no more than a linear one. */
function promised(conserving: boolean, pattern: DriftPattern): boolean {
  if (pattern === "faster-growth") return false;
  return !conserving || (pattern !== "linear-drift" && pattern !== "jumps-at-periapsis");
}

/**
 * An apsidal advance per time goes as a^-3/2 h^-2 (from 6πGM/(c²a(1-e²)) and Kepler's third law, with
 * h² = GM a (1-e²)): a relative change of energy or angular momentum moves it by at most twice as much.
 */
const SENSITIVITY = 2;

/** What should be conserved has the pattern that the method promises, too small to touch the digits. */
export function conserves(evidence: Evidence): Check {
  const { solution, best, claimed, orbits } = evidence;
  if (solution === null) return notChecked("conserves", NO_SOLUTION);
  if (best === null) return notChecked("conserves", NO_BEST);
  const ledger = evidence.ledger.filter(({ quantity }) => quantity !== THE_FIGURE_ITSELF);
  if (ledger.length === 0) return notChecked("conserves", "No conserved quantity could be followed.");
  const effect = ({ perOrbit }: LedgerEntry): number =>
    SENSITIVITY * Math.abs(perOrbit) * orbits * Math.abs(best.value);
  const worst = ledger.reduce((most, next) => (effect(next) > effect(most) ? next : most));
  const limit = claimed.halfWidth / 3;
  const broken = ledger.find(({ pattern }) => !promised(solution.conserving, pattern));
  if (broken !== undefined) {
    // A broken promise too small to touch a digit is worth a word, not a failure.
    const outcome = effect(broken) <= limit ? "caution" : "fail";
    const says = `The ${words(broken)}, which ${solution.method} should not let it do.`;
    return check("conserves", outcome, says, effect(broken), limit, claimed.unit);
  }
  const touches = `its ${size(Math.abs(worst.perOrbit) * orbits)} of relative change over the span is worth at most ${size(effect(worst))} ${claimed.unit}`;
  return atMost("conserves", effect(worst), limit, claimed.unit, `The ${words(worst)}; ${touches}.`);
}

const words = ({ quantity, pattern }: LedgerEntry): string =>
  `${quantity.replaceAll("-", " ")} ${WORDS[pattern]}`;
