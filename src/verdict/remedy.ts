import type { Ladder, Remedy, RemedyOption } from "../result/result.js";
import { size } from "../result/words.js";
import { type Evidence, solutionError } from "./evidence.js";
import { concise } from "./quote.js";

/** The margin that a quote needs for its numerical error: a claim is carried by a third of it. */
const TIMES = 3;
/** Steps that the fitted law asks for are raised by so much: the law is fitted, not exact. */
const RESERVE = 1.1;
/** Beyond the finest rung the law is followed by so many halvings at most. */
const FARTHEST = 2 ** 6;

/** The cheapest step of each method that would carry the quoted digits, and the quote that today's carries. */
export function remedy(evidence: Evidence): Remedy | null {
  const { best, claimed, ladders, solution } = evidence;
  if (best === null) return null;
  const target = claimed.halfWidth / TIMES;
  const found = ladders.flatMap((ladder) => {
    const need = leastSteps(ladder, best, target);
    return need === null ? [] : [{ ladder, ...need, evaluations: evaluations(ladder, need.stepsPerOrbit) }];
  });
  const today = solution === null ? null : ladders[0]!.rungs[solution.rung]!.evaluations;
  const reference = today || Math.min(...found.map((option) => option.evaluations));
  const options = found
    .map(
      ({ ladder, stepsPerOrbit, basis, evaluations: cost }): RemedyOption => ({
        method: ladder.method,
        step: evidence.writeStep(stepsPerOrbit),
        stepsPerOrbit,
        relativeCost: cost / reference,
        basis,
      }),
    )
    .sort((a, b) => a.relativeCost - b.relativeCost);
  const restated = restate(evidence);
  return { restated, options, says: sentence(evidence, options[0], restated, target) };
}

interface Need {
  readonly stepsPerOrbit: number;
  readonly basis: RemedyOption["basis"];
}

/**
 * Fewest steps an orbit with an error of at most the target. All finer rungs must keep to it too, so that a
 * lucky zero of the error on a coarse rung is not offered.
 */
function leastSteps(ladder: Ladder, best: NonNullable<Evidence["best"]>, target: number): Need | null {
  const { rungs, coefficient, figureOrder, floor } = ladder;
  const carried = rungs.map(
    ({ figure }) => figure !== null && Math.abs(figure - best.value) + best.halfWidth <= target,
  );
  let first = rungs.length;
  while (first > 0 && carried[first - 1]) first--;
  const left = target - best.halfWidth;
  const law =
    coefficient === null || figureOrder === null || !(left > 0)
      ? null
      : Math.ceil(RESERVE * (coefficient / left) ** (1 / figureOrder));
  if (first < rungs.length) {
    const measured = rungs[first]!.stepsPerOrbit;
    const coarser = rungs[first - 1]?.stepsPerOrbit ?? measured;
    // Between a rung that fails and one that does not, the law says where.
    if (law !== null && law > coarser && law < measured) return { stepsPerOrbit: law, basis: "fitted" };
    return { stepsPerOrbit: measured, basis: "measured" };
  }
  const finest = rungs.at(-1)!.stepsPerOrbit;
  if (law === null || law <= finest || law > FARTHEST * finest) return null;
  // Rounding grows as the square root of the number of steps, and must leave room for the rest.
  const rounding = (floor ?? 0) * Math.sqrt(law / finest);
  return rounding <= left / 2 ? { stepsPerOrbit: law, basis: "fitted" } : null;
}

/** Evaluations of a run of so many steps an orbit, in proportion to those of the nearest rung. */
function evaluations({ rungs }: Ladder, stepsPerOrbit: number): number {
  const off = (perOrbit: number): number => Math.abs(Math.log(perOrbit / stepsPerOrbit));
  const nearest = rungs.reduce((best, rung) =>
    off(rung.stepsPerOrbit) < off(best.stepsPerOrbit) ? rung : best,
  );
  return (nearest.evaluations * stepsPerOrbit) / nearest.stepsPerOrbit;
}

function restate(evidence: Evidence): string | null {
  const error = solutionError(evidence);
  if (error === null) return null;
  const value = evidence.solution!.value!;
  const halfWidth = TIMES * error.bound;
  // A value within twice its margin of zero carries no digit.
  return halfWidth <= Math.abs(value) / 2 ? `${concise(value, halfWidth)} ${evidence.claimed.unit}` : null;
}

function sentence(
  { claimed, solution }: Evidence,
  cheapest: RemedyOption | undefined,
  restated: string | null,
  target: number,
): string {
  const carry = `The quoted margin asks for a numerical error of at most ${size(target)} ${claimed.unit}`;
  const offer =
    cheapest === undefined
      ? `${carry}; no method tried reaches it above rounding.`
      : `${carry}; cheapest is ${cheapest.method} at ${Math.round(cheapest.stepsPerOrbit)} steps an orbit${solution === null ? "" : `, ${size(cheapest.relativeCost)} times the evaluations of today's run`}.`;
  if (solution === null) return offer;
  return `${offer} ${restated === null ? "Today's solution carries no digit of it." : `Today's solution carries ${restated}.`}`;
}
