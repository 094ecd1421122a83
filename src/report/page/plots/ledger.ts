import type { LedgerEntry } from "../../../result/result.js";
import { typeset } from "../typeset.js";
import { spaced } from "../words.js";
import { axes, linearTicks } from "./axes.js";
import { type Canvas, draw } from "./frame.js";

/** Relative change of one conserved quantity over the span: a small panel. */
export function ledgerPlot(canvas: Canvas, entry: LedgerEntry, index: number): string | null {
  const { orbits, change } = entry.series;
  if (orbits.length < 2) return null;
  const low = Math.min(0, ...change);
  const high = Math.max(0, ...change);
  // A quantity that did not change at all still has its line.
  const span = high - low || Number.EPSILON;
  const y: [number, number] = [low - span * 0.04, high + span * 0.04];
  const ticks = linearTicks(...y, 3);
  const last = orbits.at(-1)!;
  const across = linearTicks(0, last, 5);
  return draw(canvas, {
    id: `ledger-${index}`,
    title: `Relative change of the ${spaced(entry.quantity)}`,
    says: typeset(entry.says),
    sizes: ["narrow"],
    build: (plot) => ({
      height: 200,
      marginLeft: 44,
      marginRight: 14,
      x: { domain: [0, last] },
      y: { domain: y },
      marks: [
        ...axes(
          plot,
          { ticks: across, label: "orbits →" },
          { ticks, label: `↑ ${spaced(entry.quantity)}, relative change${ticks.factor}` },
        ),
        plot.ruleY([0], { stroke: "var(--soft)" }),
        plot.line(change, { x: [...orbits], y: [...change], stroke: "var(--own)", strokeWidth: 1.2 }),
      ],
    }),
  });
}
