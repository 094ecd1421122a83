import type { QuotedUnit } from "../claim/claim.js";
import type { Reading } from "./job.js";

/** The apsidal advance of a run in the claim's unit; null where the run gave none. */
export function figureOf(reading: Reading | null, unit: QuotedUnit): number | null {
  if (reading === null || reading.status !== "ok" || reading.advance === null) return null;
  return reading.advance * perRadian(reading, unit);
}

/** Its standard error, in the claim's unit. */
export function figureErrorOf(reading: Reading | null, unit: QuotedUnit): number | null {
  if (reading === null || reading.status !== "ok" || reading.advanceError === null) return null;
  return reading.advanceError * perRadian(reading, unit);
}

/** Claim units a radian an orbit. A figure per time is divided by the run's own mean radial period. */
function perRadian(reading: Reading, unit: QuotedUnit): number {
  return unit.per === "orbit" ? 1 / unit.radians : unit.per / reading.period! / unit.radians;
}
