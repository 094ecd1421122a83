import { ahead, senseOf, TURN, TURN_REST } from "./apsidal-angle.js";
import type { PreparedScenario } from "./run.js";

/**
 * How far the position swings backwards in one step before the step counts as forwards: an eighth turn.
 * Every motion here goes one way round, so a step's angle is read modulo a turn as nearly all forwards;
 * the small part that is left for backwards takes the rounding of a slow step.
 */
const BACKWARDS = TURN / 8;

/** Adds up the angle that a position sweeps, step by step, whole turns included. */
export class Sweep {
  angle = 0;
  #last: ArrayLike<number>;
  readonly #scenario: PreparedScenario;
  readonly #dimension: number;
  readonly #sense: 1 | -1;

  constructor(scenario: PreparedScenario, dimension: number, from: ArrayLike<number>) {
    this.#scenario = scenario;
    this.#dimension = dimension;
    this.#sense = senseOf(scenario.state, dimension);
    this.#last = from;
  }

  add(state: Float64Array): void {
    const turned = ahead(this.#scenario.apsidalAngle, this.#sense, this.#last, state);
    this.angle += turned < -BACKWARDS ? turned + TURN : turned;
    this.#last = state.slice(0, this.#dimension);
  }
}

/** Product and its rounding error, exactly (Dekker, Numerische Mathematik 18 (1971) 224). */
function exactProduct(a: number, b: number): readonly [number, number] {
  const split = (x: number): readonly [number, number] => {
    const shifted = 134217729 * x;
    const high = shifted - (shifted - x);
    return [high, x - high];
  };
  const product = a * b;
  const [ah, al] = split(a);
  const [bh, bl] = split(b);
  return [product, al * bl - (product - ah * bh - al * bh - ah * bl)];
}

/**
 * steps · step + rest, less `turns` whole turns, to the digits of the small difference: the products are
 * carried to twice the digits, since a turn rounded to a double is off by 2.4e-16 on every orbit.
 */
export function lessTurns(steps: number, step: number, rest: number, turns: number): number {
  const [gone, goneRest] = exactProduct(steps, step);
  const [whole, wholeRest] = exactProduct(turns, TURN);
  return gone - whole + (goneRest - wholeRest) + (rest - turns * TURN_REST);
}

/**
 * Makes directions, known modulo a turn, into a continuous series: each change is the one nearest to the
 * change before it. The first is told from outside, since only a sweep can say it.
 *
 * @param directions each less the first, modulo a turn; rad
 * @param firstChange second less first, whole turns included
 */
export function unwrap(directions: readonly number[], firstChange: number): number[] {
  const series: number[] = [];
  let turns = 0;
  let change = firstChange;
  for (const [i, direction] of directions.entries()) {
    if (i > 0) {
      const before = series[i - 1]!;
      turns += Math.round((before + change - (direction + TURN * turns)) / TURN);
      change = direction + TURN * turns - before;
    }
    series.push(direction + TURN * turns);
  }
  return series;
}
