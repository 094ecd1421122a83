import type { StepLoop } from "../kernel/step-loop.js";
import { findRoot } from "./root.js";
import { allFinite, distance, type Form, ioAt, radialRateAt } from "./stepping.js";

/** A start at periapsis that depends on one number: the speed there, or GM/h² in angle form. */
export interface Shot {
  readonly state: readonly number[];
  readonly parameters: Float64Array;
}

/** An orbit that climbs to four times the wanted apoapsis has overshot it: no need to see it turn. */
const OVERSHOT = 4;
/** Halving the step must leave the apoapsis within this part of itself: rounding, not truncation, is left. */
const SETTLED = 1e-12;
/** The step may be halved so often before that; an eighth-order loop gains over two digits each time. */
const MOST_HALVINGS = 6;
/** How far off the Newtonian value may be, as a part of it: at first, doubled until a root is bracketed, at last. */
const FIRST_REACH = 1 / 1024;
const LAST_REACH = 4;

/**
 * How far the next apoapsis of a start at periapsis is from the wanted one, as 1 - wanted/reached: negative
 * when it falls short, 1 when the orbit does not come back.
 */
function overshoot(loop: StepLoop, form: Form, shot: Shot, apoapsis: number, step: number): number {
  const n = loop.dimension;
  const io = ioAt(loop, shot.state);
  const trial = new Float64Array(loop.ioLength);
  for (let before = 0; ; before = io[radialRateAt(loop)]!) {
    loop.advance(io, shot.parameters, step, 1);
    // A plunge into the centre falls short of every apoapsis.
    if (!allFinite(io, n)) return -1;
    const rate = io[radialRateAt(loop)]!;
    if (rate < 0) {
      const rateAfter = (length: number): number => {
        trial.set(io.subarray(n, 2 * n));
        loop.advance(trial, shot.parameters, length, 1);
        return trial[radialRateAt(loop)]!;
      };
      // A start that falls in at once was itself an apoapsis.
      rateAfter(before > 0 ? findRoot(rateAfter, 0, before, step, rate) : 0);
      return 1 - apoapsis / distance(form, trial, n);
    }
    const r = distance(form, io, n);
    if (!(r > 0 && r < OVERSHOT * apoapsis)) return 1;
  }
}

/**
 * Finds the number that takes a start at periapsis to the wanted apoapsis under the equations' own motion,
 * by shooting: a bracket round the Newtonian value, then a root search to rounding, then the same with
 * halved steps until the step no longer shows.
 *
 * @param loop of high order, at the equations in full
 * @param guess the Newtonian value
 * @param step resolves the periapsis
 * @returns null when no such orbit is found
 */
export function shootForApoapsis(
  loop: StepLoop,
  form: Form,
  shotFrom: (value: number) => Shot,
  guess: number,
  apoapsis: number,
  step: number,
): number | null {
  let value = guess;
  for (let h = step, halvings = 0; halvings <= MOST_HALVINGS; h /= 2, halvings++) {
    const miss = (x: number): number => overshoot(loop, form, shotFrom(x), apoapsis, h);
    const missed = miss(value);
    if (halvings > 0 && Math.abs(missed) <= SETTLED) return value;
    const bracket = bracketRoot(miss, value, missed);
    if (bracket === null) return null;
    value = findRoot(miss, ...bracket);
  }
  return null;
}

function bracketRoot(
  f: (x: number) => number,
  centre: number,
  fCentre: number,
): [number, number, number, number] | null {
  if (fCentre === 0) return [centre, 0, centre, 0];
  for (let reach = FIRST_REACH; reach <= LAST_REACH; reach *= 2) {
    for (const x of [centre * (1 + reach), centre / (1 + reach)]) {
      const fx = f(x);
      if (fx > 0 !== fCentre > 0) return [centre, fCentre, x, fx];
    }
  }
  return null;
}
