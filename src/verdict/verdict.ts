import type { Check, CheckName } from "../result/result.js";
import { bestInWords, ENDINGS, plural, size, steps } from "../result/words.js";
import { standingDigits } from "./digits.js";
import { type Conclusion, type Evidence, type SolutionError, solutionError } from "./evidence.js";
import { remedy } from "./remedy.js";

/** A verdict of resolved asks for each of these. */
const NEEDED: readonly CheckName[] = ["converges", "order", "agrees", "stands-clear"];
/** A figure that is right while one of these fails is a right number from a wrong solution. */
const TRUSTED: readonly CheckName[] = [...NEEDED, "sampling"];

export const passes = ({ outcome }: Check): boolean => outcome === "pass" || outcome === "caution";

/** The rules of the verdict, in the order in which they are taken; the first that applies decides. */
export function conclude(evidence: Evidence, checks: readonly Check[]): Conclusion {
  const outcome = (name: CheckName): Check => checks.find((check) => check.name === name)!;
  return undetermined(evidence, outcome) ?? decide(evidence as Decidable, outcome, solutionError(evidence));
}

type Lookup = (name: CheckName) => Check;
type Decidable = Evidence & {
  readonly solution: NonNullable<Evidence["solution"]>;
  readonly best: NonNullable<Evidence["best"]>;
};

function undetermined(evidence: Evidence, outcome: Lookup): Conclusion | null {
  const { claimed, solution, best } = evidence;
  const say = (reason: string): Conclusion => ({ verdict: "undetermined", reason });
  if (best === null) {
    return say("No witness's ladder bounds the figure; a finer step or a shorter span would be needed.");
  }
  if (!best.sound) {
    return say(
      "The witnesses do not agree on the figure within their uncertainties; finer steps or other witnesses would settle it.",
    );
  }
  if (solution === null) return say(textOnly(evidence as Decidable));
  const error = solutionError(evidence);
  if (error === null) return null;
  const third = claimed.halfWidth / 3;
  // What the best value itself leaves open must not decide between digits that stand and digits that do not.
  if (best.halfWidth > third && Math.abs(error.value) <= third + best.halfWidth) {
    return say(
      `The best value is known to ${size(best.halfWidth)} ${claimed.unit} only, and a third of the quoted margin is ${size(third)}: witnesses with finer steps would settle it.`,
    );
  }
  const open = NEEDED.find((name) => outcome(name).outcome === "not-checked");
  if (open !== undefined) return say(`What ${open} asks could not be checked. ${outcome(open).says}`);
  return null;
}

/** For a claim without a solution: whether the figure is right, and what would have carried it. */
function textOnly(evidence: Decidable): string {
  const { claimed, best } = evidence;
  const distance = Math.abs(claimed.value - best.value);
  const value = `${bestInWords(best, claimed)} ${claimed.unit}`;
  const right = distance <= claimed.halfWidth + best.halfWidth;
  const option = remedy(evidence)?.options[0];
  const carried =
    option === undefined ? "" : ` ${option.method} at ${steps(option.stepsPerOrbit)} would carry its digits.`;
  return right
    ? `The figure is right, the equations give ${value}; but the claim does not say how it was computed, so nothing shows that the solution carries it.${carried}`
    : `The figure is off by ${size(distance)}, the equations give ${value}; the claim does not say how it was computed, so nothing shows why.${carried}`;
}

function decide(evidence: Decidable, outcome: Lookup, error: SolutionError | null): Conclusion {
  const { claimed, solution, best } = evidence;
  const { unit } = claimed;
  const distance = Math.abs(claimed.value - best.value);
  const third = claimed.halfWidth / 3;
  const how = `${solution.method} at ${steps(solution.stepsPerOrbit)}`;
  const value = `${bestInWords(best, claimed)} ${unit}`;

  if (error === null) {
    const ended = solution.status === "ok" ? solution.nullStatus : solution.status;
    return {
      verdict: "not-resolved",
      reason: `The stated solution, ${how}, gives no figure: ${solution.status === "ok" ? "its null run" : "its run"} ${ENDINGS[ended]}. The equations give ${value}.`,
    };
  }
  if (distance > claimed.halfWidth + best.halfWidth + error.bound) {
    return {
      verdict: "contradicted",
      reason: `The equations give ${value}, ${size(distance)} away from the claim; the numerical error of the stated solution explains at most ${size(error.bound)} of it.`,
    };
  }
  const right = distance <= claimed.halfWidth + best.halfWidth;
  const failing = TRUSTED.filter((name) => outcome(name).outcome === "fail");
  if (
    right &&
    error.bound <= third &&
    failing.length === 0 &&
    NEEDED.every((name) => passes(outcome(name)))
  ) {
    return {
      verdict: "resolved",
      reason: `${allDigits(claimed.digits)}: the numerical error of ${how} is at most ${size(error.bound)} ${unit}, and a third of the quoted margin is ${size(third)}.`,
    };
  }
  const digits = digitsLeft(evidence, error.bound, distance);
  if (passes(outcome("stands-clear")) && digits >= 1) {
    return { verdict: "partly-resolved", reason: partly(evidence, error, { right, digits, failing, how }) };
  }
  return { verdict: "not-resolved", reason: lost(evidence, error, how, value) };
}

const allDigits = (count: number): string =>
  count === 1
    ? "The quoted digit stands"
    : count === 2
      ? "Both quoted digits stand"
      : `All ${count} quoted digits stand`;

/** Digits that stand; of a claim that contains zero, which has none to count, whether it holds at all. */
function digitsLeft({ claimed, best }: Decidable, error: number, distance: number): number {
  if (Math.abs(claimed.value) > claimed.halfWidth) return standingDigits(best.value, error, distance) ?? 0;
  return error + distance <= claimed.halfWidth ? claimed.digits : 0;
}

function partly(
  { claimed, best }: Decidable,
  error: SolutionError,
  state: {
    readonly right: boolean;
    readonly digits: number;
    readonly failing: readonly CheckName[];
    readonly how: string;
  },
): string {
  const { right, digits, failing, how } = state;
  if (right && error.bound <= claimed.halfWidth / 3) {
    return `The figure is right to its digits, but ${failing.join(" and ")} ${failing.length > 1 ? "fail" : "fails"}: a right number from a solution that does not carry it.`;
  }
  const count = Math.min(digits, claimed.digits);
  const stand = `${count} of ${plural(claimed.digits, "quoted digit")} ${count === 1 ? "stands" : "stand"}`;
  if (right && digits >= claimed.digits) {
    return `The digits stand, but with less to spare than the quoted margin asks: the numerical error of ${how} is up to ${size(error.bound)} ${claimed.unit}, more than a third of it.`;
  }
  const why = right
    ? `the numerical error of ${how} is up to ${size(error.bound)} ${claimed.unit}, more than a third of the quoted margin`
    : `the claim is ${size(claimed.value - best.value)} ${claimed.unit} off the ${bestInWords(best, claimed)} that the equations give, within the numerical error of ${how}`;
  return `${stand}: ${why}.`;
}

function lost(
  { claimed, solution, best, nullExists }: Decidable,
  error: SolutionError,
  how: string,
  value: string,
): string {
  const artefact = claimed.baseline === "included" && nullExists ? solution.null : null;
  // The null run tells the story where it accounts for most of the error.
  const tells = artefact !== null && Math.abs(artefact - error.value) <= Math.abs(error.value) / 2;
  const told = tells ? ` With the effect switched off it still shows ${size(artefact)}.` : "";
  const at =
    Math.abs(best.value) <= best.halfWidth
      ? "the figure of the equations is 0"
      : `the equations give ${value}`;
  return `The numerics make up too much of the figure: ${how} is off by ${size(error.value)} ${claimed.unit}, and ${at}.${told}`;
}
