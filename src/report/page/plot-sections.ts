import type { ClaimResult } from "../../result/result.js";
import {
  budgetCaption,
  intervalsCaption,
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
import { typeset } from "./typeset.js";

/** A plot with its caption. */
export interface Figure {
  /** SVG of our own making, in which every text is escaped. */
  readonly svg: string;
  readonly caption: string;
}

/** The plots of the page by section; a list is empty where there is nothing to draw. */
export interface Plots {
  readonly intervals: readonly Figure[];
  readonly ladder: readonly Figure[];
  readonly effect: readonly Figure[];
  readonly ledger: readonly Figure[];
  readonly budget: readonly Figure[];
}

export async function plotsOf(result: ClaimResult): Promise<Plots> {
  const paper = await canvas();
  const list = (svg: string | null, caption: string): Figure[] =>
    svg === null ? [] : [{ svg, caption: typeset(caption) }];
  return {
    intervals: list(intervalsPlot(paper, result), intervalsCaption(result)),
    ladder: list(ladderPlot(paper, result), ladderCaption(result)),
    effect: [
      ...list(stepsPlot(paper, result), stepsCaption(result)),
      ...list(passagesPlot(paper, result), passagesCaption(result)),
    ],
    ledger: result.ledger.flatMap((entry, k) => list(ledgerPlot(paper, entry, k), ledgerCaption(entry))),
    budget: list(budgetPlot(paper, result), budgetCaption(result)),
  };
}
