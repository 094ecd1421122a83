import type { BudgetPart, RungStatus } from "./result.js";

/** A size in a sentence: three significant digits, without an exponent where it reads well. */
export function size(value: number): string {
  const magnitude = Math.abs(value);
  if (magnitude === 0) return "0";
  if (magnitude >= 1e-3 && magnitude < 1e6) return plain(value, 3);
  return value.toExponential(2).replace("e+", "e");
}

/** A figure in a sentence, to the digits that its half-width leaves, and one more. */
export function figure(value: number, halfWidth: number): string {
  if (!(halfWidth > 0)) return plain(value, 8);
  if (Math.abs(value) <= halfWidth) return "0";
  const digits = Math.ceil(Math.log10(Math.abs(value))) - Math.floor(Math.log10(halfWidth)) + 1;
  return plain(value, Math.min(12, Math.max(3, digits)));
}

function plain(value: number, digits: number): string {
  const text = Number(value.toPrecision(digits));
  const magnitude = Math.abs(text);
  if (magnitude !== 0 && (magnitude < 1e-6 || magnitude >= 1e12)) return text.toExponential(digits - 1);
  const decimals = magnitude === 0 ? 0 : Math.max(0, digits - 1 - Math.floor(Math.log10(magnitude)));
  return text.toFixed(Math.min(decimals, 20));
}

/** The best value to the digits that it has, or as many as it takes to compare it with the claim. */
export function bestInWords(
  best: { readonly value: number; readonly halfWidth: number },
  claimed: { readonly halfWidth: number },
): string {
  return figure(best.value, Math.max(best.halfWidth, claimed.halfWidth / 20));
}

export const plural = (count: number, noun: string): string => `${count} ${noun}${count === 1 ? "" : "s"}`;

/** The parts of the budget, in words. */
export const BUDGET_WORDS: Readonly<Record<BudgetPart, string>> = {
  truncation: "truncation",
  rounding: "rounding",
  readingOff: "reading-off",
  methodSpread: "method spread",
  sampling: "sampling",
};

/** Steps an orbit in a sentence. */
export const steps = (perOrbit: number): string =>
  `${Number.isInteger(perOrbit) || perOrbit >= 100 ? Math.round(perOrbit) : perOrbit.toPrecision(3)} steps an orbit`;

/** How a run ended, after "its run". */
export const ENDINGS: Readonly<Record<RungStatus, string>> = {
  ok: "came to its end",
  escaped: "escaped: the orbit opened",
  "non-finite": "left the numbers: a state was infinite or not a number",
  "too-few-passages": "saw fewer than three periapsis passages",
  "timed-out": "did not reach its end in several times the steps that it should take",
  unconverged: "met an implicit step that did not converge to rounding",
};
