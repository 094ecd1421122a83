import { describe, expect, it } from "vitest";
import { calibrate } from "../../src/calibrate/calibrate.js";
import type { Calibration, Share } from "../../src/result/calibration.js";

const SEED = 20_261_201;
const CLAIMS = 240;
/** Any more would say what this machine is, not what the audits are. */
const PATIENCE = 600_000;

const part = ({ held, of }: Share): number => (of === 0 ? 1 : held / of);
const untimed = ({ seconds: _, ...figures }: Calibration) => figures;

// Truth comes from quadrature (`src/truth`, held against published formulas in test/truth), never from a run.
describe("claims with known truth", () => {
  it(
    "are judged right, and what is said of the errors holds",
    async () => {
      const found = await calibrate({ seed: SEED, claims: CLAIMS, workers: 0 });
      const misses = JSON.stringify(found.misses, null, 1);
      expect(found.claims).toBe(CLAIMS);
      expect(found.wrongResolved, misses).toBe(0);
      expect(part(found.verdicts), misses).toBeGreaterThanOrEqual(0.97);
      expect(part(found.best.reference), misses).toBeGreaterThanOrEqual(0.999);
      expect(part(found.best.extrapolation), misses).toBeGreaterThanOrEqual(0.95);
      expect(part(found.error), misses).toBeGreaterThanOrEqual(0.95);
      expect(part(found.digits), misses).toBeGreaterThanOrEqual(0.99);
      expect(part(found.ladders.asymptotic)).toBeGreaterThanOrEqual(0.99);
      expect(part(found.ladders.all)).toBeGreaterThanOrEqual(0.95);
      // Each verdict comes up, and most claims leave but one: the figures above are not had for nothing.
      expect(found.clearVerdicts.of).toBeGreaterThan(0.75 * CLAIMS);
      for (const verdict of ["resolved", "partly-resolved", "not-resolved", "contradicted"] as const) {
        expect(found.confusion[verdict][verdict]).toBeGreaterThan(CLAIMS / 30);
      }
      expect(found.best.extrapolation.of).toBeGreaterThan(CLAIMS / 10);
    },
    PATIENCE,
  );

  it("are the same from the same seed, whatever the number of workers and of claims", async () => {
    const few = await calibrate({ seed: 7, claims: 6, workers: 0 });
    const again = await calibrate({ seed: 7, claims: 6, workers: 2 });
    expect(untimed(again)).toEqual(untimed(few));
    const other = await calibrate({ seed: 8, claims: 6, workers: 0 });
    expect(untimed(other)).not.toEqual(untimed({ ...few, seed: 8 }));
  });
});
