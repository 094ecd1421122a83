import { type DoubleDouble, divide, fromDouble, ONE, shift, toDouble } from "../arithmetic/double-double.js";
import type { CompiledSystem } from "../kernel/system.js";
import { radialMotion, scales } from "./rates.js";
import { SeriesTable } from "./series.js";
import { type PreciseState, type Stepper, type StepperOptions, trackFrom } from "./stepper.js";
import { type TaylorProgram, taylorProgram } from "./taylor-program.js";

/** Order of the series for a tolerance: half its natural logarithm and one more (Jorba and Zou, 3.3.2), a few over. */
const orderFor = (tolerance: number): number => Math.ceil(-Math.log(tolerance) / 2) + 3;
const SAFETY = 0.9;
/** Products of coefficients that take as long as one evaluation of the right-hand side in double-double. */
const PRODUCTS_AN_EVALUATION = 30;

const powerOfTwoNear = (value: number): number => 2 ** Math.round(Math.log2(value));

const programs = new WeakMap<CompiledSystem, TaylorProgram>();
function programOf(system: CompiledSystem): TaylorProgram {
  let known = programs.get(system);
  if (known === undefined) {
    known = taylorProgram(system);
    programs.set(system, known);
  }
  return known;
}

/**
 * Taylor series of the solution, its coefficients by recurrence from the expression graph; each step as long as
 * the last two terms allow (A. Jorba and M. Zou, Experimental Mathematics 14 (2005) 99).
 */
export function taylorStepper(system: CompiledSystem, options: StepperOptions): Stepper {
  const { parameters, tolerance } = options;
  const program = programOf(system);
  const order = orderFor(tolerance);
  const reciprocals = program.slots;
  const table = new SeriesTable(program.slots + 1, order);
  const inverses = Array.from({ length: order }, (_, k) => divide(ONE, fromDouble(k + 1)));
  const n = system.states.length;
  const half = n / 2;
  const motion = radialMotion(system, parameters);
  const perStep = (program.recurrences.length * order * order) / 2 / PRODUCTS_AN_EVALUATION;
  for (const [slot, value] of program.constants(parameters)) table.set(slot, 0, value);
  const track = trackFrom(options.state, (state) => toDouble(motion.rate(state)));
  /** Unit of time of the series, near the length of a step: coefficients neither over- nor underflow. */
  let unit = 1;
  let last = options.firstStep;

  const expand = (from: PreciseState): void => {
    unit = powerOfTwoNear(last);
    // In units of `unit`, a power of two: x_(k+1) = unit v_k / (k + 1).
    inverses.forEach((inverse, k) => {
      table.set(reciprocals, k + 1, shift(inverse, unit));
    });
    from.forEach((value, i) => {
      table.set(program.states[i]!, 0, value);
    });
    for (let k = 0; k < order; k++) {
      for (const next of program.recurrences) next(table, k);
      for (let i = 0; i < half; i++) {
        const [q, v] = [program.states[i]!, program.states[half + i]!];
        table.integrate(q, k, v, reciprocals);
        table.integrate(v, k, program.accelerations[i]!, reciprocals);
      }
    }
    track.evaluations += perStep;
  };
  const sizeOf = (k: number, first: number, last: number): number => {
    let square = 0;
    for (let i = first; i < last; i++) square += table.size(program.states[i]!, k) ** 2;
    return Math.sqrt(square);
  };
  const at = (length: DoubleDouble): PreciseState => {
    const part = shift(length, 1 / unit);
    return program.states.map((slot) => table.evaluate(slot, part));
  };

  return Object.assign(track, {
    name: `Taylor series of order ${order}`,
    within: at,
    step() {
      expand(track.state);
      const [position, velocity] = scales(system, track.state);
      let most = Number.POSITIVE_INFINITY;
      for (const k of [order - 1, order]) {
        const term = Math.max(sizeOf(k, 0, half) / position, sizeOf(k, half, n) / velocity);
        most = Math.min(most, (tolerance / term) ** (1 / k));
      }
      const length: DoubleDouble = { high: SAFETY * most * unit, low: 0 };
      if (!(Number.isFinite(length.high) && length.high > 0)) return null;
      last = length.high;
      track.moveTo(at(length));
      return length;
    },
  });
}
