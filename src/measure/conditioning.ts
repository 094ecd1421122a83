import type { Observable } from "../kernel/observables.js";

/** Relative nudge of a central difference: the cube root of the rounding unit balances its two errors. */
const NUDGE = Math.cbrt(Number.EPSILON);
/** A value rounded to a double is off by half a unit at most, and by this part of it in the mean square. */
const ROUNDED = 1 / Math.sqrt(3);

/** How a quantity answers to small changes of the state. */
export interface Conditioning {
  /**
   * Sum over the state of |∂Q/∂y · y|: the size of what Q is made of, against which its own size tells how
   * much cancels.
   */
  readonly natural: number;
  /** Root mean square change when every number of the state is rounded once: what a step cannot avoid. */
  readonly rounding: number;
}

export function conditioningOf(quantity: Observable["value"], state: ArrayLike<number>): Conditioning {
  const trial = Float64Array.from(state);
  let natural = 0;
  let squares = 0;
  for (let i = 0; i < trial.length; i++) {
    const value = trial[i]!;
    const nudge = Math.abs(value) * NUDGE;
    if (nudge === 0) continue;
    trial[i] = value + nudge;
    const up = quantity(trial);
    trial[i] = value - nudge;
    const down = quantity(trial);
    trial[i] = value;
    const change = Math.hypot(...up.map((component, j) => component - down[j]!)) / (2 * nudge);
    natural += change * Math.abs(value);
    squares += (change * Math.abs(value) * (Number.EPSILON / 2) * ROUNDED) ** 2;
  }
  return { natural, rounding: Math.sqrt(squares) };
}
