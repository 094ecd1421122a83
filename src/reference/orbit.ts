import {
  add,
  type DoubleDouble,
  divide,
  fromDouble,
  scale,
  shift,
  subtract,
  toDouble,
  ZERO,
} from "../arithmetic/double-double.js";
import { lessTurns } from "../arithmetic/elementary.js";
import { withoutInfinities } from "../kernel/precise-loop.js";
import type { CompiledSystem } from "../kernel/system.js";
import { ahead, senseOf, TURN } from "../measure/apsidal-angle.js";
import type { PreparedScenario } from "../measure/run.js";
import { preciseDirection } from "./directions.js";
import { extrapolationStepper } from "./extrapolation.js";
import { type PassagesEnd, type PrecisePassage, precisePassages } from "./passages.js";
import { radialMotion } from "./rates.js";
import type { PreciseState, Stepper, StepperOptions } from "./stepper.js";
import { taylorStepper } from "./taylor.js";

/** The two methods of a reference. No claim can name them: the reference is never the author's own method. */
export const referenceMethods = ["extrapolation", "taylor"] as const;
export type ReferenceMethod = (typeof referenceMethods)[number];

export const referenceSource =
  "A. Jorba and M. Zou, Exp. Math. 14, 99 (2005), for the Taylor series; W. B. Gragg, SIAM J. Numer. Anal. 2, 384 (1965), for the extrapolation; M. Joldes, J.-M. Muller and V. Popescu, ACM Trans. Math. Softw. 44, 15 (2017), for the arithmetic";

const steppers: Readonly<
  Record<ReferenceMethod, (system: CompiledSystem, options: StepperOptions) => Stepper>
> = { extrapolation: extrapolationStepper, taylor: taylorStepper };

/** An orbit followed in double-double arithmetic. */
export interface PreciseOrbit {
  readonly end: PassagesEnd | "too-few-passages";
  /** In words. */
  readonly method: string;
  /** rad an orbit, and mean radial period in s or rad: slopes on the passage number. Null without three passages. */
  readonly advance: DoubleDouble | null;
  readonly period: DoubleDouble | null;
  readonly passages: number;
  readonly evaluations: number;
}

/** First step as a part of the period: the circle at periapsis distance, in so many steps. */
const FIRST_STEPS = 32;
/** As far back as a step is read as turned when it goes backwards, rad; all else is forwards. */
const BACKWARDS = TURN / 8;
const FEWEST_PASSAGES = 3;

/**
 * Follows a scenario over its span.
 *
 * @param tolerance of a step, as a part of position and velocity
 * @param most evaluations
 */
export function preciseOrbit(
  method: ReferenceMethod,
  system: CompiledSystem,
  scenario: PreparedScenario,
  given: readonly DoubleDouble[],
  tolerance: number,
  most: number,
): PreciseOrbit {
  const parameters = withoutInfinities(given);
  const stepper = steppers[method](system, {
    state: scenario.precise.state,
    parameters,
    tolerance,
    firstStep: (scenario.period * (1 - scenario.eccentricity) ** 1.5) / FIRST_STEPS,
  });
  const { apsidalAngle: kind } = scenario;
  const sense = senseOf(scenario.state, system.states.length);
  const swept = (from: PreciseState, to: PreciseState, length: number): number => {
    if (kind === "polar") return length;
    const turned = ahead(kind, sense, from.map(toDouble), to.map(toDouble));
    return turned < -BACKWARDS ? turned + TURN : turned;
  };
  const motion = radialMotion(system, parameters);
  const { passages, end } = precisePassages(stepper, motion, scenario, swept, most);
  const few = passages.length < FEWEST_PASSAGES;
  const advances = few ? [] : advancesOf(kind, sense, passages);
  return {
    end: few && end === "done" ? "too-few-passages" : end,
    method: stepper.name,
    advance: few ? null : slope(advances),
    period: few ? null : slope(passages.map(({ time }) => time)),
    passages: passages.length,
    evaluations: stepper.evaluations,
  };
}

/** Apsidal angle at each passage less the first and less a whole turn a passage, rad. */
function advancesOf(
  kind: PreparedScenario["apsidalAngle"],
  sense: 1 | -1,
  passages: readonly PrecisePassage[],
): DoubleDouble[] {
  const first = passages[0]!;
  if (kind === "polar") return passages.map(({ time }, k) => lessTurns(subtract(time, first.time), k));
  const start = preciseDirection(kind, sense, first.state);
  return passages.map(({ state, swept }, k) => {
    const direction = subtract(preciseDirection(kind, sense, state), start);
    const turns = Math.round((swept - first.swept - toDouble(direction)) / TURN);
    return lessTurns(direction, k - turns);
  });
}

/** Least-squares slope on 0, 1, 2, ..., centred. */
function slope(values: readonly DoubleDouble[]): DoubleDouble {
  const n = values.length;
  let sum = ZERO;
  // Twice the distance from the middle is whole.
  values.forEach((value, k) => {
    sum = add(sum, scale(value, 2 * k - (n - 1)));
  });
  return divide(shift(sum, 2), fromDouble((n * (n * n - 1)) / 3));
}
