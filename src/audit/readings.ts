import type { QuotedUnit } from "../claim/claim.js";
import type { PreparedScenario } from "../measure/run.js";
import type { Reading } from "./job.js";

/** A passage is located to four units in the last place of the step, on either side (`measure/root.ts`). */
const LOCATED = 4 * Number.EPSILON;

/**
 * What locating the passages may add to a figure: each is off by as much of a step, times the speed at periapsis,
 * 2π/T sqrt(1 - e²)/(1 - e)²; and of a slope over n passages the ends count most, 6/n of one of them at the
 * worst. What a run's fit does beyond that is the same functional of its angles as of the true ones, and is part
 * of the difference itself.
 *
 * @param step s, or rad
 * @returns in the claim's unit; 0 without a figure
 */
export function readingOff(
  reading: Reading | null,
  { period, eccentricity: e, apsidalAngle }: PreparedScenario,
  step: number,
  unit: QuotedUnit,
): number {
  if (reading === null || reading.period === null) return 0;
  const speed =
    apsidalAngle === "polar" ? 1 : ((2 * Math.PI) / period) * (Math.sqrt(1 - e * e) / (1 - e) ** 2);
  const perOrbit = (6 / reading.numbers.length) * LOCATED * step * speed;
  return (perOrbit / unit.radians) * (unit.per === "orbit" ? 1 : unit.per / reading.period);
}
