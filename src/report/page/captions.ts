import type {
  CheckName,
  ClaimResult,
  Ladder,
  LedgerEntry,
  Outcome,
  PassageSeries,
} from "../../result/result.js";
import { BUDGET_WORDS, plural, size } from "../../result/words.js";
import { isZoomed } from "./plots/intervals.js";
import { stepsView } from "./plots/steps-view.js";

/** Captions say what to look for in this case: each is written from its figures. */

const sentences = (...parts: readonly string[]): string => parts.filter((part) => part !== "").join(" ");

const outcomeOf = ({ checks }: ClaimResult, name: CheckName): Outcome | undefined =>
  checks.find((check) => check.name === name)?.outcome;

export function intervalsCaption(result: ClaimResult): string {
  const { claimed, best } = result;
  if (claimed === null) return "";
  if (best.value === null)
    return "No method bounds the figure, so the claimed interval has nothing to be held against.";
  const off = Math.abs(claimed.value - best.value);
  const place =
    off <= claimed.halfWidth
      ? `The best value lies inside the claimed interval, ${off < claimed.halfWidth / 100 ? "in its very middle" : `${size((100 * off) / claimed.halfWidth)} % of the margin from its middle`}.`
      : `The best value lies outside the claimed interval: ${size(off)} ${claimed.unit} from its middle, ${size(off / claimed.halfWidth)} times the margin.`;
  return sentences(
    place,
    solvedBeside(result),
    isZoomed(result) ? "The second axis shows the claim from near." : "",
  );
}

/** Where the recomputed solution falls, between the claim and the best value. */
function solvedBeside(result: ClaimResult): string {
  const { claimed, asSolved, best } = result;
  if (asSolved.value === null) return "There is no recomputed solution to set beside them.";
  const onClaim = outcomeOf(result, "reproduces") === "pass";
  const onBest = outcomeOf(result, "carries-digits") === "pass";
  if (onClaim && onBest) return "The stated solution, solved again, falls on both.";
  const fromBest = `${size(Math.abs(asSolved.value - best.value!))} ${claimed!.unit}`;
  const fromClaim = `${size(Math.abs(asSolved.value - claimed!.value))} ${claimed!.unit}`;
  if (onClaim) {
    return `The stated solution, solved again, falls on the claim and ${fromBest} from the best value: what was quoted is what this step gives.`;
  }
  if (onBest) {
    return `The stated solution, solved again, falls on the best value and ${fromClaim} from the claim: what was quoted is not what it gives.`;
  }
  return `The stated solution, solved again, falls on neither: ${fromClaim} from the claim, ${fromBest} from the best value.`;
}

export function ladderCaption({ ladders, claimed, best }: ClaimResult): string {
  if (claimed === null) return "";
  const own = ladders.find(({ role }) => role === "solution");
  if (own === undefined) return witnessesAlone(ladders, claimed.halfWidth / 3, best.value);
  const rung = own.rungs.find(({ isAuthors }) => isAuthors);
  return sentences(
    own.says,
    rung === undefined ? "" : authorsRung(own, rung, best.value, claimed.unit),
    crossing(own, claimed.halfWidth / 3),
    isScattered(own, best.value) ? "The dashed law bounds differences that scatter below it." : "",
  );
}

function authorsRung(own: Ladder, rung: Ladder["rungs"][number], best: number | null, unit: string): string {
  const at = `The author's ${Math.round(rung.stepsPerOrbit)} steps an orbit`;
  if (rung.figure === null) return `${at} give no figure.`;
  const k = own.rungs.indexOf(rung);
  const { window } = own;
  const where =
    window === null
      ? "with no window to lie in"
      : k >= window[0] && k <= window[1]
        ? "inside the shaded window"
        : "outside the shaded window";
  const apart = best === null ? "" : `, ${size(Math.abs(rung.figure - best))} ${unit} from the best value`;
  return `${at}, ringed, lie ${where}${apart}.`;
}

/** Which witness first comes under a level for good. */
function witnessesAlone(ladders: readonly Ladder[], third: number, best: number | null): string {
  const without = "The claim names no solution, so there are only witnesses.";
  if (best === null) return without;
  const first = ladders
    .flatMap(({ method, rungs }) => {
      const over = rungs.findLastIndex(({ figure }) => figure === null || Math.abs(figure - best) > third);
      const under = rungs[over + 1];
      return under === undefined ? [] : [{ method, n: under.stepsPerOrbit }];
    })
    .sort((a, b) => a.n - b.n)[0];
  return first === undefined
    ? `${without} None of them comes under a third of the margin for good.`
    : `${without} The first to come under a third of the margin for good is ${first.method}, at ${Math.round(first.n)} steps an orbit.`;
}

/** Where the fitted law comes down to a level. */
function crossing({ coefficient, figureOrder, method, rungs }: Ladder, third: number): string {
  if (coefficient === null || figureOrder === null || figureOrder <= 0) return "";
  const n = (Math.abs(coefficient) / third) ** (1 / figureOrder);
  if (n < rungs[0]!.stepsPerOrbit) return "";
  const beyond = n > rungs.at(-1)!.stepsPerOrbit ? ", beyond the finest rung" : "";
  return `The law of ${method} comes down to a third of the margin at about ${Number(n.toPrecision(2))} steps an orbit${beyond}.`;
}

/** Whether the law is a bound rather than the line through the rungs: some in the window are a third of it. */
function isScattered(
  { coefficient, figureOrder, window, rungs, floor }: Ladder,
  best: number | null,
): boolean {
  if (coefficient === null || figureOrder === null || window === null || best === null) return false;
  return rungs.slice(window[0], window[1] + 1).some(({ figure, stepsPerOrbit }) => {
    const law = Math.abs(coefficient) * stepsPerOrbit ** -figureOrder;
    return figure !== null && law > 3 * (floor ?? 0) && Math.abs(figure - best) < law / 3;
  });
}

export function stepsCaption(result: ClaimResult): string {
  const { asSolved, claimed, ladders, best } = result;
  const view = stepsView(result);
  if (claimed === null || view === null) return "";
  const { unit, halfWidth } = claimed;
  const leaves =
    view.leavesBelow === null
      ? ""
      : `Below ${Math.round(view.leavesBelow)} steps an orbit the curves leave the frame.`;
  const off = asSolved.null;
  if (off === null) return sentences("The null run gives no figure at the author's step.", leaves);
  const rung = ladders.find(({ role }) => role === "solution")?.rungs.find(({ isAuthors }) => isAuthors);
  const shown = `${size(off)} ${unit}`;
  const isSmall = Math.abs(off) <= halfWidth / 10;
  if (rung?.value === off) {
    return sentences(
      isSmall
        ? `Nothing can be switched off here; the run itself shows ${shown} at the author's step, less than a tenth of the margin.`
        : `Nothing can be switched off here: all of the ${shown} at the author's step is the integrator's.`,
      leaves,
    );
  }
  if (claimed.baseline === "subtracted") {
    const raw = rung?.value == null ? "" : `the run shows ${size(rung.value)} and `;
    return sentences(
      `At the author's step ${raw}the null run ${shown}; the claim is about their difference, which holds still while both turn away.`,
      leaves,
    );
  }
  if (isSmall) {
    return sentences(
      `At the author's step the null run shows ${shown}, less than a tenth of the margin: the figure is the effect's.`,
      leaves,
    );
  }
  const share = best.value ? ` and ${size(100 * Math.abs(off / best.value))} % of the effect` : "";
  const error = asSolved.error === null ? "" : ` The figure itself is off by ${size(asSolved.error)}.`;
  return sentences(
    `With the effect off, the author's step still turns the apsis by ${shown}: ${size(Math.abs(off) / halfWidth)} times the margin${share}.${error}`,
    leaves,
  );
}

export function passagesCaption({ passages, claimed }: ClaimResult): string {
  if (passages === null || claimed === null) return "";
  const unit = claimed.unit.split("/")[0] ?? "";
  const { solution } = passages;
  if (solution.number.length < 2) return "";
  const turned = (series: PassageSeries): number => series.angle.at(-1)! - series.angle[0]!;
  const beside = passages.null === null ? "" : `, in the null run by ${size(turned(passages.null))}`;
  return sentences(
    `Over ${plural(solution.number.length, "passage")} the apsis turns by ${size(turned(solution))} ${unit}${beside}.`,
    `The slope is the figure; no passage is more than ${size(bend(solution))} ${unit} off the straight line from first to last.`,
  );
}

/** Largest departure from the chord. */
function bend({ number, angle }: PassageSeries): number {
  const slope = (angle.at(-1)! - angle[0]!) / (number.at(-1)! - number[0]!);
  return Math.max(
    ...angle.map((value, i) => Math.abs(value - angle[0]! - slope * (number[i]! - number[0]!))),
  );
}

export function ledgerCaption(entry: LedgerEntry): string {
  const { says, largest, perOrbit, pattern, stepOrder, series } = entry;
  const isDrifting =
    pattern === "linear-drift" || pattern === "faster-growth" || pattern === "jumps-at-periapsis";
  // Where what swings within an orbit is left out, the curve goes beyond the figure.
  const drawn = Math.max(0, ...series.change.map(Math.abs));
  const ofMeans = drawn > 1.01 * largest;
  // A vector is drawn by the size of its change, which cannot fall.
  const isSize = isDrifting && perOrbit < 0 && drawn > 0 && series.change.every((change) => change >= 0);
  return sentences(
    says,
    `Largest relative change ${ofMeans ? "of the orbits' means " : ""}${size(largest)}${isDrifting ? `, ${size(perOrbit)} an orbit` : ""}.`,
    isSize ? "The curve is the size of the change, whichever way it goes." : "",
    stepOrder === null ? "" : `It goes as the step to the power of ${stepOrder.toFixed(2)}.`,
  );
}

export function budgetCaption({ budget, claimed }: ClaimResult): string {
  if (budget === null || claimed === null || budget.dominant === null || budget.total === null) return "";
  const dominant = BUDGET_WORDS[budget.dominant];
  const ratio = budget.total / (claimed.halfWidth / 3);
  const total = `${size(budget.total)} ${claimed.unit} in quadrature`;
  if (ratio < 0.01) {
    return `Together ${total}, less than a hundredth of what a third of the margin allows; most of it is ${dominant}.`;
  }
  return ratio <= 1
    ? `Together ${total}, ${size(100 * ratio)} % of what a third of the margin allows; most of it is ${dominant}.`
    : `Together ${total}, ${size(ratio)} times what a third of the margin allows; ${dominant} is the part that has to shrink.`;
}
