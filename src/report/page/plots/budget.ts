import type { ClaimResult } from "../../../result/result.js";
import { BUDGET_WORDS, size as inWords } from "../../../result/words.js";
import { typeset } from "../typeset.js";

import { axes, logTicks } from "./axes.js";
import { type Canvas, draw } from "./frame.js";

/** The parts of the uncertainty on a logarithmic axis, beside what the quoted margin allows. */
export function budgetPlot(canvas: Canvas, { budget, claimed }: ClaimResult): string | null {
  if (budget === null || claimed === null) return null;
  const parts = (Object.keys(BUDGET_WORDS) as (keyof typeof BUDGET_WORDS)[]).flatMap((key) => {
    const amount = budget[key];
    if (amount === null || amount <= 0) return [];
    return [{ name: BUDGET_WORDS[key], amount, isDominant: key === budget.dominant }];
  });
  if (parts.length === 0) return null;
  const third = claimed.halfWidth / 3;
  const amounts = [...parts.map(({ amount }) => amount), third];
  const low = Math.min(...amounts) / 6;
  const high = Math.max(...amounts) * 2;
  return draw(canvas, {
    id: "budget",
    title: "The parts of the numerical uncertainty",
    says: `In ${claimed.unit}: ${parts.map(({ name, amount }) => `${name} ${typeset(inWords(amount))}`).join(", ")}; a third of the margin is ${typeset(inWords(third))}.`,
    build: (plot, size) => {
      // The longest bar's figure stands behind its end.
      const x: [number, number] = [low, high * (high / low) ** (size === "wide" ? 0.1 : 0.24)];
      const ticks = logTicks(...x, size === "wide" ? 9 : 5);
      return {
        height: 34 + 26 * parts.length + 42,
        marginLeft: 100,
        marginRight: 14,
        x: { type: "log", domain: x },
        y: { domain: parts.map(({ name }) => name), label: null, tickSize: 0 },
        marks: [
          ...axes(plot, { ticks, label: `${claimed.unit} →` }, null),
          plot.ruleX([third], { stroke: "var(--ink)", strokeDasharray: "6 3" }),
          ...parts.flatMap(({ name, amount, isDominant }) => [
            plot.barX([name], {
              y: [name],
              x1: low,
              x2: amount,
              fill: isDominant ? "var(--own)" : "var(--quiet)",
              insetTop: isDominant ? 4 : 8,
              insetBottom: isDominant ? 4 : 8,
            }),
            plot.text([name], {
              x: amount,
              y: [name],
              text: [`${typeset(inWords(amount))}${isDominant && size === "wide" ? ", dominant" : ""}`],
              textAnchor: "start",
              dx: 6,
              fill: "var(--ink)",
              stroke: "var(--paper)",
              fontWeight: isDominant ? "bold" : "normal",
            }),
          ]),
          plot.text([third], {
            x: third,
            frameAnchor: "top",
            dy: -14,
            text: ["a third of the margin"],
            textAnchor: Math.log(third / low) > Math.log(x[1] / low) / 2 ? "end" : "start",
            fill: "var(--ink)",
          }),
        ],
      };
    },
  });
}
