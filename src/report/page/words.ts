import type { Outcome, RungStatus, Verdict } from "../../result/result.js";

export const VERDICT_TITLES: Readonly<Record<Verdict, string>> = {
  resolved: "Resolved",
  "partly-resolved": "Partly resolved",
  "not-resolved": "Not resolved",
  contradicted: "Contradicted",
  undetermined: "Undetermined",
};

export const OUTCOME_TITLES: Readonly<Record<Outcome, string>> = {
  pass: "passes",
  caution: "caution",
  fail: "fails",
  "not-checked": "not checked",
};

/** A catalog or ledger name as words. */
export const spaced = (name: string): string => name.replaceAll("-", " ");

export const STATUS_WORDS: Readonly<Record<RungStatus, string>> = {
  ok: "ok",
  escaped: "escaped",
  "non-finite": "non-finite",
  "too-few-passages": "too few passages",
  "timed-out": "timed out",
  unconverged: "unconverged",
};
