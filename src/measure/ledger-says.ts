import type { DriftPattern } from "../result/result.js";
import type { LedgerReading } from "./ledger.js";

const size = (value: number): string => Math.abs(value).toExponential(1);

const PATTERNS: Record<DriftPattern, (entry: LedgerReading) => string> = {
  "rounding-level": ({ largest }) => `changes by ${size(largest)} at most, as rounding alone may`,
  "bounded-oscillation": ({ largest }) => `swings within ${size(largest)} and does not drift`,
  "linear-drift": (entry) => `drifts by ${size(entry.perOrbit)} an orbit${growing(entry)}`,
  "random-walk": (entry) => `wanders at random${growing(entry)}, to ${size(entry.largest)} at most`,
  "faster-growth": (entry) => `grows faster than the time${growing(entry)}, to ${size(entry.largest)}`,
  "jumps-at-periapsis": (entry) =>
    `jumps at each periapsis, by ${size(entry.perOrbit)} on the mean${growing(entry)}`,
};

const growing = ({ exponent }: LedgerReading): string =>
  exponent === null ? "" : `, as t^${exponent.toFixed(2)}`;

/** One sentence on a ledger entry. */
export function ledgerSays(entry: LedgerReading): string {
  const relative = entry.relativeTo === "start" ? "" : " (relative to its parts: it starts near nothing)";
  const truncated =
    entry.truncatedAt === null
      ? ""
      : `; it is conserved only up to ${entry.truncatedAt}, so what it does within an orbit is not counted`;
  return `${entry.quantity} ${PATTERNS[entry.pattern](entry)}${relative}${truncated}.`;
}

/**
 * Observed order of a drift in the step, from two runs whose steps differ by 2: of the secular change where
 * there is one, else of the largest. Null where either is rounding or the two differ in kind.
 */
export function driftOrder(coarse: LedgerReading, fine: LedgerReading): number | null {
  if (coarse.pattern === "rounding-level" || fine.pattern === "rounding-level") return null;
  const bounded = coarse.pattern === "bounded-oscillation";
  if (bounded !== (fine.pattern === "bounded-oscillation")) return null;
  const ratio = bounded ? coarse.largest / fine.largest : coarse.perOrbit / fine.perOrbit;
  return ratio > 0 && Number.isFinite(ratio) ? Math.log2(ratio) : null;
}
