import { mean } from "simple-statistics";
import type { QuotedUnit } from "../claim/claim.js";
import { type Difference, isClear, type LadderPoint } from "../convergence/differences.js";
import { analyseLadder, type LadderAnalysis } from "../convergence/ladder.js";
import { roundingHalfWidth } from "../convergence/rounding.js";
import { type StateOrder, stateOrder } from "../convergence/state-order.js";
import { EARLY_ORBITS, stateDistance } from "../measure/early-state.js";
import type { PreparedScenario } from "../measure/run.js";
import { figureOf } from "./figure.js";
import type { Reading } from "./job.js";
import type { MethodRuns } from "./method-runs.js";
import { passageShares, withShares } from "./passage-share.js";
import { roundingGrowth } from "./rounding.js";

/** One method's ladder, analysed; figures in the claim's unit. */
export interface AnalysedLadder {
  readonly runs: MethodRuns;
  /** A rung's raw figure, its null run's, and the one that the claim is about. */
  readonly raw: readonly LadderPoint[];
  readonly off: readonly LadderPoint[];
  readonly figure: readonly LadderPoint[];
  /** Of the figure that the claim is about. */
  readonly analysis: LadderAnalysis;
  readonly stateDistances: readonly Difference[];
  readonly stateOrder: StateOrder | null;
}

/**
 * Analyses what was run with one method.
 *
 * A subtracted figure is the difference of two that each converge on their own. Its ladder is seldom
 * monotone, since the phase of the partial step shifts between the two runs; so its window and order are
 * those of the run and its null run, and its limit is the tighter of the difference of their limits and the
 * limit of the differences.
 */
export function analyseRuns(
  runs: MethodRuns,
  scenario: PreparedScenario,
  unit: QuotedUnit,
  subtracted: boolean,
): AnalysedLadder {
  const push = coefficientPush(runs, scenario, unit);
  const raw = points(runs, unit, push, (on) => on);
  const off = points(runs, unit, push, (_, off) => off);
  const difference = differencePoints(runs, unit, push);
  const figure = subtracted ? difference : raw;
  const rungs = runs.rungs.map(({ step }) => ({ step, perOrbit: scenario.period / step }));
  const shares = (ladder: readonly LadderPoint[], of: "on" | "off") =>
    passageShares(
      ladder,
      runs.rungs.map((rung) => rung[of]),
      rungs,
      runs.method.order,
    );
  const [ofRaw, ofOff] = [shares(raw, "on"), shares(off, "off")];
  const analyse = (ladder: readonly LadderPoint[], ...shares: readonly (readonly number[])[]) =>
    analyseLadder(withShares(ladder, ...shares));
  const analysis = subtracted
    ? subtractedAnalysis(analyse(raw, ofRaw), analyse(off, ofOff), analyse(figure, ofRaw, ofOff))
    : analyse(raw, ofRaw);
  const stateDistances = distances(runs, scenario);
  return {
    runs,
    raw,
    off,
    figure,
    analysis,
    stateDistances,
    stateOrder: stateOrder(stateDistances),
  };
}

function points(
  runs: MethodRuns,
  unit: QuotedUnit,
  push: number,
  pick: (on: Reading | null, off: Reading | null) => Reading | null,
): LadderPoint[] {
  return withFloor(runs, push, (on, off) => figureOf(pick(on, off), unit));
}

function differencePoints(runs: MethodRuns, unit: QuotedUnit, push: number): LadderPoint[] {
  const difference = (on: Reading | null, off: Reading | null): number | null => {
    const [value, base] = [figureOf(on, unit), figureOf(off, unit)];
    return value === null || base === null ? null : value - base;
  };
  return withFloor(runs, push, difference);
}

/**
 * What coefficients rounded to doubles may do to the advance, in the claim's unit. They push every step, and
 * every member of an ensemble, the same way: by a unit of the last place of the increments, which add up to 2π
 * times the state in each orbit; and a push across the orbit turns the apsis by 1/e times as much. In single
 * precision the run in doubles shows what they do.
 */
function coefficientPush(
  { arithmetic }: MethodRuns,
  { eccentricity, period }: PreparedScenario,
  unit: QuotedUnit,
): number {
  if (arithmetic === "single") return 0;
  const perOrbit = (2 * Math.PI * Number.EPSILON) / eccentricity / unit.radians;
  return unit.per === "orbit" ? perOrbit : (perOrbit * unit.per) / period;
}

/**
 * What rounding does to each rung's figure. Its random part is the spread of the ensemble, its common part how
 * far the ensemble's mean is from the run that rounds less. What walks at random grows as the square root of the
 * number of steps (D. Brouwer, A. J. 46, 149, 1937), what pushes one way as the number itself: the members'
 * growth in time says which. On rungs coarser than the ensemble's it is not taken to be less.
 */
function withFloor(
  runs: MethodRuns,
  push: number,
  figure: (on: Reading | null, off: Reading | null) => number | null,
): LadderPoint[] {
  const { ensemble, rungs } = runs;
  const members = ensemble.on.map((on, i) => figure(on, ensemble.off[i] ?? null));
  const spread = roundingHalfWidth(members) ?? 0;
  const common = commonRounding(members, figure(ensemble.lessRounded.on, ensemble.lessRounded.off));
  const exponent = roundingGrowth(ensemble);
  const growth = (k: number) => Math.max(1, 2 ** ((k - ensemble.rung) * exponent));
  return rungs.map(({ on, off }, k) => ({
    value: figure(on, off),
    floor: Math.hypot(push, Math.hypot(spread, common) * growth(k)),
  }));
}

function commonRounding(members: readonly (number | null)[], lessRounded: number | null): number {
  const given = members.filter((figure) => figure !== null);
  return lessRounded === null || given.length === 0 ? 0 : Math.abs(mean(given) - lessRounded);
}

function subtractedAnalysis(
  raw: LadderAnalysis,
  off: LadderAnalysis,
  difference: LadderAnalysis,
): LadderAnalysis {
  const direct = difference.limit;
  const apart =
    raw.limit === null || off.limit === null
      ? null
      : { value: raw.limit.value - off.limit.value, halfWidth: raw.limit.halfWidth + off.limit.halfWidth };
  const limit = direct === null || (apart !== null && apart.halfWidth < direct.halfWidth) ? apart : direct;
  const window = sharedWindow(raw, off);
  if (difference.shape === "asymptotic" && difference.window !== null) {
    // Coarser than its own law holds the difference still converges where both runs do.
    const [from, to] = difference.window;
    return { ...difference, window: [Math.min(from, window?.[0] ?? from), to], limit };
  }
  if (window === null) return { ...difference, limit };
  return { shape: raw.shape, order: raw.order, orderInterval: raw.orderInterval, window, limit };
}

/** The rungs on which two ladders both converge; two coarse windows that do not overlap leave none. */
function sharedWindow(one: LadderAnalysis, other: LadderAnalysis): readonly [number, number] | null {
  if (one.window === null || other.window === null) return null;
  const from = Math.max(one.window[0], other.window[0]);
  const to = Math.min(one.window[1], other.window[1]);
  return from > to ? null : [from, to];
}

/**
 * Rounded coefficients push every step, and every member of an ensemble, the same way: by a unit of the last
 * place of the increments of coordinates and rates, which add up to 2π times the state in each orbit.
 */
const PUSH = 2 * 2 * Math.PI * EARLY_ORBITS * Number.EPSILON;

/** Distances of successive early states by rung; those coarser than the ladder have negative ones. */
function distances(runs: MethodRuns, scenario: PreparedScenario): Difference[] {
  const { coarserEarly, finerEarly } = runs;
  const states = [...coarserEarly, ...runs.rungs.map((rung) => rung.early), ...finerEarly];
  const centre = runs.rungs[runs.ensemble.rung]?.early ?? null;
  const members = runs.ensemble.early.filter((state) => state !== null);
  const spread =
    centre === null || members.length === 0
      ? 0
      : Math.max(...members.map((state) => stateDistance(scenario, state, centre)));
  const result: Difference[] = [];
  for (let k = 0; k + 1 < states.length; k++) {
    const [coarse, fine] = [states[k]!, states[k + 1]!];
    const rung = k - coarserEarly.length;
    if (coarse === null || fine === null) {
      result.length = 0;
      continue;
    }
    const value = stateDistance(scenario, coarse, fine);
    const noise = Math.hypot(PUSH, spread * Math.max(1, 2 ** ((rung + 1 - runs.ensemble.rung) / 2)));
    result.push({ rung, value, noise, clear: isClear(value, noise) });
  }
  return result;
}
