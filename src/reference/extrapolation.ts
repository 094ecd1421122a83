import Fraction from "fraction.js";
import {
  type DoubleDouble,
  fromFraction,
  scale,
  subtract,
  toDouble,
  ZERO,
} from "../arithmetic/double-double.js";
import { writeMidpoint } from "../kernel/modified-midpoint.js";
import { compilePrecise, type PreciseFunction } from "../kernel/precise-loop.js";
import type { CompiledSystem } from "../kernel/system.js";
import { radialMotion, scales } from "./rates.js";
import { SeriesTable } from "./series.js";
import { type PreciseState, type Stepper, type StepperOptions, trackFrom } from "./stepper.js";

/** Rows of the extrapolation tableau for a digit of tolerance: order 2 k for 10^-(1.5 k). */
const DIGITS_A_ROW = 1.5;
const FEWEST_ROWS = 6;
const MOST_ROWS = 14;
const SAFETY = 0.8;
const MOST_GROWTH = 4;
const MOST_SHRINKAGE = 8;
/** A step that is refused so often in a row will not be found. */
const MOST_REFUSALS = 40;

/**
 * Weights of the rows 2, 4, 6, ... steps that cancel all even powers of the step but the last: those of the
 * Lagrange polynomials in h² at 0 (Hairer, Nørsett and Wanner, Solving Ordinary Differential Equations I
 * (1993), II.9), exact.
 */
function weights(rows: readonly number[]): DoubleDouble[] {
  return rows.map((own) =>
    fromFraction(
      rows.reduce(
        (product, other) =>
          other === own ? product : product.mul(new Fraction(own * own, own * own - other * other)),
        new Fraction(1),
      ),
    ),
  );
}

const compiled = new WeakMap<CompiledSystem, PreciseFunction>();
function midpointOf(system: CompiledSystem): PreciseFunction {
  let known = compiled.get(system);
  if (known === undefined) {
    known = compilePrecise(writeMidpoint(system), system.states.length, system.parameters.length);
    compiled.set(system, known);
  }
  return known;
}

/**
 * Gragg's method: the modified midpoint rule at 2, 4, 6, ... steps, extrapolated to none; steps chosen by the
 * difference of the last two columns.
 */
export function extrapolationStepper(system: CompiledSystem, options: StepperOptions): Stepper {
  const { parameters, tolerance } = options;
  const n = system.states.length;
  const half = n / 2;
  const midpoint = midpointOf(system);
  const count = Math.round(-Math.log10(tolerance) / DIGITS_A_ROW);
  const rows = Array.from(
    { length: Math.min(MOST_ROWS, Math.max(FEWEST_ROWS, count)) },
    (_, i) => 2 * (i + 1),
  );
  const last = rows.length - 1;
  // The results of the rows, one state a slot, and the weights: of all rows, and what they change from those of
  // all but the first.
  const [WEIGHTS, CHANGES] = [n, n + 1];
  const table = new SeriesTable(n + 2, last);
  const withoutFirst = [ZERO, ...weights(rows.slice(1))];
  weights(rows).forEach((weight, row) => {
    table.set(WEIGHTS, row, weight);
    table.set(CHANGES, row, subtract(weight, withoutFirst[row]!));
  });
  const motion = radialMotion(system, parameters);
  const io = new Float64Array(2 * n);
  const track = trackFrom(options.state, (state) => toDouble(motion.rate(state)));
  let next = options.firstStep;

  /** The extrapolated state after a step, and how far it is from the one without the coarsest row. */
  const across = (
    from: PreciseState,
    length: DoubleDouble,
  ): { readonly to: PreciseState; readonly error: number } => {
    rows.forEach((steps, row) => {
      for (let i = 0; i < n; i++) {
        io[i] = from[i]!.high;
        io[n + i] = from[i]!.low;
      }
      midpoint.run(io, parameters, scaledDown(length, steps), steps);
      track.evaluations += steps;
      // Rows run backwards, as the second factor of a product of series does.
      for (let i = 0; i < n; i++) table.set(i, last - row, { high: io[i]!, low: io[n + i]! });
    });
    const to = from.map((_, i) => table.weighted(WEIGHTS, i, last, 0, last, 1, 0));
    const [position, velocity] = scales(system, to);
    let error = 0;
    for (let i = 0; i < n; i++) {
      const off = Math.abs(table.weighted(CHANGES, i, last, 0, last, 1, 0).high);
      error = Math.max(error, off / (i < half ? position : velocity));
    }
    return { to, error };
  };

  return Object.assign(track, {
    name: `extrapolation of order ${2 * rows.length}`,
    within: (length: DoubleDouble) => across(track.before, length).to,
    step() {
      for (let refusals = 0; refusals < MOST_REFUSALS; refusals++) {
        const length: DoubleDouble = { high: next, low: 0 };
        const { to, error } = across(track.state, length);
        const finite = Number.isFinite(error);
        const wish = finite ? SAFETY * (tolerance / error) ** (1 / (2 * rows.length - 1)) : 0;
        next *= Math.min(MOST_GROWTH, Math.max(1 / MOST_SHRINKAGE, wish));
        if (!finite || error > tolerance) continue;
        track.moveTo(to);
        return length;
      }
      return null;
    },
  });
}

/** A length by a whole number: only a power of two divides exactly. */
const scaledDown = (length: DoubleDouble, steps: number): DoubleDouble => {
  const high = length.high / steps;
  const rest = scale({ high, low: 0 }, steps);
  return { high, low: (length.high - rest.high - rest.low + length.low) / steps };
};
