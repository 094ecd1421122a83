import type { DoubleDouble } from "../../src/arithmetic/double-double.js";
import { fastTwoSum, twoSum } from "../../src/arithmetic/double-word.js";
import { onNumbers } from "../../src/arithmetic/machine.js";

/** A seeded generator of numbers in [0, 1): mulberry32, common practice. */
export function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** Random pairs: significands full, sparse, all ones, near powers of two; low parts of every size, also 0. */
export function randomPair(random: () => number, decades = 40): DoubleDouble {
  const sign = random() < 0.5 ? -1 : 1;
  const exponent = Math.round((random() - 0.5) * 2 * decades * 3.32);
  const kinds = [
    () => 1 + random() + random() * 2 ** -32,
    () => 1 + 2 ** -Math.floor(1 + random() * 52),
    () => 2 - 2 ** -Math.floor(1 + random() * 52),
    () => 1,
  ];
  const high = sign * kinds[Math.floor(random() * kinds.length)]!() * 2 ** exponent;
  const half = 2 ** (exponent - 53);
  const lows = [0, half * (2 * random() - 1), half * (1 - 2 ** -53), -half / 2, half * 2 ** -(random() * 50)];
  const low = lows[Math.floor(random() * lows.length)]!;
  return fastTwoSum(onNumbers, high, low);
}

/** The same number turned round by next to nothing: sums cancel almost entirely. */
export function nearlyOpposite(x: DoubleDouble, random: () => number): DoubleDouble {
  const nudge = x.high * 2 ** -Math.floor(random() * 110);
  const { high, low } = twoSum(onNumbers, -x.high, nudge);
  return fastTwoSum(onNumbers, high, low - x.low * (random() < 0.5 ? 1 : random()));
}
