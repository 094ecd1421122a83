import type { LedgerEntry } from "../../../result/result.js";
import { type Canvas, draw, tick } from "./frame.js";

/** Relative change of one conserved quantity over the span. */
export function ledgerPlot(canvas: Canvas, entry: LedgerEntry): string | null {
  const { orbits, change } = entry.series;
  if (orbits.length < 2) return null;
  const points = orbits.map((orbit, i) => ({ orbit, change: change[i]! }));
  const { plot } = canvas;
  return draw(
    canvas,
    `Relative change of the ${entry.quantity.replaceAll("-", " ")} against orbits. ${entry.says}`,
    {
      height: 190,
      marginRight: 24,
      x: { label: "orbits →", ticks: 8 },
      y: { label: "↑ relative change", tickFormat: tick, ticks: 4, nice: true },
      marks: [
        plot.gridY({ strokeOpacity: 0.1 }),
        plot.ruleY([0], { strokeOpacity: 0.5 }),
        plot.line(points, { x: "orbit", y: "change", stroke: "currentColor", strokeWidth: 1 }),
      ],
    } as never,
  );
}
