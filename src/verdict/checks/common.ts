import type { Check, CheckName, Outcome } from "../../result/result.js";

/** The part of a limit that a check must leave unused for the best grade. */
export const MARGIN = 0.1;

/** A check that asks for a figure no larger than a limit. */
export function atMost(name: CheckName, figure: number, limit: number, unit: string, says: string): Check {
  return { name, outcome: figure <= limit ? "pass" : "fail", figure, limit, unit, says };
}

export function check(
  name: CheckName,
  outcome: Outcome,
  says: string,
  figure: number | null = null,
  limit: number | null = null,
  unit = "",
): Check {
  return { name, outcome, figure, limit, unit, says };
}

export const notChecked = (name: CheckName, says: string): Check => check(name, "not-checked", says);

export const NO_SOLUTION = "The claim gives no solution to check.";
export const NO_BEST = "No value to compare with: the ladders do not bound the figure.";
