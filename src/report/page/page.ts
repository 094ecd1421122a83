import type { ClaimResult, Ladder } from "../../result/result.js";
import { figure, size } from "../../result/words.js";
import { digitsInWords } from "../terminal.js";
import { clean } from "../text.js";
import {
  bestLine,
  budgetCaption,
  intervalsCaption,
  inUnit,
  ladderCaption,
  ledgerCaption,
  passagesCaption,
  stepsCaption,
} from "./captions.js";
import { budgetPlot } from "./plots/budget.js";
import { canvas } from "./plots/frame.js";
import { intervalsPlot } from "./plots/intervals.js";
import { ladderPlot } from "./plots/ladder.js";
import { ledgerPlot } from "./plots/ledger.js";
import { passagesPlot } from "./plots/passages.js";
import { stepsPlot } from "./plots/steps.js";
import { quotedDigits } from "./quoted-digits.js";
import { template } from "./templates.js";
import { OUTCOME_TITLES, VERDICT_TITLES } from "./words.js";

/** One claim as one HTML file: no network, nothing to load, complete without scripts. */
export async function renderPage(result: ClaimResult): Promise<string> {
  const [paper, render] = await Promise.all([canvas(), template("claim")]);
  const unit = result.claimed?.unit ?? "";
  const plots = [
    section("claimed-and-recomputed", "Claimed and recomputed", [
      { svg: intervalsPlot(paper, result), caption: intervalsCaption(result) },
    ]),
    section("the-ladder", "The ladder", [{ svg: ladderPlot(paper, result), caption: ladderCaption(result) }]),
    section("with-the-effect-switched-off", "With the effect switched off", [
      { svg: stepsPlot(paper, result), caption: stepsCaption(result) },
      { svg: passagesPlot(paper, result), caption: passagesCaption(result) },
    ]),
    section(
      "what-is-conserved",
      "What is conserved",
      result.ledger.map((entry) => ({ svg: ledgerPlot(paper, entry), caption: ledgerCaption(entry) })),
    ),
    section("where-the-uncertainty-is", "Where the uncertainty is", [
      { svg: budgetPlot(paper, result), caption: budgetCaption(result) },
    ]),
  ].filter(({ plots: drawn }) => drawn.length > 0);

  return render({
    title: clean(result.title),
    file: clean(result.file),
    verdict: VERDICT_TITLES[result.verdict],
    kind: result.verdict,
    grade: result.grade,
    gradeRule: result.gradeRule,
    reason: clean(result.reason),
    digits: digitsInWords(result),
    claimed: result.claimed && {
      ...quotedDigits(result.claimed.text, result.verdict === "undetermined" ? null : standing(result)),
      baseline: result.claimed.baseline === "subtracted" ? "less its null run" : "baseline included",
      quantity: result.claimed.quantity.replaceAll("-", " "),
    },
    unit,
    summary: result.claimed && summaryOf(result),
    plots,
    remedy: result.remedy && {
      ...result.remedy,
      options: result.remedy.options.map((option) => ({
        ...option,
        relativeCost: size(option.relativeCost),
      })),
    },
    checks: result.checks.map((check) => ({
      ...check,
      says: clean(check.says),
      outcomeTitle: OUTCOME_TITLES[check.outcome],
      figure: check.figure === null ? "" : size(check.figure),
      limit: check.limit === null ? "" : size(check.limit),
    })),
    ladders: result.ladders.map((ladder) => ladderTable(ladder, result)),
    setup: result.setup && {
      ...result.setup,
      parameters: result.setup.parameters.map(plainNumber),
      start: result.setup.start.map(plainNumber),
      stepsPerOrbit: result.setup.stepsPerOrbit === null ? "" : figure(result.setup.stepsPerOrbit, 0.001),
      method: result.setup.method,
      step: result.setup.step,
    },
    bestSays: result.best.says,
    provenance: {
      ...result.provenance,
      seconds: result.provenance.seconds.toFixed(1),
      command: clean(result.provenance.command),
    },
  });
}

const standing = ({ digits, claimed }: ClaimResult): number | null =>
  digits === null || claimed === null || Math.abs(claimed.value) <= claimed.halfWidth
    ? null
    : Math.min(digits, claimed.digits);

const plainNumber = ({ name, value, unit }: { name: string; value: number; unit: string }) => ({
  name,
  value: String(value),
  unit: unit === "1" ? "" : unit,
});

function summaryOf(result: ClaimResult): { name: string; value: string; note: string }[] {
  const { claimed, asSolved, setup } = result;
  const how =
    setup?.method == null ? "no solution given" : `${setup.method.name}, ${clean(setup.step ?? "")}`;
  const error =
    asSolved.error === null ? "none" : `${size(asSolved.error)} ± ${size(asSolved.halfWidth ?? 0)}`;
  return [
    {
      name: "claimed",
      value: `${claimed!.value} ± ${size(claimed!.halfWidth)}`,
      note: "the author's own margin",
    },
    { name: "as solved", value: inUnit(asSolved.value, claimed), note: how },
    {
      name: "null run",
      value: inUnit(asSolved.null, claimed),
      note: "the same with the effect switched off",
    },
    { name: "best value", value: bestLine(result), note: result.best.from ?? "" },
    { name: "error", value: error, note: "as solved less best value" },
  ];
}

interface Drawn {
  readonly svg: string | null | undefined;
  readonly caption: string;
}

function section(id: string, heading: string, drawn: readonly Drawn[]) {
  return { id, heading, plots: drawn.filter(({ svg }) => svg !== null && svg !== undefined) };
}

function ladderTable(ladder: Ladder, { claimed }: ClaimResult) {
  const order = (value: number | null): string => (value === null ? "none" : value.toFixed(2));
  return {
    method: ladder.method,
    role: ladder.role === "solution" ? "the author's" : "witness",
    says: ladder.says,
    formalOrder: ladder.formalOrder,
    stateOrder: order(ladder.stateOrder),
    figureOrder: order(ladder.figureOrder),
    limit:
      ladder.extrapolated === null
        ? "none"
        : `${figure(ladder.extrapolated.value, ladder.extrapolated.halfWidth)} ± ${size(ladder.extrapolated.halfWidth)}`,
    rungs: ladder.rungs.map((rung, k) => ({
      steps: Math.round(rung.stepsPerOrbit * 10) / 10,
      status: rung.status,
      value: inUnit(rung.value, claimed),
      null: inUnit(rung.null, claimed),
      figure: inUnit(rung.figure, claimed),
      error: rung.standardError === null ? "" : size(rung.standardError),
      evaluations: rung.evaluations,
      isAuthors: rung.isAuthors,
      inWindow: ladder.window !== null && k >= ladder.window[0] && k <= ladder.window[1],
    })),
  };
}
