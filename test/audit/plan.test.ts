import { describe, expect, it } from "vitest";
import { planLadder, rungsWorthRunning } from "../../src/audit/plan.js";

const free = () => 0;

describe("planLadder", () => {
  it("runs from 16 to 4096 steps an orbit round an author's 256", () => {
    const plan = planLadder(1, 256, 8, free, 1);
    expect(plan.steps.map((step) => 256 / step)).toEqual([16, 32, 64, 128, 256, 512, 1024, 2048, 4096]);
    expect(plan.authors).toBe(4);
  });

  it("adds fine rungs where a coarse step leaves no room above", () => {
    const plan = planLadder(1, 32, 8, free, 1);
    expect(plan.steps).toHaveLength(8);
    expect(plan.authors).toBe(1);
  });

  it("leaves out the fine rungs that cannot be afforded, never the author's", () => {
    const plan = planLadder(1, 4096, 8, (n) => n, 4096 * 5);
    expect(4096 / plan.steps.at(-1)! / 4096).toBe(2);
    expect(planLadder(1, 4096, 8, (n) => n, 1).steps.at(-1)).toBe(1);
  });

  it("halves each step exactly", () => {
    const { steps } = planLadder(0.3, 100, 8, free, 1);
    for (let k = 1; k < steps.length; k++) expect(steps[k]! * 2).toBe(steps[k - 1]);
  });

  it("centres on 256 steps an orbit without a solution", () => {
    const plan = planLadder(null, 256, 8, free, 1);
    expect(plan.steps).toContain(1);
    expect(plan.authors).toBeNull();
  });
});

describe("rungsWorthRunning", () => {
  const plan = planLadder(1, 512, 8, free, 1);
  const finest = (order: number, eccentricity: number) =>
    512 / plan.steps[rungsWorthRunning(plan, order, { period: 512, eccentricity }, 8) - 1]!;

  it("leaves out what would show rounding alone: the sooner the higher the order", () => {
    expect(finest(4, 0.2)).toBe(8192);
    expect(finest(6, 0.2)).toBe(2048);
    expect(finest(8, 0.2)).toBe(512 * 2 ** (8 - 1 - plan.authors!));
  });

  it("keeps them where the periapsis is tight, and keeps the rungs asked for", () => {
    expect(finest(8, 0.9)).toBe(8192);
    expect(rungsWorthRunning(plan, 8, { period: 512, eccentricity: 0.01 }, 10)).toBe(10);
  });
});
