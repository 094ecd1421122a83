import type { LadderPoint } from "../../../src/convergence/differences.js";
import type { LadderTraits } from "../../../src/convergence/estimators/estimator.js";

/** A ladder whose limit is known. */
export interface Case {
  /** Where it comes from, for a message. */
  readonly label: string;
  readonly kind: string;
  readonly points: readonly LadderPoint[];
  readonly truth: number;
  readonly traits: LadderTraits;
}

/** The ladder as someone has it who stopped at each of several rungs; no fewer than `fewest` are left. */
export function cutShort(whole: Case, fewest: number): Case[] {
  const cases: Case[] = [];
  for (let length = whole.points.length; length >= fewest; length--) {
    cases.push({ ...whole, label: `${whole.label}, ${length} rungs`, points: whole.points.slice(0, length) });
  }
  return cases;
}
