import type { BudgetPart, DriftPattern, Outcome, RungStatus, Verdict } from "../../result/result.js";

export const VERDICTS: Readonly<Record<Verdict, string>> = {
  resolved: "Resolved",
  "partly-resolved": "Partly resolved",
  "not-resolved": "Not resolved",
  contradicted: "Contradicted",
  undetermined: "Undetermined",
};

export const OUTCOMES: Readonly<Record<Outcome, string>> = {
  pass: "passes",
  caution: "caution",
  fail: "fails",
  "not-checked": "not checked",
};

export const STATUSES: Readonly<Record<RungStatus, string>> = {
  ok: "ok",
  escaped: "escaped",
  "non-finite": "non-finite",
  "too-few-passages": "too few passages",
  "timed-out": "timed out",
  unconverged: "unconverged",
};

export const PARTS: Readonly<Record<BudgetPart, string>> = {
  truncation: "truncation",
  rounding: "rounding",
  readingOff: "reading-off",
  methodSpread: "method spread",
  sampling: "sampling",
};

export const PATTERNS: Readonly<Record<DriftPattern, string>> = {
  "rounding-level": "at rounding level",
  "bounded-oscillation": "bounded oscillation",
  "linear-drift": "linear drift",
  "random-walk": "random walk",
  "faster-growth": "faster growth",
  "jumps-at-periapsis": "jumps at periapsis",
};

/** A catalog or ledger name as words. */
export const spaced = (name: string): string => name.replaceAll("-", " ");
