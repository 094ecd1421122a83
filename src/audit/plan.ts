/** The steps of a ladder, coarsest first, each half the last. */
export interface LadderPlan {
  /** s, or rad. */
  readonly steps: readonly number[];
  /** Index of the author's step; null for a claim without a solution. */
  readonly authors: number | null;
}

/** Coarser than 16 steps an orbit no method of the catalog has anything to say about an apsis. */
const COARSEST_PER_ORBIT = 16;
/** Halvings below the author's step: a first-order method gains a digit, a fourth-order one reaches rounding. */
const HALVINGS_BELOW = 4;
/** Steps an orbit to centre the ladder on, where the claim gives no solution. */
const DEFAULT_PER_ORBIT = 256;

/**
 * Lays the ladder round the author's step: down to `HALVINGS_BELOW` halvings, up to the coarsest that can
 * say anything, with at least `rungs` in all. Coarse rungs cost next to nothing; fine ones are left out
 * while the whole would cost more than `affordable` evaluations.
 *
 * @param period osculating period, s (2π in angle form)
 * @param cost evaluations that one rung of that many steps an orbit takes, over all methods
 */
export function planLadder(
  authorsStep: number | null,
  period: number,
  rungs: number,
  cost: (stepsPerOrbit: number) => number,
  affordable: number,
): LadderPlan {
  const step = authorsStep ?? period / DEFAULT_PER_ORBIT;
  const perOrbit = period / step;
  let coarser = 0;
  while (perOrbit / 2 ** (coarser + 1) >= COARSEST_PER_ORBIT) coarser++;
  let finer = Math.max(HALVINGS_BELOW, rungs - 1 - coarser);
  // All rungs together cost twice the finest.
  while (finer > 0 && 2 * cost(perOrbit * 2 ** finer) > affordable) finer--;
  while (coarser + finer + 1 < rungs && perOrbit / 2 ** (coarser + 1) >= 2) coarser++;
  const steps: number[] = [];
  for (let k = -coarser; k <= finer; k++) steps.push(step / 2 ** k);
  return { steps, authors: authorsStep === null ? null : coarser };
}

/**
 * A method of order p brings the error of a figure to rounding, some 1e-14, at about 4 · 10^(14/p) steps to an
 * orbit as tight as the periapsis; rungs beyond twice that show rounding alone.
 */
const DOWN_TO_ROUNDING = 8;

/**
 * Rungs of a witness's ladder: those that can show more than rounding, and at least `fewest`.
 *
 * @param order of the method
 */
export function rungsWorthRunning(
  { steps }: LadderPlan,
  order: number,
  { period, eccentricity }: { readonly period: number; readonly eccentricity: number },
  fewest: number,
): number {
  // By Kepler's third law the circle at the periapsis distance takes (1 - e)^(3/2) of the period.
  const most = (DOWN_TO_ROUNDING * 10 ** (14 / order)) / (1 - eccentricity) ** 1.5;
  const worth = steps.filter((step) => period / step <= most).length;
  return Math.min(steps.length, Math.max(fewest, worth));
}
