import { add, type DoubleDouble, subtract, toDouble, ZERO } from "../arithmetic/double-double.js";
import type { PreparedScenario } from "../measure/run.js";
import type { RadialMotion } from "./rates.js";
import type { PreciseState, Stepper } from "./stepper.js";

/** A periapsis passage: the independent variable since the start, the state there, and the angle swept to it. */
export interface PrecisePassage {
  readonly time: DoubleDouble;
  readonly state: PreciseState;
  /** rad, to a small part of a turn: tells how many whole turns there were. */
  readonly swept: number;
}

export type PassagesEnd = "done" | "lost" | "too-dear";

/** A start at periapsis is passage 0; what is seen within a quarter turn after it is the start again. */
const LATE_START = Math.PI / 2;
/** A root is found when a correction is so small a part of the step, two bits above what the arithmetic holds. */
const SETTLED = 2 ** -100;
/** Corrections are as good as the slope, a double: each gains fifteen digits once the first few are there. */
const MOST_CORRECTIONS = 12;

/**
 * Follows the orbit over its span and finds its periapsis passages, with partial steps of the same method.
 *
 * @param angle that a step sweeps, rad
 * @param most evaluations
 */
export function precisePassages(
  stepper: Stepper,
  motion: RadialMotion,
  { span, startsAtPeriapsis }: Pick<PreparedScenario, "span" | "startsAtPeriapsis">,
  angle: (from: PreciseState, to: PreciseState, length: number) => number,
  most: number,
): { readonly passages: readonly PrecisePassage[]; readonly end: PassagesEnd } {
  const passages: PrecisePassage[] = [];
  const wanted = span.kind === "orbits" ? span.count + (startsAtPeriapsis ? 1 : 0) : Infinity;
  let time = ZERO;
  let swept = 0;
  if (startsAtPeriapsis) passages.push({ time, state: stepper.state, swept });
  while (passages.length < wanted) {
    if (stepper.evaluations > most) return { passages, end: "too-dear" };
    const length = stepper.step();
    if (length === null) return { passages, end: "lost" };
    if (stepper.rateBefore < 0 && stepper.rate >= 0) {
      const found = locate(stepper, motion, length);
      if (found === null) return { passages, end: "lost" };
      const at = add(time, found.length);
      if (span.kind === "length" && toDouble(at) > span.length) break;
      const sweptThere = swept + angle(stepper.before, found.state, toDouble(found.length));
      const late = startsAtPeriapsis && passages.length === 1 && sweptThere < LATE_START;
      if (!late) passages.push({ time: at, state: found.state, swept: sweptThere });
    }
    swept += angle(stepper.before, stepper.state, toDouble(length));
    time = add(time, length);
    if (span.kind === "length" && toDouble(time) > span.length) break;
  }
  return { passages, end: "done" };
}

/** Newton's method on the radial rate within the last step, kept inside it. */
function locate(
  stepper: Stepper,
  motion: RadialMotion,
  whole: DoubleDouble,
): { readonly length: DoubleDouble; readonly state: PreciseState } | null {
  const { rateBefore, rate } = stepper;
  let low = 0;
  let high = whole.high;
  let length: DoubleDouble = { high: (whole.high * rateBefore) / (rateBefore - rate), low: 0 };
  for (let k = 0; k < MOST_CORRECTIONS; k++) {
    const state = stepper.within(length);
    const left = motion.rate(state);
    if (left.high < 0) low = length.high;
    else high = length.high;
    const slope = motion.rateOfRate(state);
    const correction: DoubleDouble = { high: left.high / slope, low: left.low / slope };
    let next = subtract(length, correction);
    if (!(next.high >= low && next.high <= high)) next = { high: (low + high) / 2, low: 0 };
    if (Math.abs(correction.high) <= SETTLED * whole.high) return { length: next, state };
    length = next;
  }
  // A double zero of the rate, or one at the end of the step, is found no better.
  const state = stepper.within(length);
  return Number.isFinite(toDouble(motion.rate(state))) ? { length, state } : null;
}
