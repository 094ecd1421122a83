import { mean } from "simple-statistics";
import { afterAll, describe, expect, it } from "vitest";
import { createAuditor } from "../../src/audit/audit.js";
import { parseClaim } from "../../src/claim/read.js";

const auditor = await createAuditor({ workers: 0 });
afterAll(() => auditor.close());

const FEW = "audit: { witnesses: [gauss-legendre-6, yoshida-8], rungs: 4 }";

function claimOf(span: string, more = "", method = "dormand-prince-8", steps = 64) {
  const text = `cupel: claim/1
title: An invented orbit
claimed: { quantity: apsidal-advance, value: 0.0(1) arcsec/orbit }
scenario:
  equations: newtonian
  parameters: { GM: 1.1e20 m^3/s^2 }
  start: { periapsis: 0.21 au, apoapsis: 0.34 au }
  span: ${span}
solution: { method: ${method}, steps-per-orbit: ${steps} }
${more}`;
  const read = parseClaim(new TextEncoder().encode(text), "made-up.yaml");
  if (!read.ok) throw new Error(JSON.stringify(read.problems));
  return read.claim;
}

describe("the reference of an audit", () => {
  // A Kepler ellipse does not turn: H. Goldstein, Classical Mechanics, 2nd ed. (1980), ch. 3.
  it("carries the best value, to a millionth of the margin, and truth does not leave it", async () => {
    const { best, reference } = await auditor.audit(claimOf("5 orbits"));
    expect(best.from).toBe("reference");
    expect(reference!.apart).toBeLessThanOrEqual(1e-6 * 0.1);
    expect(reference!.methods).toHaveLength(2);
    expect(Math.abs(best.value!)).toBeLessThanOrEqual(best.halfWidth!);
    expect(best.halfWidth!).toBeLessThan(1e-6 * 0.1);
    expect(Math.abs(best.extrapolated!.value)).toBeLessThanOrEqual(best.extrapolated!.halfWidth);
  });

  it("gives way to extrapolation where it would take too long, and says so", async () => {
    const { best, reference, verdict } = await auditor.audit(
      claimOf("20100 orbits", FEW, "dormand-prince-8", 32),
    );
    expect(reference!.value).toBeNull();
    expect(reference!.says).toMatch(/no reference: 20100 orbits in double-double would take too long/);
    expect(best.from).toBe("extrapolation");
    expect(best.says).toMatch(/limit/);
    expect(verdict).toBe("resolved");
    expect(Math.abs(best.value!)).toBeLessThanOrEqual(best.halfWidth!);
  }, 180_000);
});

// D. Brouwer, A. J. 46, 149 (1937): rounding moves the energy as t^1/2 and the phase as t^3/2. Eight members tell an
// exponent to some two tenths, four methods to one.
it("rounding walks at random as Brouwer's law has it", async () => {
  const found = [];
  for (const method of ["rk4", "dormand-prince-5", "forest-ruth-4", "leapfrog"]) {
    found.push((await auditor.audit(claimOf("200 orbits", FEW, method, 256))).rounding!);
  }
  expect(Math.abs(mean(found.map(({ apsisGrowth }) => apsisGrowth!)) - 0.5)).toBeLessThan(0.2);
  expect(Math.abs(mean(found.map(({ phaseGrowth }) => phaseGrowth!)) - 1.5)).toBeLessThan(0.2);
});
