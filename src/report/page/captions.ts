import type { ClaimResult, Ladder, LedgerEntry } from "../../result/result.js";
import { size } from "../../result/words.js";
import { BUDGET_WORDS } from "./words.js";

/** Captions say what to look for in this case: each is written from its figures. */

export function intervalsCaption({ claimed, asSolved, best }: ClaimResult): string {
  if (claimed === null) return "";
  const { unit } = claimed;
  if (best.value === null) return `The claim stands alone: nothing bounds the figure in ${unit}.`;
  const off = claimed.value - best.value;
  const margins = Math.abs(off) / claimed.halfWidth;
  const place =
    margins <= 1
      ? `The best value lies inside the claimed interval, ${size(Math.abs(off))} ${unit} from its middle`
      : `The best value lies ${size(margins)} margins outside the claimed value`;
  if (asSolved.value === null) return `${place}. The stated solution gives no figure to set beside them.`;
  const error = Math.abs(asSolved.error ?? 0);
  const solved =
    error <= claimed.halfWidth / 3
      ? `the stated solution lands within ${size(error)} of it`
      : `the stated solution lands ${size(error)} away from it`;
  return `${place}; ${solved}.`;
}

export function ladderCaption({ ladders, claimed, best }: ClaimResult): string {
  const own = ladders.find(({ role }) => role === "solution");
  if (own === undefined)
    return `${ladders.length} methods and no solution of the author's: look for where the lines end together.`;
  const rung = own.rungs.find(({ isAuthors }) => isAuthors);
  const at =
    rung === undefined ? "" : ringed(own, rung.stepsPerOrbit, rung.figure, best.value, claimed?.unit ?? "");
  return `${own.says}${at}`;
}

function ringed(own: Ladder, n: number, value: number | null, best: number | null, unit: string): string {
  if (value === null || best === null)
    return ` At the author's ${Math.round(n)} steps an orbit there is no figure to ring.`;
  const { window } = own;
  const rung = own.rungs.findIndex(({ isAuthors }) => isAuthors);
  const where =
    window === null
      ? "with no window to lie in"
      : rung >= window[0] && rung <= window[1]
        ? "inside the shaded window"
        : "outside the shaded window";
  return ` The author's ${Math.round(n)} steps an orbit, ringed, lie ${where}, ${size(Math.abs(value - best))} ${unit} from the best value.`;
}

export function stepsCaption({ asSolved, claimed, best, setup }: ClaimResult): string {
  if (asSolved.null === null || claimed === null) return "The null run gives no figure at the author's step.";
  const { unit, halfWidth } = claimed;
  if (setup?.nullRun.startsWith("nothing") === true) {
    return `Nothing can be switched off here: all of the ${size(asSolved.null)} ${unit} at the author's step is the integrator's.`;
  }
  const shown = Math.abs(asSolved.null);
  if (claimed.baseline === "subtracted") {
    return `The null run shows ${size(asSolved.null)} ${unit} at the author's step; the claim takes it off, and the distance between the two curves is the figure.`;
  }
  if (shown <= halfWidth / 10)
    return `The null run stays at ${size(asSolved.null)} ${unit} at the author's step: next to nothing, as it should.`;
  const share = best.value === null ? "" : `, ${size((100 * shown) / Math.abs(best.value))} % of the effect`;
  return `With the effect off the author's step still turns the apsis by ${size(asSolved.null)} ${unit}${share}: what lifts the run's curve off the dashed best value.`;
}

export function passagesCaption({ passages, claimed }: ClaimResult): string {
  if (passages === null || claimed === null) return "";
  const unit = claimed.unit.split("/")[0] ?? "";
  const last = passages.solution.angle.at(-1) ?? 0;
  const count = passages.solution.number.length;
  const base = passages.null?.angle.at(-1);
  const beside = base === undefined ? "" : `, the null run by ${size(base)}`;
  return `Over ${count} passages the apsis turns by ${size(last)} ${unit}${beside}; the slope of the line is the figure, and a bend in it would be a drift of the numerics.`;
}

export function ledgerCaption({ says, largest, perOrbit, pattern, stepOrder }: LedgerEntry): string {
  const drifting =
    pattern === "linear-drift" || pattern === "faster-growth" || pattern === "jumps-at-periapsis";
  const rate = drifting ? ` It comes to ${size(perOrbit)} an orbit.` : "";
  const order = stepOrder === null ? "" : ` Half the step leaves 1/${size(2 ** stepOrder)} of it.`;
  return `${says} Largest relative change ${size(largest)}.${rate}${order}`;
}

export function budgetCaption({ budget, claimed }: ClaimResult): string {
  if (budget === null || claimed === null || budget.dominant === null || budget.total === null) return "";
  const third = claimed.halfWidth / 3;
  const dominant = BUDGET_WORDS[budget.dominant];
  const ratio = budget.total / third;
  return ratio <= 1
    ? `The total, ${size(budget.total)} ${claimed.unit}, is ${size(ratio)} of what a third of the margin allows; most of it is ${dominant}.`
    : `The total, ${size(budget.total)} ${claimed.unit}, is ${size(ratio)} times what a third of the margin allows; ${dominant} is what would have to shrink.`;
}
