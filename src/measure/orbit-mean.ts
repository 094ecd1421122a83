/** What a quantity is over one orbit; each entry a value a component. */
export interface OrbitMean {
  readonly mean: readonly number[];
  /** Means of the stretches after the first passage and before the next; null where one holds no sample. */
  readonly early: readonly number[] | null;
  readonly late: readonly number[] | null;
  /** Half the widest swing of any component. */
  readonly swing: number;
}

/** Stretches of phase, each centred a tenth of the orbit off its passage. */
const EARLY = [0.05, 0.15] as const;
const LATE = [0.85, 0.95] as const;

/**
 * Averages a quantity over an orbit, passage to passage, so that what swings within the orbit drops out.
 *
 * The weight sin²(π · phase) vanishes at both ends: it does not matter on which side of a passage, where
 * many quantities peak, a sample happens to fall. The mean of a periodic quantity is then good to the third
 * order in the spacing of the samples, where a plain mean is out by the first.
 *
 * @param phases of the samples in the orbit, in [0, 1)
 * @param rows one a sample, each a value a component
 * @returns null where no sample carries weight
 */
export function orbitMean(phases: readonly number[], rows: readonly (readonly number[])[]): OrbitMean | null {
  const mean = weighted(phases, rows, (phase) => Math.sin(Math.PI * phase) ** 2);
  if (mean === null) return null;
  let swing = 0;
  for (let j = 0; j < mean.length; j++) {
    const column = rows.map((row) => row[j]!);
    swing = Math.max(swing, (Math.max(...column) - Math.min(...column)) / 2);
  }
  return {
    mean,
    early: weighted(phases, rows, within(EARLY)),
    late: weighted(phases, rows, within(LATE)),
    swing,
  };
}

const within =
  ([from, to]: readonly [number, number]) =>
  (phase: number): number =>
    phase >= from && phase <= to ? 1 : 0;

function weighted(
  phases: readonly number[],
  rows: readonly (readonly number[])[],
  weight: (phase: number) => number,
): number[] | null {
  const weights = phases.map(weight);
  const total = weights.reduce((sum, value) => sum + value, 0);
  if (!(total > 0)) return null;
  return rows[0]!.map((_, j) => rows.reduce((sum, row, i) => sum + (weights[i]! / total) * row[j]!, 0));
}
