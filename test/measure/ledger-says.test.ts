import { describe, expect, it } from "vitest";
import type { LedgerReading } from "../../src/measure/ledger.js";
import { driftOrder, ledgerSays } from "../../src/measure/ledger-says.js";

const entry = (given: Partial<LedgerReading>): LedgerReading => ({
  quantity: "energy",
  largest: 3.21e-6,
  perOrbit: -4.56e-8,
  pattern: "linear-drift",
  exponent: 1.004,
  relativeTo: "start",
  truncatedAt: null,
  series: { orbits: [], change: [] },
  ...given,
});

describe("ledgerSays", () => {
  it("puts each pattern in a sentence", () => {
    expect(ledgerSays(entry({}))).toBe("energy drifts by 4.6e-8 an orbit, as t^1.00.");
    const says = (pattern: LedgerReading["pattern"]) => ledgerSays(entry({ pattern, exponent: null }));
    expect(says("rounding-level")).toBe("energy changes by 3.2e-6 at most, as rounding alone may.");
    expect(says("bounded-oscillation")).toBe("energy swings within 3.2e-6 and does not drift.");
    expect(says("random-walk")).toMatch(/wanders at random/);
    expect(says("faster-growth")).toMatch(/grows faster than the time/);
    expect(says("jumps-at-periapsis")).toMatch(/jumps at each periapsis/);
  });

  it("says what a truncated or a vanishing quantity is measured by", () => {
    expect(ledgerSays(entry({ truncatedAt: "(GM/(c^2 r))^2" }))).toMatch(/conserved only up to \(GM/);
    expect(ledgerSays(entry({ relativeTo: "parts" }))).toMatch(/relative to its parts/);
  });
});

describe("driftOrder", () => {
  it("is the power of the step by which a drift, or else the largest change, goes", () => {
    expect(driftOrder(entry({ perOrbit: -32e-9 }), entry({ perOrbit: -1e-9 }))).toBe(5);
    const bounded = (largest: number) => entry({ pattern: "bounded-oscillation", largest });
    expect(driftOrder(bounded(4e-4), bounded(1e-4))).toBe(2);
  });

  it("is not had across rounding, a change of kind, or a change of sign", () => {
    expect(driftOrder(entry({}), entry({ pattern: "rounding-level" }))).toBeNull();
    expect(driftOrder(entry({}), entry({ pattern: "bounded-oscillation" }))).toBeNull();
    expect(driftOrder(entry({}), entry({ perOrbit: 1e-9 }))).toBeNull();
  });
});
