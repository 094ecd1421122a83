import { describe, expect, it } from "vitest";
import { conditioningOf } from "../../src/measure/conditioning.js";
import { ThinnedSeries } from "../../src/measure/thinned-series.js";

describe("conditioningOf", () => {
  it("adds up what a quantity is made of, and what one rounding of each number does to it", () => {
    // Q = x y - 3 z at (2, 5, 4): parts 10, 10 and 12; root mean square of a rounding: half an ulp over √3.
    const found = conditioningOf((s) => [s[0]! * s[1]! - 3 * s[2]!], [2, 5, 4]);
    expect(found.natural).toBeCloseTo(32, 8);
    expect(found.rounding / ((Number.EPSILON / 2 / Math.sqrt(3)) * Math.hypot(10, 10, 12))).toBeCloseTo(1, 8);
  });

  it("takes a vector's components together and leaves out what is zero", () => {
    const found = conditioningOf((s) => [3 * s[0]!, 4 * s[0]!], [2, 0]);
    expect(found.natural).toBeCloseTo(10, 8);
  });
});

describe("ThinnedSeries", () => {
  it("keeps the least and the largest of every bin, in order", () => {
    const series = new ThinnedSeries(100, 20);
    for (let x = 0; x <= 100; x++) series.add(x, x === 43 ? 99 : x === 47 ? -99 : Math.sin(x));
    const points = series.points();
    expect(points.length).toBe(20);
    expect(points).toContainEqual({ x: 43, y: 99 });
    expect(points).toContainEqual({ x: 47, y: -99 });
    for (let i = 1; i < points.length; i++) expect(points[i]!.x).toBeGreaterThan(points[i - 1]!.x);
  });

  it("has no more than it was given", () => {
    const series = new ThinnedSeries(1, 600);
    series.add(0, 1);
    series.add(1, 2);
    expect(series.points()).toEqual([
      { x: 0, y: 1 },
      { x: 1, y: 2 },
    ]);
  });
});
