import { describe, expect, it } from "vitest";
import { chooseBest } from "../../src/convergence/best.js";

describe("chooseBest", () => {
  const a = { method: "a", value: 10, halfWidth: 0.1 };

  it("takes the tightest and widens it until the second lies inside", () => {
    const best = chooseBest([{ method: "b", value: 10.3, halfWidth: 0.4 }, a])!;
    expect(best).toMatchObject({ value: 10, carrier: "a", second: "b", sound: true });
    expect(best.halfWidth).toBeCloseTo(0.3, 12);
  });

  it("is not sound when two methods part by more than both explain", () => {
    expect(chooseBest([a, { method: "b", value: 10.3, halfWidth: 0.15 }])!.sound).toBe(false);
  });

  it("is not sound on one method alone, and nothing without any", () => {
    expect(chooseBest([a])!.sound).toBe(false);
    expect(chooseBest([])).toBeNull();
  });
});
