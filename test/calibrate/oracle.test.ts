import { describe, expect, it } from "vitest";
import { isWrongResolved, type Known, rightDigits, rightVerdicts } from "../../src/calibrate/oracle.js";

/** A second-order ladder with the limit 100: errors e, e/4, e/16, e/64. */
const ladder = (error: number): number[] => [1, 4, 16, 64].map((by) => 100 + error / by);

function known(parts: Partial<Known> & { readonly error?: number } = {}): Known {
  const { error = 0.001, ...rest } = parts;
  const runs = rest.runs ?? ladder(error);
  return {
    truth: 100,
    claimed: { value: 100, halfWidth: 0.05 },
    runs,
    ladders: [{ figures: runs, rounding: 0 }],
    rounding: 0,
    isMistyped: false,
    leftOpen: 0,
    ...rest,
  };
}

// The rules are those of the verdict: see `verdict.ts` and the words there.
describe("the verdicts that are right", () => {
  it.each([
    ["resolved", {}],
    ["partly-resolved", { error: 0.02 }],
    ["partly-resolved", { error: 2, claimed: { value: 102, halfWidth: 0.05 } }],
    ["not-resolved", { error: 30, claimed: { value: 130, halfWidth: 0.05 } }],
    ["contradicted", { claimed: { value: 101, halfWidth: 0.05 } }],
    ["not-resolved", { runs: [null, 100, 100, 100] }],
    ["partly-resolved", { isMistyped: true }],
  ] as const)("%s", (verdict, parts) => {
    expect([...rightVerdicts(known(parts))]).toEqual([verdict]);
  });

  it("are two where rounding may lift the error over a third of the margin", () => {
    expect([...rightVerdicts(known({ error: 0.015, rounding: 0.004 }))].sort()).toEqual([
      "partly-resolved",
      "resolved",
    ]);
  });

  it("ask for convergence: errors that grow as the step is halved are none", () => {
    const runs = [100.001, 100.002, 100.004, 100.008];
    expect([...rightVerdicts(known({ runs }))]).toEqual(["partly-resolved"]);
  });

  it("leave undetermined to who has no reference and a margin below what doubles show", () => {
    expect(rightVerdicts(known({ leftOpen: 0.1 })).has("undetermined")).toBe(true);
    expect(rightVerdicts(known({ leftOpen: 0.001 })).has("undetermined")).toBe(false);
  });
});

it("calls a resolved wrong where the claim, its error or its method is", () => {
  expect(isWrongResolved(known())).toBe(false);
  expect(isWrongResolved(known({ isMistyped: true }))).toBe(true);
  expect(isWrongResolved(known({ error: 0.017 }))).toBe(true);
  expect(isWrongResolved(known({ claimed: { value: 100.06, halfWidth: 0.05 } }))).toBe(true);
  expect(isWrongResolved(known({ runs: [null, 1, 1, 1] }))).toBe(true);
});

it("counts the digits that stand", () => {
  // Half a unit of the k-th digit of 100 is 50, 5, 0.5, 0.05, ...: an error of 0.001 leaves five and no more.
  expect(rightDigits(known())).toEqual([5, 5]);
});
