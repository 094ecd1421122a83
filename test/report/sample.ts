import type { CheckName, ClaimResult, Grade, Ladder, Rung, Verdict } from "../../src/result/result.js";

/**
 * Made-up results for what a real audit seldom or never brings together. The figures follow one law: rk4 at
 * 256 steps an orbit is off by 19.0 and a halving takes 16 off, as on a Mercury-like orbit.
 */
const BEST = 42.98044;
const OFF = 19.0418;

const rungs: readonly Rung[] = Array.from({ length: 8 }, (_, k) => {
  const error = OFF * 16 ** (3 - k);
  return {
    step: 29_688 * 2 ** (3 - k),
    stepsPerOrbit: 32 * 2 ** k,
    status: "ok",
    value: BEST + error,
    null: error,
    figure: BEST + error,
    standardError: 1e-7,
    stateDifference: k === 7 ? null : 1e-3 * 16 ** -k,
    evaluations: 20 * 4 * 32 * 2 ** k,
    seconds: 1e-3 * 2 ** k,
    isAuthors: k === 3,
  };
});

const ladder: Ladder = {
  method: "rk4",
  role: "solution",
  formalOrder: 4,
  stateOrder: 4.02,
  figureOrder: 4,
  figureOrderInterval: [3.99, 4.01],
  window: [0, 7],
  shape: "asymptotic",
  says: "The error falls by 16.0 for each halving from 32 to 4096 steps an orbit: order 4.00.",
  extrapolated: { value: BEST, halfWidth: 4.5e-5 },
  coefficient: OFF * 256 ** 4,
  floor: 1.3e-6,
  rungs,
};

const NAMES: readonly CheckName[] = [
  "reproduces",
  "converges",
  "order",
  "conserves",
  "null",
  "agrees",
  "stands-clear",
  "carries-digits",
  "sampling",
];
const OUTCOMES = ["pass", "caution", "fail", "not-checked"] as const;

const solved: ClaimResult = {
  file: "claims/made-up.yaml",
  title: "A made-up planet",
  verdict: "not-resolved",
  grade: "E",
  digits: 0,
  reason: "The numerics make up too much of the figure: rk4 at 256 steps an orbit is off by 19.0.",
  gradeRule: "The effect does not stand clear of the numerical error.",
  claimed: {
    value: 62.2,
    halfWidth: 0.005,
    unit: "arcsec/century",
    baseline: "included",
    quantity: "apsidal-advance",
    text: "62.20 arcsec/century",
    digits: 4,
  },
  asSolved: { value: BEST + OFF, null: OFF, error: OFF, halfWidth: 2.2e-6 },
  crossReading: { value: 62.01, halfWidth: 4.8 },
  best: {
    value: BEST,
    halfWidth: 9.3e-7,
    from: "extrapolation",
    extrapolated: null,
    says: "The limit of a witness.",
  },
  reference: null,
  rounding: null,
  checks: NAMES.map((name, k) => ({
    name,
    outcome: OUTCOMES[k % 4]!,
    figure: OFF,
    limit: 0.00667,
    unit: "arcsec/century",
    says: `Check ${k + 1} found this.`,
  })),
  budget: {
    truncation: OFF,
    rounding: 6.5e-7,
    readingOff: 1.9e-6,
    methodSpread: 9.3e-7,
    sampling: null,
    total: OFF,
    dominant: "truncation",
  },
  ladders: [ladder, { ...ladder, method: "dormand-prince-8", role: "witness", formalOrder: 8 }],
  ledger: [
    {
      quantity: "energy",
      largest: 9.4e-8,
      perOrbit: -4.9e-9,
      pattern: "linear-drift",
      exponent: 1,
      stepOrder: 5,
      series: { orbits: [0, 10, 20], change: [0, -4.9e-8, -9.8e-8] },
      says: "The energy drifts by the same amount every orbit.",
    },
  ],
  remedy: {
    restated: null,
    options: [
      {
        method: "dormand-prince-8",
        step: "64 steps an orbit",
        stepsPerOrbit: 64,
        relativeCost: 0.79,
        basis: "measured",
      },
    ],
    says: "The quoted margin asks for a numerical error of at most 0.00167 arcsec/century.",
  },
  setup: {
    equations: { name: "made-up", title: "Made up", display: "r'' = -GM/r^2", source: "none", form: "time" },
    parameters: [{ name: "GM", value: 1.327e20, unit: "m^3/s^2" }],
    nullRun: "the same with c without limit",
    start: [{ name: "x", value: 4.6e10, unit: "m" }],
    span: "20 orbits",
    method: { name: "rk4", title: "Classical fourth-order", order: 4, source: "none" },
    arithmetic: "double",
    step: "256 steps an orbit",
    stepsPerOrbit: 256,
    witnesses: [],
  },
  passages: { solution: { number: [0, 1, 2], angle: [0, 0.15, 0.3] }, null: null },
  provenance: { version: "0", claimSha256: "", node: "v20", command: "cupel audit", seconds: 1 },
};

export const madeUp = (changes: Partial<ClaimResult> = {}): ClaimResult => ({ ...solved, ...changes });

const VERDICTS: readonly [Verdict, Grade | null, number | null][] = [
  ["resolved", "A", 4],
  ["partly-resolved", "C", 1],
  ["not-resolved", "E", 0],
  ["contradicted", "D", 0],
  ["undetermined", null, null],
];

/** One of each verdict, and two that lack what most of a report is about. */
export function everyKind(): readonly ClaimResult[] {
  const none = { value: null, null: null, error: null, halfWidth: null };
  const lost = rungs.map((rung) => ({
    ...rung,
    status: "too-few-passages" as const,
    value: null,
    null: null,
    figure: null,
    standardError: null,
    stateDifference: null,
  }));
  const withoutLaw = { window: null, figureOrder: null, coefficient: null, extrapolated: null, floor: null };
  const unread = {
    verdict: "undetermined" as const,
    grade: null,
    digits: null,
    asSolved: none,
    crossReading: null,
    best: { value: null, halfWidth: null, from: null, extrapolated: null, says: "" },
    budget: null,
    remedy: null,
    passages: null,
  };
  return [
    ...VERDICTS.map(([verdict, grade, digits]) => madeUp({ verdict, grade, digits })),
    madeUp({ ...unread, claimed: null, checks: [], ladders: [], ledger: [], setup: null }),
    madeUp({ ...unread, setup: { ...solved.setup!, method: null, step: null, stepsPerOrbit: null } }),
    madeUp({ ...unread, ladders: [{ ...ladder, ...withoutLaw, rungs: lost }] }),
  ];
}
