import type { LedgerReading } from "../measure/ledger.js";
import type { DriftPattern, LedgerEntry } from "../result/result.js";
import type { Extras } from "./gather.js";

/** The ledger of the author's run, with the order in the step from the run at half of it. */
export function ledgerOf(extras: Extras | null): LedgerEntry[] {
  return (extras?.ledger ?? []).map((reading) => {
    const halved = extras?.halvedLedger?.find(({ quantity }) => quantity === reading.quantity);
    return {
      quantity: reading.quantity,
      largest: reading.largest,
      perOrbit: reading.perOrbit,
      pattern: reading.pattern,
      exponent: reading.exponent,
      stepOrder: halved === undefined ? null : stepOrder(reading, halved),
      series: reading.series,
      says: sentence(reading),
    };
  });
}

/** log2 of what halving the step does to the change; none where rounding is all there is. */
function stepOrder(reading: LedgerReading, halved: LedgerReading): number | null {
  if (reading.pattern === "rounding-level" || halved.pattern === "rounding-level") return null;
  const drifts = reading.pattern === halved.pattern && reading.pattern !== "bounded-oscillation";
  const ratio = drifts ? reading.perOrbit / halved.perOrbit : reading.largest / halved.largest;
  return ratio > 0 ? Math.log2(ratio) : null;
}

const MEANS: Readonly<Record<DriftPattern, string>> = {
  "rounding-level": "changes by no more than rounding",
  "bounded-oscillation": "swings within each orbit and comes back: no drift",
  "linear-drift": "drifts by the same amount every orbit",
  "random-walk": "walks at random, as rounding does",
  "faster-growth": "changes ever faster",
  "jumps-at-periapsis": "steps at each periapsis passage and rests in between",
};

function sentence({ quantity, pattern, truncatedAt, relativeTo }: LedgerReading): string {
  const name = quantity.replaceAll("-", " ");
  const of = relativeTo === "parts" ? " (relative to what it is made of: it starts near nothing)" : "";
  const own =
    truncatedAt === null
      ? ""
      : ` The equations themselves conserve it to relative order ${truncatedAt} only; what varies within an orbit is left out.`;
  return `The ${name} ${MEANS[pattern]}${of}.${own}`;
}
