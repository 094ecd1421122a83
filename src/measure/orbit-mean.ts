/** What a quantity is over one orbit; each entry a value a component. */
export interface OrbitMean {
  readonly mean: readonly number[];
  /** Means of the stretches after the first passage and before the next; null where one holds no sample. */
  readonly early: readonly number[] | null;
  readonly late: readonly number[] | null;
  /** Half the widest swing of any component. */
  readonly swing: number;
}

type Stretch = readonly [number, number];
const WHOLE: Stretch = [0, 1];
/** Centred a tenth of the orbit off either passage. */
const EARLY: Stretch = [0.02, 0.18];
const LATE: Stretch = [0.82, 0.98];

/**
 * Averages a quantity over an orbit, passage to passage, so that what swings within the orbit drops out.
 *
 * The weight is sin⁶ of the phase. It vanishes to the sixth order at both ends, where many quantities peak:
 * by the Euler-Maclaurin formula the mean of samples an h apart then depends on where they happen to fall
 * only at the order h⁷, while a plain mean would jump by a whole sample of the peak.
 *
 * @param phases of the samples in the orbit, in [0, 1)
 * @param rows one a sample, each a value a component
 * @returns null where no sample carries weight
 */
export function orbitMean(phases: readonly number[], rows: readonly (readonly number[])[]): OrbitMean | null {
  const mean = weighted(phases, rows, WHOLE);
  if (mean === null) return null;
  let swing = 0;
  for (let j = 0; j < mean.length; j++) {
    const column = rows.map((row) => row[j]!);
    swing = Math.max(swing, (Math.max(...column) - Math.min(...column)) / 2);
  }
  return { mean, early: weighted(phases, rows, EARLY), late: weighted(phases, rows, LATE), swing };
}

function weighted(
  phases: readonly number[],
  rows: readonly (readonly number[])[],
  [from, to]: Stretch,
): number[] | null {
  const weights = phases.map((phase) =>
    phase > from && phase < to ? Math.sin((Math.PI * (phase - from)) / (to - from)) ** 6 : 0,
  );
  const total = weights.reduce((sum, value) => sum + value, 0);
  if (!(total > 0)) return null;
  return rows[0]!.map((_, j) => rows.reduce((sum, row, i) => sum + (weights[i]! / total) * row[j]!, 0));
}
