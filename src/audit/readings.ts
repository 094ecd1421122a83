import type { QuotedUnit } from "../claim/claim.js";
import { fitLine } from "../statistics/line.js";
import { studentT95 } from "../statistics/student-t.js";
import type { Reading } from "./job.js";

/**
 * What locating the passages and fitting a line through them may add: the 95 % half-width of the slope of
 * this run's apsidal angles less those of the best run, passage by passage, so that what the orbit itself
 * does to them (a wobble, a curve) drops out.
 *
 * @returns in the claim's unit; 0 where the runs share too few passages to tell
 */
export function readingOff(own: Reading | null, best: Reading | null, unit: QuotedUnit): number {
  if (own === null || best === null || own.period === null) return 0;
  const count = Math.min(own.advances.length, best.advances.length);
  const line = fitLine(
    own.numbers.slice(0, count),
    own.advances.slice(0, count).map((angle, k) => angle - best.advances[k]!),
  );
  if (line === null || line.slopeError === null) return 0;
  const perOrbit = studentT95(line.degrees) * line.slopeError;
  return (perOrbit / unit.radians) * (unit.per === "orbit" ? 1 : unit.per / own.period);
}
