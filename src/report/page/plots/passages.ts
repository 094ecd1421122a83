import type { ClaimResult, PassageSeries } from "../../../result/result.js";
import { type Canvas, draw, tick } from "./frame.js";

/** The apsidal angle from passage to passage, less whole turns, of the author's run and its null run. */
export function passagesPlot(canvas: Canvas, { passages, claimed }: ClaimResult): string | null {
  if (passages === null || claimed === null) return null;
  const { plot } = canvas;
  const rows = ({ number, angle }: PassageSeries) => thin(number.map((k, i) => ({ k, angle: angle[i]! })));
  const run = rows(passages.solution);
  const base = passages.null === null ? [] : rows(passages.null);
  const unit = claimed.unit.split("/")[0];
  return draw(
    canvas,
    "Apsidal angle less whole turns against the passage number, for the run and its null run.",
    {
      height: 260,
      x: { label: "passage →", ticks: 8 },
      y: { label: `↑ apsidal angle, ${unit}`, tickFormat: tick, ticks: 6 },
      marks: [
        plot.gridY({ strokeOpacity: 0.1 }),
        plot.ruleY([0], { strokeOpacity: 0.5 }),
        plot.line(base, { x: "k", y: "angle", stroke: "currentColor", strokeDasharray: "2 3" }),
        plot.line(run, { x: "k", y: "angle", stroke: "currentColor", strokeWidth: 1.6 }),
        plot.text(run.slice(-1), {
          x: "k",
          y: "angle",
          text: () => "run",
          dx: 8,
          textAnchor: "start",
          fill: "currentColor",
        } as never),
        plot.text(base.slice(-1), {
          x: "k",
          y: "angle",
          text: () => "null run",
          dx: 8,
          textAnchor: "start",
          fill: "currentColor",
        } as never),
      ],
    } as never,
  );
}

const MOST = 400;

function thin<T>(points: readonly T[]): readonly T[] {
  if (points.length <= MOST) return points;
  return Array.from({ length: MOST }, (_, i) => points[Math.round((i * (points.length - 1)) / (MOST - 1))]!);
}
