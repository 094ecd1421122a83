import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { toJson } from "../../src/report/json.js";
import type { ClaimResult } from "../../src/result/result.js";
import { everyKind, madeUp } from "./sample.js";

const [own] = madeUp().ladders;
const withFigure = (figure: number): ClaimResult =>
  madeUp({
    ladders: [{ ...own!, rungs: own!.rungs.map((rung, k) => (k === 2 ? { ...rung, figure } : rung)) }],
  });

describe("the result as JSON", () => {
  it("reads back as it was, nulls and all", () => {
    const results = everyKind();
    expect(JSON.parse(toJson(results))).toEqual({ format: "cupel/result-1", claims: results });
    expect(toJson(results).endsWith("}\n")).toBe(true);
  });

  it("keeps every bit of a number", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (figure) => {
        const { claims } = JSON.parse(toJson([withFigure(figure)])) as { claims: ClaimResult[] };
        // JSON writes the negative nought as 0; the two are equal.
        expect(claims[0]!.ladders[0]!.rungs[2]!.figure! - figure).toBe(0);
      }),
    );
  });

  it.each([Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY])(
    "refuses %s and says where",
    (bad) => {
      expect(() => toJson([madeUp(), withFigure(bad)])).toThrow(
        new TypeError(`the result holds ${bad} at claims[1].ladders[0].rungs[2].figure`),
      );
    },
  );

  it("refuses a field that it would leave out", () => {
    const hole = { ...madeUp(), grade: undefined } as unknown as ClaimResult;
    expect(() => toJson([hole])).toThrow("the result holds undefined at claims[0].grade");
  });

  it("is the same text for the same result", () => {
    expect(toJson(everyKind())).toBe(toJson(everyKind()));
  });
});
