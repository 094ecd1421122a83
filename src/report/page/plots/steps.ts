import type { ClaimResult } from "../../../result/result.js";
import { size as inWords } from "../../../result/words.js";
import { shown } from "../../format.js";
import { typeset } from "../typeset.js";
import { axes, linearTicks, rungTicks } from "./axes.js";
import { clip } from "./clip.js";
import { type Canvas, draw, type Plot } from "./frame.js";
import { spread } from "./labels.js";
import { note } from "./notes.js";
import { type Series, type StepsView, stepsView } from "./steps-view.js";

/** The author's figure against the step, beside its null run's: what of it stays when the effect is off. */
export function stepsPlot(canvas: Canvas, result: ClaimResult): string | null {
  const view = stepsView(result);
  if (view === null) return null;
  const { series, authors, steps, x, y } = view;
  const { unit } = result.claimed!;
  const best = result.best.value;
  return draw(canvas, {
    id: "steps",
    title: "The figure against the step, beside its null run",
    says: alternative(result, view),
    build: (plot, size) => {
      const isWide = size === "wide";
      const height = isWide ? 320 : 280;
      const ticks = linearTicks(...y, 6);
      const at = (share: number): number => y[0] + share * (y[1] - y[0]);
      const places = spread(
        series.map(({ points }) => Math.min(1, Math.max(0, (points.at(-1)!.value - y[0]) / (y[1] - y[0])))),
        15 / (height - 72),
      );
      return {
        height,
        marginLeft: 52,
        marginRight: 82,
        x: { type: "log", domain: [...x] },
        y: { domain: [...y] },
        marks: [
          ...axes(
            plot,
            { ticks: rungTicks(steps, authors, isWide ? 8 : 4), label: "steps an orbit →" },
            { ticks, label: `↑ ${unit}${ticks.factor}` },
          ),
          y[0] <= 0 && y[1] >= 0 ? plot.ruleY([0], { stroke: "var(--soft)" }) : null,
          authors === null ? null : plot.ruleX([authors], { stroke: "var(--own)", strokeOpacity: 0.55 }),
          best === null ? null : plot.ruleY([best], { stroke: "var(--ink)", strokeDasharray: "6 3" }),
          ...series.toReversed().flatMap((one) => curve(plot, one, view)),
          best === null ? null : note(plot, "best value", { x: x[0], y: best, side: "right" }),
          authors === null
            ? null
            : note(plot, "author's step", {
                x: authors,
                y: at(freeShare(view, best)),
                side: "right",
                dy: 0,
                ink: "var(--own)",
              }),
          ...series.map(({ label, ink }, k) =>
            note(plot, label, { x: x[1], y: at(places[k]!), side: "right", dx: 6, dy: 0, ink, isBold: true }),
          ),
        ],
      };
    },
  });
}

/** The height for a label at the author's step that is farthest from what is drawn there. */
function freeShare({ series, authors, y }: StepsView, best: number | null): number {
  const share = (value: number): number => (value - y[0]) / (y[1] - y[0]);
  const drawn = [
    share(0),
    ...(best === null ? [] : [share(best)]),
    ...series.flatMap(({ points }) => {
      const k = points.findIndex(({ n }) => n === authors);
      return points.slice(Math.max(0, k), k + 2).map(({ value }) => share(value));
    }),
  ];
  const room = (place: number): number => Math.min(...drawn.map((one) => Math.abs(one - place)));
  return [0.95, 0.75, 0.5, 0.25, 0.05].reduce((one, other) => (room(other) > room(one) ? other : one));
}

function curve(plot: Plot, { points, ink, dash, symbol }: Series, { x, y }: StepsView) {
  const inside = points.filter(({ n, value }) => n >= x[0] && value >= y[0] && value <= y[1]);
  const line = clip(
    points.filter(({ n }) => n >= x[0]),
    y,
  );
  return [
    plot.line(line, {
      x: line.map(({ n }) => n),
      y: line.map(({ value }) => value),
      stroke: ink,
      strokeWidth: 1.8,
      strokeDasharray: dash,
    }),
    plot.dot(inside, {
      x: inside.map(({ n }) => n),
      y: inside.map(({ value }) => value),
      symbol,
      r: 4,
      fill: symbol === "circle" ? ink : "var(--paper)",
      stroke: ink,
      strokeWidth: 1.6,
    }),
  ];
}

function alternative({ ladders, claimed, best }: ClaimResult, { series }: StepsView): string {
  const fine = Math.max(claimed!.halfWidth / 20, best.halfWidth ?? 0);
  const ends = series.map(({ label, points }) => `${label} ${shown(points.at(-1)!.value, fine)}`).join(", ");
  const rung = ladders.find(({ role }) => role === "solution")?.rungs.find(({ isAuthors }) => isAuthors);
  const there = [
    ...(rung?.value == null ? [] : [`raw figure ${shown(rung.value, fine)}`]),
    ...(rung?.null == null ? [] : [`null run ${inWords(rung.null)}`]),
  ].join(", ");
  const authors = there === "" ? "" : ` At the author's step: ${there}.`;
  return typeset(`In ${claimed!.unit}, at the finest step: ${ends}.${authors}`);
}
