import { describe, expect, it } from "vitest";
import { ENSEMBLE_SIZE, lastBitEnsemble, roundingHalfWidth } from "../../src/convergence/rounding.js";

describe("lastBitEnsemble", () => {
  const state = [4.6e10, 0, -3, 5.9e4];
  const members = lastBitEnsemble(state);

  it("differs from the start in the last two bits of each component, and leaves zero alone", () => {
    expect(members).toHaveLength(ENSEMBLE_SIZE);
    for (const member of members) {
      member.forEach((value, i) => {
        if (state[i] === 0) expect(value).toBe(0);
        else {
          expect(value).not.toBe(state[i]);
          expect(Math.abs(value / state[i]! - 1)).toBeLessThanOrEqual(2 * Number.EPSILON);
        }
      });
    }
  });

  it("has no two members alike", () => {
    expect(new Set(members.map((member) => member.join())).size).toBe(ENSEMBLE_SIZE);
  });
});

describe("roundingHalfWidth", () => {
  // Prediction interval for one future observation, t(0.975, 4) sqrt(1 + 1/5) s: common practice;
  // t(0.975, 4) = 2.776 from Abramowitz and Stegun, table 26.10. The sample 2, 4, 4, 4, 6 has s = sqrt(2).
  it("is the 95 % prediction half-width", () => {
    expect(roundingHalfWidth([2, 4, 4, 4, 6])).toBeCloseTo(2.776 * Math.sqrt(1.2) * Math.SQRT2, 2);
  });

  it("passes over members without a figure, and asks for three", () => {
    expect(roundingHalfWidth([1, null, 2])).toBeNull();
    expect(roundingHalfWidth([1, null, 2, 3])).toBe(roundingHalfWidth([1, 2, 3]));
  });
});
