/** A seeded source of random numbers: the same seed gives the same numbers everywhere. */
export interface Random {
  /** In [0, 1). */
  uniform(): number;
  between(low: number, high: number): number;
  /** Every decade as likely as any other. */
  decades(low: number, high: number): number;
  pick<T>(items: readonly T[]): T;
  /** True that often. */
  chance(probability: number): boolean;
}

/** mulberry32 on 32 bits of state (common practice); good enough to draw cases with. */
export function randomFrom(seed: number): Random {
  let state = seed | 0;
  const uniform = (): number => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
  const between = (low: number, high: number): number => low + (high - low) * uniform();
  return {
    uniform,
    between,
    decades: (low, high) => 10 ** between(Math.log10(low), Math.log10(high)),
    pick: (items) => items[Math.floor(uniform() * items.length)]!,
    chance: (probability) => uniform() < probability,
  };
}
