import { beforeAll, describe, expect, it } from "vitest";
import type { CheckName, ClaimResult } from "../../src/result/result.js";
import { auditText, keplerLeapfrog, mercury } from "./audit-text.js";

const outcome = (result: ClaimResult, name: CheckName) =>
  result.checks.find((check) => check.name === name)!.outcome;

describe("leapfrog on a Kepler orbit, e = 0.3, 100 orbits", () => {
  // The true advance is zero (Kepler's first law). The figures of leapfrog itself come from an independent
  // program outside this project, unpublished; that they fall by four at each halving is its second order.
  let result: ClaimResult;
  beforeAll(async () => {
    result = await auditText(keplerLeapfrog(200));
  });

  it("turns the apsis by -433.29 arcsec an orbit at 200 steps, and a quarter of that at each halving", () => {
    const at = (steps: number) =>
      result.ladders[0]!.rungs.find(({ stepsPerOrbit }) => Math.round(stepsPerOrbit) === steps)!.value!;
    expect(at(200)).toBeCloseTo(-433.29, 2);
    expect(at(400)).toBeCloseTo(-108.43, 2);
    expect(at(800)).toBeCloseTo(-27.116, 3);
    expect(at(1600)).toBeCloseTo(-6.779, 3);
    expect(Math.abs(result.ladders[0]!.figureOrder! - 2)).toBeLessThan(0.02);
  });

  it("reads -429.4 from the eccentricity vector, end less start", () =>
    expect(result.crossReading!.value).toBeCloseTo(-429.4, 1));

  it("keeps angular momentum to 1e-13 and the energy within 1e-3, and turns it all the same", () => {
    const entry = (name: string) => result.ledger.find(({ quantity }) => quantity === name)!;
    expect(entry("angular-momentum").largest).toBeLessThan(1e-13);
    expect(entry("angular-momentum").pattern).toBe("rounding-level");
    expect(entry("energy").pattern).toBe("bounded-oscillation");
    expect(entry("energy").largest).toBeGreaterThan(1e-4);
    expect(entry("energy").largest).toBeLessThan(1e-3);
  });

  it("finds the true figure, zero, and does not resolve a claim of it", () => {
    expect(Math.abs(result.best.value!)).toBeLessThanOrEqual(result.best.halfWidth!);
    expect(result.best.halfWidth!).toBeLessThan(1e-8);
    expect(result.verdict).toBe("not-resolved");
    expect(outcome(result, "null")).toBe("fail");
  });
});

describe("Mercury at first post-Newtonian order", () => {
  // 42.98 arcsec a century: A. M. Nobili and C. M. Will, Nature 320, 39 (1986).
  const PUBLISHED = 42.98;

  it("resolves 42.98 from an eighth-order solution, and agrees with the published figure", async () => {
    const result = await auditText(mercury("42.98", "dormand-prince-8", "included"));
    expect(result.verdict).toBe("resolved");
    expect(result.grade).toBe("A");
    expect(Math.abs(result.best.value! - PUBLISHED)).toBeLessThan(0.005);
    expect(result.best.halfWidth!).toBeLessThan(1e-5);
  });

  it("does not resolve 62.02 from rk4 with the baseline included: 19.04 of it is the integrator's", async () => {
    const result = await auditText(mercury("62.02", "rk4", "included"));
    expect(result.verdict).toBe("not-resolved");
    expect(result.asSolved.value!).toBeCloseTo(62.022, 3);
    expect(result.asSolved.null!).toBeCloseTo(19.0418, 4);
    expect(outcome(result, "reproduces")).toBe("pass");
    expect(outcome(result, "stands-clear")).toBe("fail");
  });

  it("resolves 42.98 from rk4 with its baseline subtracted", async () => {
    const result = await auditText(mercury("42.98", "rk4", "subtracted"));
    expect(result.verdict).toBe("resolved");
    // Relative error of the difference: 1e-5 at the most.
    expect(Math.abs(result.asSolved.value! / result.best.value! - 1)).toBeLessThan(1e-5);
  });

  it("does not resolve 42.98 from rk4 with the baseline included", async () => {
    const result = await auditText(mercury("42.98", "rk4", "included"));
    expect(result.verdict).toBe("not-resolved");
    expect(outcome(result, "reproduces")).toBe("fail");
  });

  it("contradicts 85.96", async () => {
    for (const method of ["rk4", "dormand-prince-8"]) {
      const result = await auditText(mercury("85.96", method, "subtracted"));
      expect(result.verdict).toBe("contradicted");
    }
  });

  it("contradicts a last digit that is off by one", async () => {
    expect((await auditText(mercury("42.99", "dormand-prince-8", "included"))).verdict).toBe("contradicted");
  });

  it.each([
    ["rk4", 4, 4],
    ["dormand-prince-5", 5, 6],
  ])("%s: the state converges at %i and the advance at %i", async (method, state, figure) => {
    const { ladders } = await auditText(mercury("42.98", method, "included"));
    expect(Math.abs(ladders[0]!.stateOrder! - state)).toBeLessThan(0.3);
    expect(Math.abs(ladders[0]!.figureOrder! - figure)).toBeLessThan(0.1);
  });
});

describe("an audit", () => {
  it("gives the same figures twice", async () => {
    const timeless = (result: ClaimResult) =>
      JSON.stringify(result, (key, value) => (key === "seconds" ? undefined : value));
    const text = mercury("42.98", "rk4", "subtracted");
    expect(timeless(await auditText(text))).toBe(timeless(await auditText(text)));
  });

  it("says that a splitting method cannot step velocity-dependent accelerations", async () => {
    const result = await auditText(mercury("42.98", "leapfrog", "included"));
    expect(result.verdict).toBe("undetermined");
    expect(result.reason).toMatch(/kicks and drifts/);
  });

  it("reports a run that gives no figure, and does not end for it", async () => {
    const result = await auditText(mercury("42.98", "euler", "included", 32));
    expect(result.verdict).toBe("not-resolved");
    expect(result.ladders[0]!.rungs.find(({ isAuthors }) => isAuthors)!.status).not.toBe("ok");
    expect(result.best.value).toBeCloseTo(PUBLISHED_NEAR, 2);
  });
});

/** The published figure again, for a claim whose own solution fails. */
const PUBLISHED_NEAR = 42.98;
