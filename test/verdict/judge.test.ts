import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { CheckName } from "../../src/result/result.js";
import { ENDINGS } from "../../src/result/words.js";
import { judge } from "../../src/verdict/judge.js";
import { entry, evidence } from "./made-up.js";

const outcome = (made: Parameters<typeof evidence>[0], name: CheckName) =>
  judge(evidence(made)).checks.find((check) => check.name === name)!.outcome;

describe("the verdict", () => {
  it("resolves a sound solution of a right figure, with grade A", () => {
    const judged = judge(evidence());
    expect(judged.verdict).toBe("resolved");
    expect(judged.grade).toBe("A");
    expect(judged.reason).toMatch(/4 quoted digits stand/);
  });

  // The four cases of an orbit like Mercury's: 42.98 is the figure of Nobili and Will, Nature 320, 39 (1986).
  it.each([
    ["62.02 with its baseline", { value: 62.02, baseline: "included" }, { value: 62.0222 }, "not-resolved"],
    ["42.98 with its baseline", { value: 42.98, baseline: "included" }, { value: 62.0222 }, "not-resolved"],
    ["twice the figure", { value: 85.96 }, {}, "contradicted"],
    ["a last digit off by one", { value: 42.99 }, {}, "contradicted"],
    ["an error of a few margins", {}, { value: 42.99 }, "partly-resolved"],
  ] as const)("%s: %j %j is %s", (_, claimed, solution, verdict) =>
    expect(judge(evidence({ claimed, solution })).verdict).toBe(verdict),
  );

  it.each(["escaped", "non-finite", "too-few-passages", "timed-out", "unconverged"] as const)(
    "never resolves a run that ended as %s",
    (status) => {
      const judged = judge(evidence({ solution: { status, value: null, raw: null } }));
      expect(judged.verdict).toBe("not-resolved");
      expect(judged.grade).toBe("E");
      expect(judged.reason).toContain(ENDINGS[status]);
    },
  );

  it.each([
    ["no best value", { best: null }],
    ["witnesses that disagree", { best: { sound: false } }],
    ["a best value not known well enough", { best: { halfWidth: 0.004 } }],
    ["no solution", { solution: null }],
    ["a state order that could not be measured", { own: { stateOrder: null } }],
  ])("is undetermined with %s", (_, made) => expect(judge(evidence(made)).verdict).toBe("undetermined"));

  it("says of a text alone whether the figure is right", () => {
    expect(judge(evidence({ solution: null })).reason).toMatch(/^The figure is right/);
    expect(judge(evidence({ solution: null, claimed: { value: 43.5 } })).reason).toMatch(/off by 0\.520/);
    expect(judge(evidence({ solution: null })).grade).toBeNull();
  });

  it.each([
    ["order", { own: { stateOrder: 1.1 } }],
    ["converges", { own: { window: null, shape: "irregular" } }],
    ["agrees", { witness: { extrapolated: { value: 43, halfWidth: 1e-6 } } }],
  ] as const)("is partly resolved at best, grade D, when only %s fails", (name, made) => {
    const judged = judge(evidence(made));
    expect(judged.verdict).toBe("partly-resolved");
    expect(judged.grade).toBe("D");
    expect(judged.reason).toContain(name);
  });

  it("is E when two of them fail", () => {
    const judged = judge(evidence({ own: { stateOrder: 1.1, window: null, shape: "stalled" } }));
    expect(judged.verdict).toBe("partly-resolved");
    expect(judged.grade).toBe("E");
  });

  it("judges a claim of zero by its margin, since it has no digit", () => {
    const zero = { value: 0, halfWidth: 0.01, digits: 1, baseline: "included" } as const;
    const best = { value: 1e-10, halfWidth: 1e-9 };
    const limits = { extrapolated: { value: 0, halfWidth: 1e-9 } };
    const right = judge(
      evidence({
        claimed: zero,
        best,
        own: limits,
        witness: limits,
        solution: { value: 1e-4, raw: 1e-4, null: 1e-4 },
      }),
    );
    expect(right.verdict).toBe("resolved");
    const wrong = judge(
      evidence({
        claimed: zero,
        best,
        own: limits,
        witness: limits,
        solution: { value: -433, raw: -433, null: -433 },
      }),
    );
    expect(wrong.verdict).toBe("not-resolved");
    expect(wrong.grade).toBe("E");
  });
});

describe("checks", () => {
  it("reproduces: within four thirds of the margin, and hints at the other baseline", () => {
    expect(outcome({ solution: { value: 42.98 + 0.0066 } }, "reproduces")).toBe("pass");
    expect(outcome({ solution: { value: 42.98 + 0.0067 } }, "reproduces")).toBe("fail");
    const included = judge(
      evidence({ claimed: { baseline: "included" }, solution: { value: 62.02222, null: 19.0422 } }),
    );
    expect(included.checks[0]!.says).toMatch(/was the baseline subtracted/);
  });

  it("converges: in the window or finer", () => {
    expect(outcome({ own: { window: [3, 6] } }, "converges")).toBe("pass");
    expect(outcome({ own: { window: [4, 6] } }, "converges")).toBe("fail");
  });

  it("order: nearer to the formal order than to any other", () => {
    expect(outcome({ own: { stateOrder: 4.49 } }, "order")).toBe("pass");
    expect(outcome({ own: { stateOrder: 4.51 } }, "order")).toBe("fail");
    expect(outcome({ own: { stateOrder: 3.49 } }, "order")).toBe("fail");
  });

  it("conserves: a drift of an explicit method may not touch the digits", () => {
    // 2 · 1e-6 · 20 orbits · 42.98 = 0.0017, just above a third of 0.005.
    expect(outcome({ ledger: [entry("energy", { perOrbit: 1e-6 })] }, "conserves")).toBe("fail");
    expect(outcome({ ledger: [entry("energy", { perOrbit: 9e-7 })] }, "conserves")).toBe("pass");
  });

  it("conserves: a symplectic method may not drift, unless too little to matter", () => {
    const conserving = { conserving: true };
    expect(
      outcome({ solution: conserving, ledger: [entry("energy", { perOrbit: 1e-5 })] }, "conserves"),
    ).toBe("fail");
    expect(
      outcome({ solution: conserving, ledger: [entry("energy", { perOrbit: 1e-12 })] }, "conserves"),
    ).toBe("caution");
    const bounded = entry("energy", { pattern: "bounded-oscillation", largest: 1e-3 });
    expect(outcome({ solution: conserving, ledger: [bounded] }, "conserves")).toBe("pass");
  });

  it("null: a tenth of the margin, or subtracted", () => {
    const included = { baseline: "included" } as const;
    expect(outcome({ claimed: included, solution: { null: 4.9e-4 } }, "null")).toBe("pass");
    expect(outcome({ claimed: included, solution: { null: -5.1e-4 } }, "null")).toBe("fail");
    expect(outcome({ solution: { null: 19 } }, "null")).toBe("pass");
  });

  it("stands-clear: ten times the error, and not asked of a claim that contains zero", () => {
    expect(outcome({ solution: { value: 42.98044 + 4.2 } }, "stands-clear")).toBe("pass");
    expect(outcome({ solution: { value: 42.98044 + 4.4 } }, "stands-clear")).toBe("fail");
    expect(outcome({ claimed: { value: 0.001 }, solution: { value: 20 } }, "stands-clear")).toBe("pass");
  });

  it("carries-digits: a third of the margin", () => {
    expect(outcome({ solution: { value: 42.98044 + 0.00166 } }, "carries-digits")).toBe("pass");
    expect(outcome({ solution: { value: 42.98044 + 0.00168 } }, "carries-digits")).toBe("fail");
  });

  it("agrees: a miss that no digit hangs on calls for caution", () => {
    const off = (distance: number) => ({
      witness: { extrapolated: { value: 42.98044 + distance, halfWidth: 1e-6 } },
    });
    // A three-hundredth of the margin of 0.005 is 1.7e-5.
    expect(outcome(off(1.9e-6), "agrees")).toBe("pass");
    expect(outcome(off(1.6e-5), "agrees")).toBe("caution");
    expect(outcome(off(1.8e-5), "agrees")).toBe("fail");
  });

  it("agrees: with caution where the eccentricity vector reads the run differently", () => {
    const reading = (value: number) => ({ solution: { crossReading: { value, halfWidth: 0.1 } } });
    expect(outcome(reading(62.1), "agrees")).toBe("pass");
    expect(outcome(reading(62.2), "agrees")).toBe("caution");
    expect(judge(evidence(reading(62.2))).grade).toBe("B");
  });

  it("sampling: not checked without stored data", () => {
    expect(outcome({}, "sampling")).toBe("not-checked");
  });
});

describe("grade", () => {
  it("is B when a check passes with less than a tenth of its margin", () => {
    expect(judge(evidence({ solution: { value: 42.98044 + 0.0016 } })).grade).toBe("B");
  });

  it("is C when digits are lost but the effect stands", () => {
    expect(judge(evidence({ solution: { value: 42.98044 + 0.003 } })).grade).toBe("C");
  });

  it("is D when the stated solution does not give the claimed figure", () => {
    expect(judge(evidence({ claimed: { value: 85.96 } })).grade).toBe("D");
  });

  it("is E when the effect does not stand clear", () => {
    expect(judge(evidence({ solution: { value: 60 } })).grade).toBe("E");
  });
});

describe("whatever the numbers", () => {
  const number = (low: number, high: number) =>
    fc.integer({ min: 0, max: 1_000_000 }).map((k) => low + ((high - low) * k) / 1_000_000);
  const margin = fc.integer({ min: 1, max: 6 }).map((k) => 10 ** -k);
  const cases = fc.record({
    claimed: fc.record({ value: number(42.95, 43.01), halfWidth: margin }),
    solution: fc.record({ value: number(42.95, 43.01), rounding: margin.map((m) => m / 100) }),
    best: fc.record({
      value: number(42.97, 42.99),
      halfWidth: margin.map((m) => m / 10),
      sound: fc.constantFrom(true, true, false),
    }),
    own: fc.record({
      stateOrder: number(3.4, 4.6),
      window: fc.constantFrom([1, 6] as const, [1, 6] as const, [4, 6] as const, null),
    }),
  });

  it("never resolves against the rules", () => {
    let resolved = 0;
    fc.assert(
      fc.property(cases, (made) => {
        const judged = judge(evidence(made));
        if (judged.verdict !== "resolved") return;
        resolved++;
        const { claimed, solution, best, own } = made;
        const error = Math.abs(solution.value - best.value);
        expect(best.sound).toBe(true);
        expect(Math.abs(claimed.value - best.value)).toBeLessThanOrEqual(claimed.halfWidth + best.halfWidth);
        expect(error + best.halfWidth / 1e6).toBeLessThanOrEqual(claimed.halfWidth / 3);
        expect(best.halfWidth).toBeLessThanOrEqual(claimed.halfWidth / 3);
        expect(Math.abs(own.stateOrder - 4)).toBeLessThanOrEqual(0.5);
        expect(own.window).toEqual([1, 6]);
      }),
      { numRuns: 10_000, seed: 7 },
    );
    expect(resolved).toBeGreaterThan(20);
  });

  it("gives a worse solution no better a verdict", () => {
    const rank = ["undetermined", "not-resolved", "partly-resolved", "resolved"];
    fc.assert(
      fc.property(cases, number(1, 20), (made, factor) => {
        const { best, solution } = made;
        const worse = {
          ...made,
          solution: { ...solution, value: best.value + (solution.value - best.value) * factor },
        };
        const [one, other] = [judge(evidence(made)).verdict, judge(evidence(worse)).verdict];
        // A larger error of the author's own can explain what it did not before: contradicted is no rank.
        if (one === "contradicted" || one === "undetermined" || other === "undetermined") return;
        expect(rank.indexOf(other)).toBeLessThanOrEqual(rank.indexOf(one));
      }),
      { numRuns: 3000, seed: 11 },
    );
  });

  it("says only numbers, or null, in figures and limits", () => {
    fc.assert(
      fc.property(cases, (made) => {
        const judged = judge(evidence(made));
        for (const { figure, limit } of judged.checks) {
          for (const value of [figure, limit]) expect(value === null || Number.isFinite(value)).toBe(true);
        }
      }),
      { numRuns: 500, seed: 3 },
    );
  });
});
