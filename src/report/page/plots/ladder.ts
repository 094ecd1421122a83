import type { ClaimResult, Ladder } from "../../../result/result.js";
import { typeset } from "../typeset.js";
import { logTicks, rungTicks } from "./axes.js";
import { distances, type Point } from "./distances.js";
import { type Canvas, draw } from "./frame.js";
import { spread, tag } from "./labels.js";

interface Line {
  readonly ladder: Ladder;
  readonly isOwn: boolean;
  readonly points: readonly Point[];
}

/** Distance from the best value against steps an orbit, for the author's method and, quietly, the witnesses. */
export function ladderPlot(canvas: Canvas, result: ClaimResult): string | null {
  const { ladders, best, claimed } = result;
  if (claimed === null) return null;
  const lines: Line[] = ladders
    .map((ladder) => ({ ladder, isOwn: ladder.role === "solution", points: distances(ladder, best) }))
    .filter(({ points }) => points.length > 0)
    .toSorted((a, b) => Number(a.isOwn) - Number(b.isOwn));
  const all = lines.flatMap(({ points }) => points);
  if (all.length < 2) return null;
  const own = lines.find(({ isOwn }) => isOwn)?.ladder ?? null;
  const third = claimed.halfWidth / 3;
  const sizes = [...all.map(({ distance }) => distance), third];
  const y: [number, number] = [Math.min(...sizes) / 2.5, Math.max(...sizes) * 2.5];
  const steps = ladders.flatMap(({ rungs }) => rungs.map(({ stepsPerOrbit }) => stepsPerOrbit));
  const x: [number, number] = [Math.min(...steps) / 1.12, Math.max(...steps) * 1.12];
  const authors = own?.rungs.find(({ isAuthors }) => isAuthors)?.stepsPerOrbit ?? null;
  const place = (distance: number): number => Math.log(distance / y[0]) / Math.log(y[1] / y[0]);
  const at = (share: number): number => y[0] * (y[1] / y[0]) ** share;

  return draw(canvas, {
    id: "ladder",
    title: best.value === null ? "Change of the figure from rung to rung" : "Distance from the best value",
    says: alternative(
      lines.map(({ ladder }) => ladder),
      own,
      best.value === null,
    ),
    build: (plot, size) => {
      const isWide = size === "wide";
      const height = isWide ? 430 : 360;
      const ticks = logTicks(...y, isWide ? 9 : 7);
      const across = rungTicks(
        (own ?? lines[0]!.ladder).rungs.map((r) => r.stepsPerOrbit),
        authors,
        isWide ? 7 : 4,
      );
      const label = (text: string, value: number, edge: "left" | "right") =>
        plot.text([text], {
          x: edge === "left" ? x[0] : x[1],
          y: value,
          text: [text],
          textAnchor: edge === "left" ? "start" : "end",
          dx: edge === "left" ? 5 : -5,
          dy: -7,
          fill: "var(--ink)",
          stroke: "var(--paper)",
          strokeWidth: 4,
        });
      const isShown = (value: number | null): value is number =>
        value !== null && value >= y[0] && value <= y[1];
      const floor = own?.floor ?? null;
      const bound = best.value === null ? null : best.halfWidth;
      const ends = lines.map(({ points }) => points.at(-1)!);
      const places = spread(
        ends.map(({ distance }) => place(distance)),
        15 / (height - 72),
      );
      return {
        height,
        marginLeft: 46,
        marginRight: isWide ? 142 : 54,
        x: {
          type: "log",
          domain: x,
          label: "steps an orbit →",
          ticks: across.values,
          tickFormat: across.format,
        },
        y: {
          type: "log",
          domain: y,
          label: `↑ ${best.value === null ? "change to the next rung" : "distance from the best value"}, ${claimed.unit}`,
          ticks: ticks.values,
          tickFormat: ticks.format,
        },
        marks: [
          ...(own === null || own.window === null
            ? []
            : [
                plot.rectX([own], {
                  x1: Math.max(x[0], own.rungs[own.window[0]]!.stepsPerOrbit / 1.06),
                  x2: Math.min(x[1], own.rungs[own.window[1]]!.stepsPerOrbit * 1.06),
                  fill: "var(--wash)",
                }),
              ]),
          plot.gridY(ticks.values, { stroke: "var(--rule)", strokeOpacity: 1 }),
          ...(isShown(bound)
            ? [plot.rectY([bound], { y1: y[0], y2: bound, fill: "var(--quiet)", fillOpacity: 0.22 })]
            : []),
          plot.ruleY([third], { stroke: "var(--ink)", strokeDasharray: "6 3" }),
          ...(isShown(floor) ? [plot.ruleY([floor], { stroke: "var(--ink)", strokeDasharray: "1 3" })] : []),
          ...(authors === null ? [] : [plot.ruleX([authors], { stroke: "var(--own)", strokeOpacity: 0.55 })]),
          ...lines.flatMap(({ points, isOwn }) => markLine(points, isOwn)),
          ...(own === null ? [] : [lawOf(own, y)].map((law) => lawLine(law))),
          ...lines.flatMap(({ points }, k) =>
            points
              .filter(({ n }) => lines[k]!.isOwn && n === authors)
              .map(({ n, distance }) =>
                plot.dot([n], { x: n, y: distance, r: 8, stroke: "var(--own)", strokeWidth: 2 }),
              ),
          ),
          label("a third of the margin", third, "left"),
          ...(isShown(floor) ? [label(isWide ? "rounding floor" : "rounding", floor, "right")] : []),
          ...(isShown(bound) ? [label("best value ±", bound, "left")] : []),
          ...(authors === null
            ? []
            : [
                plot.text([authors], {
                  x: authors,
                  frameAnchor: "top",
                  dy: 6,
                  dx: authors > Math.sqrt(x[0] * x[1]) ? -5 : 5,
                  textAnchor: authors > Math.sqrt(x[0] * x[1]) ? "end" : "start",
                  text: ["author's step"],
                  fill: "var(--own)",
                  stroke: "var(--paper)",
                  strokeWidth: 4,
                }),
              ]),
          ...lines.flatMap(({ ladder, isOwn }, k) => [
            plot.link([ladder], {
              x1: ends[k]!.n,
              y1: ends[k]!.distance,
              x2: x[1],
              y2: at(places[k]!),
              stroke: "var(--quiet)",
              strokeWidth: 0.6,
            }),
            plot.text([ladder], {
              x: x[1],
              y: at(places[k]!),
              text: [isWide ? ladder.method : tag(ladder.method)],
              textAnchor: "start",
              dx: 4,
              fill: isOwn ? "var(--own)" : "var(--soft)",
              fontWeight: isOwn ? "bold" : "normal",
            }),
          ]),
        ],
      };

      function markLine(points: readonly Point[], isOwn: boolean) {
        const channels = { x: points.map(({ n }) => n), y: points.map(({ distance }) => distance) };
        return isOwn
          ? [
              plot.line(points, { ...channels, stroke: "var(--own)", strokeWidth: 2 }),
              plot.dot(points, { ...channels, r: 3.6, fill: "var(--own)" }),
            ]
          : [
              plot.line(points, { ...channels, stroke: "var(--quiet)", strokeWidth: 1 }),
              plot.dot(points, { ...channels, r: 1.8, fill: "var(--quiet)" }),
            ];
      }

      function lawLine(law: readonly Point[]) {
        return plot.line(law, {
          x: law.map(({ n }) => n),
          y: law.map(({ distance }) => distance),
          stroke: "var(--ink)",
          strokeWidth: 1.2,
          strokeDasharray: "4 4",
        });
      }
    },
  });
}

/** The fitted law over the window, as far as it lies inside the plot. */
function lawOf(
  { coefficient, figureOrder, window, rungs }: Ladder,
  [low, high]: readonly [number, number],
): Point[] {
  if (coefficient === null || figureOrder === null || window === null) return [];
  return rungs
    .slice(window[0], window[1] + 1)
    .map(({ stepsPerOrbit: n }) => ({ n, distance: Math.abs(coefficient) * n ** -figureOrder }))
    .filter(({ distance }) => distance >= low && distance <= high);
}

function alternative(ladders: readonly Ladder[], own: Ladder | null, isChange: boolean): string {
  const what = isChange ? "Change from rung to rung" : "Distance from the best value";
  const others = ladders.filter((ladder) => ladder !== own).map(({ method }) => method);
  return typeset(
    `${what} against steps an orbit, both logarithmic. ${own === null ? "" : `The author's ${own.method}: ${own.says} `}${others.length === 0 ? "" : `Witnesses: ${others.join(", ")}.`}`,
  );
}
