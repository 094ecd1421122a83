import quantile from "@stdlib/stats-base-dists-t-quantile";
import { describe, expect, it } from "vitest";
import { studentT95 } from "../../src/statistics/student-t.js";

describe("studentT95", () => {
  // Abramowitz and Stegun, table 26.10, column A = 0.95.
  it.each([
    [1, 12.706],
    [2, 4.303],
    [3, 3.182],
    [5, 2.571],
    [10, 2.228],
    [30, 2.042],
    [120, 1.98],
  ])("has the tabulated value for %i degrees of freedom", (degrees, value) =>
    expect(studentT95(degrees)).toBeCloseTo(value, 3),
  );

  it("agrees with @stdlib/stats-base-dists-t-quantile(0.975, v)", () => {
    for (const degrees of [1, 2, 3, 4, 7, 20, 51, 400]) {
      expect(studentT95(degrees) / quantile(0.975, degrees)).toBeCloseTo(1, 9);
    }
  });

  it("refuses no degree of freedom", () => expect(() => studentT95(0)).toThrow(RangeError));
});
