import { wrap } from "./apsidal-angle.js";
import type { OrbitMean } from "./orbit-mean.js";

/** One number a stretch of each orbit: what a quantity does, seen from one side. */
export interface Aspect {
  readonly mean: readonly number[];
  readonly early: readonly (number | null)[];
  readonly late: readonly (number | null)[];
}

type Vector = readonly number[];

/**
 * Turns the orbit means of relative change into plain series. A scalar is its own only aspect. A vector that
 * is not nothing has two: its length, and the angle that it has turned by in the plane of its turning, whole
 * turns included, since a vector that goes round is drifting all the while. A vector near nothing has neither,
 * and is seen along the direction in which it goes farthest.
 *
 * @param orbits means of (Q - Q0)/scale
 * @param start Q0/scale, which has the length 1; null for a vector near nothing
 */
export function aspectsOf(orbits: readonly OrbitMean[], start: Vector | null): Aspect[] {
  if (orbits.length === 0) return [];
  if (orbits[0]!.mean.length === 1) return [along(orbits, [1])];
  const farthest = orbits
    .map(({ mean }) => mean)
    .reduce((far, mean) => (size(mean) > size(far) ? mean : far));
  if (start === null) return [along(orbits, unit(farthest))];
  const across = unit(farthest.map((value, j) => value - dot(farthest, start) * start[j]!));
  return [length(orbits, start), turn(orbits, start, across)];
}

/** The aspect whose orbit means range widest. */
export function widestAspect(aspects: readonly Aspect[]): Aspect | null {
  const range = ({ mean }: Aspect): number => Math.max(...mean) - Math.min(...mean);
  return aspects.reduce<Aspect | null>(
    (widest, aspect) => (widest === null || range(aspect) > range(widest) ? aspect : widest),
    null,
  );
}

function map(orbits: readonly OrbitMean[], see: (change: Vector) => number): Aspect {
  return {
    early: orbits.map(({ early }) => early && see(early)),
    mean: orbits.map(({ mean }) => see(mean)),
    late: orbits.map(({ late }) => late && see(late)),
  };
}

const along = (orbits: readonly OrbitMean[], direction: Vector): Aspect =>
  map(orbits, (change) => dot(change, direction));

/** |start + change| - 1, without the cancellation. */
const length = (orbits: readonly OrbitMean[], start: Vector): Aspect =>
  map(orbits, (change) => {
    const grown = 2 * dot(start, change) + dot(change, change);
    return grown / (Math.sqrt(1 + grown) + 1);
  });

function turn(orbits: readonly OrbitMean[], start: Vector, across: Vector): Aspect {
  let last = 0;
  const see = (change: Vector): number => {
    const angle = Math.atan2(dot(change, across), 1 + dot(change, start));
    last += wrap(angle - last);
    return last;
  };
  // In the order of time, so that each angle is unwrapped from the one before it.
  const seen = orbits.map(({ early, mean, late }) => ({
    early: early && see(early),
    mean: see(mean),
    late: late && see(late),
  }));
  return {
    early: seen.map(({ early }) => early),
    mean: seen.map(({ mean }) => mean),
    late: seen.map(({ late }) => late),
  };
}

const dot = (a: Vector, b: Vector): number => a.reduce((sum, value, i) => sum + value * b[i]!, 0);
const size = (a: Vector): number => Math.sqrt(dot(a, a));
const unit = (a: Vector): number[] => {
  const length = size(a);
  return a.map((value) => (length > 0 ? value / length : 0));
};
