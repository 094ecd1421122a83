import type { StepLoop } from "../kernel/step-loop.js";
import type { RungStatus } from "../result/result.js";
import { TURN } from "./apsidal-angle.js";
import { hasEscaped } from "./escape.js";
import { type RunLimits, runLimits } from "./limits.js";
import { findRoot } from "./root.js";
import type { PreparedScenario, Run } from "./run.js";
import { allFinite, evaluationsAt, ioAt, radialRate, radialRateAt, unconvergedAt } from "./stepping.js";
import { tabulate } from "./tabulate.js";
import { Sweep } from "./turns.js";

/** A periapsis passage: whole steps from the start, the partial step after them, the state there. */
export interface Passage {
  readonly steps: number;
  readonly rest: number;
  readonly state: readonly number[];
}

/** Fewer give no slope with an error. */
const FEWEST_PASSAGES = 3;

/**
 * A passage within a quarter turn of a start at periapsis is the start itself, seen late: a coarse step
 * puts the periapsis of its own orbit a little further on. No attraction brings a periapsis back so soon.
 */
const LATE_START = TURN / 4;

/**
 * Runs one scenario at one step and finds its periapsis passages.
 *
 * A passage is where the radial rate turns from negative to zero or more. Between the two bracketing steps
 * it is found with partial steps of the same method from the bracket's start (after M. Hénon, Physica D 5
 * (1982) 412, with a root search in place of his change of variable), so that locating it costs no order.
 *
 * @param parameters the scenario's own, or its null parameters
 * @param step s, or rad in angle form
 */
export function runPassages(
  loop: StepLoop,
  scenario: PreparedScenario,
  parameters: readonly number[],
  step: number,
  limits: RunLimits = runLimits(scenario, step),
): Run {
  const began = performance.now();
  const { passages, firstSweep, taken, evaluations, end } = findPassages(
    loop,
    scenario,
    Float64Array.from(parameters),
    step,
    limits,
  );
  const few = passages.length < FEWEST_PASSAGES && (end === "ok" || end === "timed-out");
  return {
    status: few ? "too-few-passages" : end,
    ...tabulate(scenario, loop.dimension, passages, firstSweep, step),
    steps: taken,
    evaluations,
    seconds: (performance.now() - began) / 1000,
  };
}

interface Found {
  readonly passages: readonly Passage[];
  /** Angle swept over the first whole orbit, rad; null in angle form or where no orbit was whole. */
  readonly firstSweep: number | null;
  readonly taken: number;
  readonly evaluations: number;
  readonly end: RungStatus;
}

function findPassages(
  loop: StepLoop,
  scenario: PreparedScenario,
  parameters: Float64Array,
  step: number,
  limits: RunLimits,
): Found {
  const n = loop.dimension;
  const { span, apsidalAngle, startsAtPeriapsis } = scenario;
  const form = apsidalAngle === "polar" ? "angle" : "time";
  const passages: Passage[] = [];
  const wanted = span.kind === "orbits" ? span.count + (startsAtPeriapsis ? 1 : 0) : Infinity;
  const lastStep = span.kind === "length" ? Math.ceil(span.length / step) : Infinity;
  // Whether the last step of a full call saw a passage is told by the rates at its two ends, which within
  // a quarter of an orbit cannot turn twice.
  const quarter = Math.max(1, Math.floor(scenario.period / step / 4));

  const io = ioAt(loop, scenario.state);
  const trial = new Float64Array(loop.ioLength);
  let taken = 0;
  let evaluations = 0;
  let firstSweep: number | null = null;
  const sweeping: { now: Sweep | null } = { now: null };

  const note = (passage: Passage): void => {
    passages.push(passage);
    if (form === "angle") return;
    if (passages.length === 2) firstSweep = sweeping.now!.angle;
    sweeping.now = passages.length === 1 ? new Sweep(scenario, n, passage.state) : null;
  };
  const partialStep = (length: number): number => {
    trial.set(io.subarray(n, 2 * n));
    loop.advance(trial, parameters, length, 1);
    evaluations += trial[evaluationsAt(loop)]!;
    return trial[radialRateAt(loop)]!;
  };
  const finish = (end: RungStatus): Found => ({ passages, firstSweep, taken, evaluations, end });

  if (startsAtPeriapsis) note({ steps: 0, rest: 0, state: scenario.state });
  else io[radialRateAt(loop)] = radialRate(form, io, n);

  while (passages.length < wanted && taken < lastStep) {
    const left = Math.min(limits.steps, lastStep) - taken;
    if (left <= 0 || evaluations >= (limits.evaluations ?? Infinity)) return finish("timed-out");
    const asked = Math.min(left, sweeping.now === null ? quarter : 1);
    const rateBefore = io[radialRateAt(loop)]!;
    const done = loop.advance(io, parameters, step, asked);
    const rate = io[radialRateAt(loop)]!;
    taken += done;
    evaluations += io[evaluationsAt(loop)]!;
    if (io[unconvergedAt(loop)] !== 0) return finish("unconverged");
    if (!allFinite(io, n)) return finish("non-finite");
    const before = done === 1 ? rateBefore : radialRate(form, io, n, n);
    const stopped = done > 1 && done < asked;
    if (rate >= 0 && (stopped || rateBefore < 0 || before < 0)) {
      // Zero to rounding at the bracket's start leaves nothing to search.
      const rest = before < 0 ? findRoot(partialStep, 0, before, step, rate) : 0;
      partialStep(rest);
      if (trial[unconvergedAt(loop)] !== 0) return finish("unconverged");
      if (!allFinite(trial, n)) return finish("non-finite");
      const steps = taken - 1;
      if (span.kind === "length" && steps * step + rest > span.length) break;
      sweeping.now?.add(trial);
      const swept = form === "angle" ? steps * step + rest : (sweeping.now?.angle ?? Infinity);
      const late = startsAtPeriapsis && passages.length === 1 && swept < LATE_START;
      if (!late) note({ steps, rest, state: Array.from(trial.subarray(0, n)) });
    }
    sweeping.now?.add(io);
    if (hasEscaped(form, scenario, io, n)) return finish("escaped");
  }
  return finish("ok");
}
