import { median } from "simple-statistics";
import type { Estimate, LadderTraits } from "../../../src/convergence/estimators/estimator.js";
import { analyseLadder } from "../../../src/convergence/ladder.js";
import type { Case } from "./case.js";

/** How an estimator did on a set of ladders. */
export interface Score {
  /** Ladders that it gave a limit for. */
  readonly given: number;
  /** Share of those whose half-width reaches the truth. */
  readonly coverage: number;
  /** Median of half-width over true error, over those. */
  readonly tightness: number;
  /** The same without the limits at rounding: those whose true error is within the floor of the finest rung. */
  readonly tightnessAbove: number;
  /** Median of half-width over the error of the finest figure itself: what the whole procedure gains. */
  readonly gain: number;
  readonly missed: readonly Case[];
}

type Procedure = (points: Case["points"], traits: LadderTraits) => Estimate | null;

export function score(cases: readonly Case[], estimate: Procedure): Score {
  const ratios: number[] = [];
  const above: number[] = [];
  const gains: number[] = [];
  const missed: Case[] = [];
  for (const one of cases) {
    const found = estimate(one.points, one.traits);
    if (found === null) continue;
    const error = Math.abs(found.value - one.truth);
    const finest = one.points.findLast(({ value }) => value !== null)!;
    if (!(error <= found.halfWidth)) missed.push(one);
    ratios.push(found.halfWidth / error);
    gains.push(found.halfWidth / Math.abs(finest.value! - one.truth));
    if (error > finest.floor) above.push(found.halfWidth / error);
  }
  return {
    given: ratios.length,
    coverage: 1 - missed.length / ratios.length,
    tightness: median(ratios),
    tightnessAbove: above.length === 0 ? Number.NaN : median(above),
    gain: median(gains),
    missed,
  };
}

export const isAsymptotic = ({ points }: Case): boolean => analyseLadder(points).shape === "asymptotic";
