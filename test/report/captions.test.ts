import { describe, expect, it } from "vitest";
import {
  budgetCaption,
  intervalsCaption,
  ladderCaption,
  ledgerCaption,
  passagesCaption,
  stepsCaption,
} from "../../src/report/page/captions.js";
import type { Check, ClaimResult, Ladder, LedgerEntry, Outcome, Rung } from "../../src/result/result.js";

/** A made-up law: the figure is 40 + 2·16^(4 - k), with a null run of 16^(4 - k), at 16·2^k steps an orbit. */
const rungs: readonly Rung[] = Array.from({ length: 8 }, (_, k) => {
  const error = 16 ** (4 - k);
  return {
    step: 2 ** -k,
    stepsPerOrbit: 16 * 2 ** k,
    status: "ok",
    value: 40 + 2 * error,
    null: error,
    figure: 40 + 2 * error,
    standardError: 0,
    stateDifference: null,
    evaluations: 1,
    seconds: 0,
    isAuthors: k === 4,
  };
});

const own: Ladder = {
  method: "rk4",
  role: "solution",
  formalOrder: 4,
  stateOrder: 4,
  figureOrder: 4,
  figureOrderInterval: [3.9, 4.1],
  window: [1, 7],
  shape: "asymptotic",
  says: "The error falls by 16.0 for each halving.",
  extrapolated: { value: 40, halfWidth: 1e-6 },
  // 2·16^4 at 16 steps an orbit.
  coefficient: 2 * 16 ** 4 * 16 ** 4,
  floor: 1e-9,
  rungs,
};

const check = (name: Check["name"], outcome: Outcome): Check => ({
  name,
  outcome,
  figure: null,
  limit: null,
  unit: "",
  says: "",
});

const result: ClaimResult = {
  file: "claim.yaml",
  title: "Made up",
  verdict: "partly-resolved",
  grade: "C",
  digits: 1,
  reason: "",
  gradeRule: "",
  claimed: {
    value: 42,
    halfWidth: 0.6,
    unit: "arcsec/century",
    baseline: "included",
    quantity: "apsidal-advance",
    text: "42.0(6) arcsec/century",
    digits: 3,
  },
  asSolved: { value: 42, null: 1, error: 2, halfWidth: 0.001 },
  crossReading: null,
  best: { value: 40, halfWidth: 1e-6, from: "extrapolation", extrapolated: null, says: "" },
  reference: null,
  rounding: null,
  checks: [check("reproduces", "pass"), check("carries-digits", "fail")],
  budget: {
    truncation: 2,
    rounding: 1e-9,
    readingOff: 1e-4,
    methodSpread: 1e-6,
    sampling: null,
    total: 2,
    dominant: "truncation",
  },
  ladders: [own],
  ledger: [],
  remedy: null,
  setup: null,
  passages: {
    solution: { number: [0, 1, 2, 3], angle: [0, 1, 2.25, 3] },
    null: { number: [0, 1, 2, 3], angle: [0, 0.1, 0.2, 0.3] },
  },
  provenance: { version: "", claimSha256: "", node: "", command: "", seconds: 0 },
};

describe("the caption of the intervals", () => {
  it("says how far out the best value is, and that the step gives what was quoted", () => {
    const caption = intervalsCaption(result);
    // 2 off with a margin of 0.6 is 3.33 margins.
    expect(caption).toContain(
      "lies outside the claimed interval: 2.00 arcsec/century from its middle, 3.33 times",
    );
    expect(caption).toContain("what was quoted is what this step gives");
  });

  it("tells the four places of the solution apart", () => {
    const at = (reproduces: Outcome, carries: Outcome): string =>
      intervalsCaption({
        ...result,
        reference: null,
        rounding: null,
        checks: [check("reproduces", reproduces), check("carries-digits", carries)],
      });
    expect(at("pass", "pass")).toContain("falls on both");
    expect(at("pass", "fail")).toContain("falls on the claim and 2.00 arcsec/century from the best value");
    expect(at("fail", "pass")).toContain("falls on the best value");
    expect(at("fail", "fail")).toContain("falls on neither");
  });

  it("says what is inside, what is missing and what the second axis is for", () => {
    const inside = { ...result, best: { ...result.best, value: 41.7 } };
    expect(intervalsCaption(inside)).toContain(
      "inside the claimed interval, 50.0 % of the margin from its middle",
    );
    expect(intervalsCaption({ ...result, best: { ...result.best, value: 42.001 } })).toContain(
      "in its very middle",
    );
    expect(intervalsCaption({ ...result, best: { ...result.best, value: null } })).toContain(
      "No method bounds",
    );
    const unsolved = { ...result, asSolved: { value: null, null: null, error: null, halfWidth: null } };
    expect(intervalsCaption(unsolved)).toContain("no recomputed solution");
    expect(intervalsCaption(unsolved)).not.toContain("second axis");
    // The null run at 1, the claim at 42: 68 margins on one axis.
    expect(intervalsCaption(result)).toContain("The second axis shows the claim from near.");
    expect(intervalsCaption({ ...result, claimed: null })).toBe("");
  });
});

describe("the caption of the ladder", () => {
  it("places the author's rung and says where the law meets the margin", () => {
    const caption = ladderCaption(result);
    expect(caption).toContain(
      "The author's 256 steps an orbit, ringed, lie inside the shaded window, 2.00 arcsec",
    );
    // 2·256^4/n^4 = 0.2 at n = 256·10^(1/4) = 455.
    expect(caption).toContain("about 460 steps an orbit");
    expect(caption).not.toContain("beyond the finest rung");
    expect(caption).not.toContain("scatter");
  });

  it("says when the window is missing, the rung failed, or the margin is out of reach", () => {
    const changed = (change: Partial<Ladder>, margin = 0.6): string =>
      ladderCaption({
        ...result,
        ladders: [{ ...own, ...change }],
        claimed: { ...result.claimed!, halfWidth: margin },
      });
    expect(changed({ window: null })).toContain("with no window to lie in");
    expect(changed({ window: [5, 7] })).toContain("outside the shaded window");
    expect(changed({}, 1e-9)).toContain("beyond the finest rung");
    expect(changed({ coefficient: null })).not.toContain("law");
    const lost = rungs.map((rung) => (rung.isAuthors ? { ...rung, figure: null } : rung));
    expect(changed({ rungs: lost })).toContain("give no figure");
    const scattered = rungs.map((rung, k) => (k === 3 ? { ...rung, figure: 40 } : rung));
    expect(changed({ rungs: scattered })).toContain("bounds differences that scatter below it");
  });

  it("names the first witness under the margin where there is no solution", () => {
    const witness: Ladder = { ...own, role: "witness", method: "dormand-prince-8" };
    // Off by 2·16^(4 - k): 0.125 at k = 5 is the first under 0.2, at 512 steps.
    expect(ladderCaption({ ...result, ladders: [witness] })).toContain(
      "dormand-prince-8, at 512 steps an orbit",
    );
    const never = { ...witness, rungs: rungs.slice(0, 4) };
    expect(ladderCaption({ ...result, ladders: [never] })).toContain("None of them comes under");
  });
});

describe("the caption of the figure against the step", () => {
  it("weighs the null run against margin and effect", () => {
    const caption = stepsCaption(result);
    // 1 is 1.67 margins of 0.6 and 2.5 % of 40.
    expect(caption).toContain(
      "turns the apsis by 1.00 arcsec/century: 1.67 times the margin and 2.50 % of the effect",
    );
    expect(caption).toContain("The figure itself is off by 2.00.");
  });

  it("tells a subtracted, a small, a missing and an only run apart", () => {
    const subtracted = { ...result, claimed: { ...result.claimed!, baseline: "subtracted" as const } };
    expect(stepsCaption(subtracted)).toContain("the run shows 42.0 and the null run 1.00 arcsec/century");
    const small = { ...result, asSolved: { ...result.asSolved, null: 0.05 } };
    expect(stepsCaption(small)).toContain("less than a tenth of the margin");
    const missing = { ...result, asSolved: { ...result.asSolved, null: null } };
    expect(stepsCaption(missing)).toContain("The null run gives no figure");
    const kepler = {
      ...result,
      asSolved: { ...result.asSolved, null: 42 },
      ladders: [{ ...own, rungs: rungs.map((rung) => ({ ...rung, null: rung.value })) }],
    };
    expect(stepsCaption(kepler)).toContain("Nothing can be switched off here: all of the 42.0");
  });

  it("says where the curves leave the frame", () => {
    // At 256 steps 42, at 128 steps 72, at 64 steps 552: four times the axis of 42 takes in 128 and not 64.
    expect(stepsCaption(result)).toContain("Below 128 steps an orbit the curves leave the frame.");
  });
});

describe("the other captions", () => {
  it("say how far the apsis turned and how straight", () => {
    const caption = passagesCaption(result);
    expect(caption).toContain("Over 4 passages the apsis turns by 3.00 arcsec, in the null run by 0.300.");
    expect(caption).toContain("more than 0.250 arcsec off the straight line");
    const one = { number: [0], angle: [0] };
    expect(passagesCaption({ ...result, passages: { solution: one, null: null } })).toBe("");
  });

  it("say what drifts, by how much and with which power of the step", () => {
    const entry: LedgerEntry = {
      quantity: "energy",
      largest: 1e-8,
      perOrbit: -1e-10,
      pattern: "linear-drift",
      exponent: 1,
      stepOrder: 5,
      series: { orbits: [0, 1], change: [0, 0] },
      says: "The energy drifts.",
    };
    expect(ledgerCaption(entry)).toBe(
      "The energy drifts. Largest relative change 1.00e-8, -1.00e-10 an orbit. It goes as the step to the power of 5.00.",
    );
    // A vector's curve rises while the vector shrinks.
    const vector = { ...entry, series: { orbits: [0, 1], change: [0, 1e-8] } };
    expect(ledgerCaption(vector)).toContain("-1.00e-10 an orbit. The curve is the size of the change");
    const falling = { ...entry, series: { orbits: [0, 1], change: [0, -1e-8] } };
    expect(ledgerCaption(falling)).not.toContain("The curve");
    // Where the swing within an orbit is drawn and not counted.
    const swinging = { ...entry, series: { orbits: [0, 1, 2], change: [0, -3e-8, -1e-8] } };
    expect(ledgerCaption(swinging)).toContain("Largest relative change of the orbits' means 1.00e-8");
    expect(ledgerCaption({ ...entry, pattern: "bounded-oscillation", stepOrder: null })).toBe(
      "The energy drifts. Largest relative change 1.00e-8.",
    );
  });

  it("name the dominant part of the budget and hold it against the margin", () => {
    // 2 against 0.6/3 is ten times.
    expect(budgetCaption(result)).toBe(
      "Together 2.00 arcsec/century in quadrature, 10.0 times what a third of the margin allows; truncation is the part that has to shrink.",
    );
    const of = (total: number): string => budgetCaption({ ...result, budget: { ...result.budget!, total } });
    expect(of(0.1)).toContain("50.0 % of what a third of the margin allows; most of it is truncation");
    expect(of(1e-5)).toContain("less than a hundredth");
    expect(budgetCaption({ ...result, budget: null })).toBe("");
  });
});
