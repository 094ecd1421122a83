import type { ClaimResult, Ladder } from "../../../result/result.js";
import { typeset } from "../typeset.js";
import { axes, logTicks, rungTicks } from "./axes.js";
import { distances, type Point } from "./distances.js";
import { type Canvas, draw, type Plot, type Size } from "./frame.js";
import { spread, tag } from "./labels.js";
import { note } from "./notes.js";

interface Line {
  readonly ladder: Ladder;
  readonly isOwn: boolean;
  readonly points: readonly Point[];
}

type Domain = readonly [number, number];

interface Scene {
  readonly lines: readonly Line[];
  readonly own: Ladder | null;
  /** Steps an orbit of the author's rung. */
  readonly authors: number | null;
  readonly x: Domain;
  readonly y: Domain;
  /** A third of the margin. */
  readonly third: number;
  /** Half-width of the best value. */
  readonly bound: number | null;
  /** Without a best value the heights are changes from rung to rung. */
  readonly isChange: boolean;
}

/** Distance from the best value against steps an orbit, for the author's method and, quietly, the witnesses. */
export function ladderPlot(canvas: Canvas, result: ClaimResult): string | null {
  const scene = sceneOf(result);
  if (scene === null) return null;
  const { own, authors, x, y, lines } = scene;
  const { isChange } = scene;
  const what = isChange ? "Change from rung to rung" : "Distance from the best value";
  const unit = result.claimed!.unit;
  return draw(canvas, {
    id: "ladder",
    title: `${what} against the step`,
    says: alternative(lines, what),
    build: (plot, size) => {
      const isWide = size === "wide";
      const steps = own === null ? everyStep(lines) : own.rungs.map(({ stepsPerOrbit }) => stepsPerOrbit);
      return {
        height: HEIGHT[size],
        marginLeft: 46,
        marginRight: isWide ? 142 : 54,
        x: { type: "log", domain: [...x] },
        y: { type: "log", domain: [...y] },
        marks: [
          windowOf(plot, scene),
          ...axes(
            plot,
            { ticks: rungTicks(steps, authors, isWide ? 8 : 4), label: "steps an orbit →" },
            { ticks: logTicks(...y, isWide ? 9 : 7), label: `↑ ${what.toLowerCase()}, ${unit}` },
          ),
          ...levels(plot, scene),
          ...lawLine(plot, scene),
          ...lines.flatMap((line) => markLine(plot, line)),
          ...lawName(plot, scene),
          ...authorsStep(plot, scene),
          ...levelNames(plot, scene),
          ...methodNames(plot, scene, size),
        ],
      };
    },
  });
}

/** Steps an orbit at which any method has a rung. */
const everyStep = (lines: readonly Line[]): number[] =>
  [...new Set(lines.flatMap(({ ladder }) => ladder.rungs.map(({ stepsPerOrbit }) => stepsPerOrbit)))].sort(
    (a, b) => a - b,
  );

const HEIGHT: Readonly<Record<Size, number>> = { wide: 430, narrow: 360 };

function sceneOf({ ladders, best, claimed }: ClaimResult): Scene | null {
  if (claimed === null) return null;
  const lines: Line[] = ladders
    .map((ladder) => ({ ladder, isOwn: ladder.role === "solution", points: distances(ladder, best) }))
    .filter(({ points }) => points.length > 0)
    .toSorted((a, b) => Number(a.isOwn) - Number(b.isOwn));
  const points = lines.flatMap((line) => line.points);
  if (points.length < 2) return null;
  const own = lines.find(({ isOwn }) => isOwn)?.ladder ?? null;
  const third = claimed.halfWidth / 3;
  const heights = [...points.map(({ distance }) => distance), third];
  const steps = ladders.flatMap(({ rungs }) => rungs.map(({ stepsPerOrbit }) => stepsPerOrbit));
  return {
    lines,
    own,
    authors: own?.rungs.find(({ isAuthors }) => isAuthors)?.stepsPerOrbit ?? null,
    x: [Math.min(...steps) / 1.12, Math.max(...steps) * 1.12],
    y: [Math.min(...heights) / 2.5, Math.max(...heights) * 2.5],
    third,
    bound: best.value === null ? null : best.halfWidth,
    isChange: best.value === null,
  };
}

const isShown = (level: number | null | undefined, [low, high]: Domain): level is number =>
  level !== null && level !== undefined && level >= low && level <= high;

function windowOf(plot: Plot, { own, x }: Scene) {
  const window = own?.window ?? null;
  if (own === null || window === null) return null;
  return plot.rectX([own], {
    x1: [Math.max(x[0], own.rungs[window[0]]!.stepsPerOrbit / 1.06)],
    x2: [Math.min(x[1], own.rungs[window[1]]!.stepsPerOrbit * 1.06)],
    fill: "var(--wash)",
  });
}

function levels(plot: Plot, { own, y, third, bound }: Scene) {
  return [
    isShown(bound, y)
      ? plot.rectY([bound], { y1: [y[0]], y2: [bound], fill: "var(--quiet)", fillOpacity: 0.22 })
      : null,
    plot.ruleY([third], { stroke: "var(--ink)", strokeDasharray: "6 3" }),
    isShown(own?.floor, y)
      ? plot.ruleY([own!.floor!], { stroke: "var(--ink)", strokeDasharray: "1 3" })
      : null,
  ];
}

function levelNames(plot: Plot, { own, x, y, third, bound }: Scene) {
  const floor = own?.floor;
  return [
    note(plot, "a third of the margin", { x: x[0], y: third, side: "right" }),
    isShown(floor, y) ? note(plot, "rounding floor", { x: x[1], y: floor, side: "left" }) : null,
    isShown(bound, y) ? note(plot, "± best value", { x: x[0], y: bound, side: "right" }) : null,
  ];
}

function markLine(plot: Plot, { points, isOwn }: Line) {
  const ink = isOwn ? "var(--own)" : "var(--quiet)";
  const channels = { x: points.map(({ n }) => n), y: points.map(({ distance }) => distance) };
  return [
    plot.line(points, { ...channels, stroke: ink, strokeWidth: isOwn ? 2 : 1 }),
    plot.dot(points, { ...channels, r: isOwn ? 3.6 : 1.8, fill: ink }),
  ];
}

/** The fitted law, beyond its window by one rung each way, where it shows from under the line that it fits. */
function lawOf({ own, y, isChange }: Scene): readonly Point[] {
  if (own === null) return [];
  const { coefficient, figureOrder: order, window, rungs } = own;
  if (coefficient === null || order === null || window === null) return [];
  // What is left at half the step has not changed yet.
  const share = isChange ? 1 - 2 ** -order : 1;
  const at = (n: number): Point => ({ n, distance: share * Math.abs(coefficient) * n ** -order });
  return rungs
    .slice(Math.max(0, window[0] - 1), window[1] + 2)
    .map(({ stepsPerOrbit }) => at(stepsPerOrbit))
    .filter(({ distance }) => isShown(distance, y));
}

function lawLine(plot: Plot, scene: Scene) {
  const law = lawOf(scene);
  return [
    plot.line(law, {
      x: law.map(({ n }) => n),
      y: law.map(({ distance }) => distance),
      stroke: "var(--ink)",
      strokeDasharray: "5 4",
    }),
  ];
}

function lawName(plot: Plot, scene: Scene) {
  const law = lawOf(scene);
  const place = law[Math.floor(law.length / 3)];
  if (place === undefined) return [];
  const text = `order ${scene.own!.figureOrder!.toFixed(2)}`;
  return [note(plot, text, { x: place.n, y: place.distance, side: "right", dx: 8 })];
}

function authorsStep(plot: Plot, { lines, authors, x, y }: Scene) {
  if (authors === null) return [];
  const point = lines.find(({ isOwn }) => isOwn)?.points.find(({ n }) => n === authors);
  const side = authors > Math.sqrt(x[0] * x[1]) ? "left" : "right";
  return [
    plot.ruleX([authors], { stroke: "var(--own)", strokeOpacity: 0.55 }),
    point === undefined
      ? null
      : plot.dot([point], { x: [point.n], y: [point.distance], r: 8, stroke: "var(--own)", strokeWidth: 2 }),
    note(plot, "author's step", { x: authors, y: y[1], side, dy: 8, ink: "var(--own)" }),
  ];
}

/** Names at the right end, apart from each other, each with a hair to the end of its line. */
function methodNames(plot: Plot, { lines, x, y }: Scene, size: Size) {
  const height = Math.log(y[1] / y[0]);
  const ends = lines.map(({ points }) => points.at(-1)!);
  const places = spread(
    ends.map(({ distance }) => Math.log(distance / y[0]) / height),
    15 / (HEIGHT[size] - 72),
  ).map((share) => y[0] * Math.exp(share * height));
  return lines.flatMap(({ ladder, isOwn }, k) => [
    plot.link([ladder], {
      x1: [ends[k]!.n],
      y1: [ends[k]!.distance],
      x2: [x[1]],
      y2: [places[k]!],
      stroke: "var(--quiet)",
      strokeWidth: 0.6,
    }),
    note(plot, size === "wide" ? ladder.method : tag(ladder.method), {
      x: x[1],
      y: places[k]!,
      side: "right",
      dy: 0,
      ink: isOwn ? "var(--own)" : "var(--soft)",
      isBold: isOwn,
    }),
  ]);
}

function alternative(lines: readonly Line[], what: string): string {
  const own = lines.find(({ isOwn }) => isOwn)?.ladder;
  const others = lines.filter(({ isOwn }) => !isOwn).map(({ ladder }) => ladder.method);
  const author = own === undefined ? "" : ` The author's ${own.method}: ${own.says}`;
  const witnesses = others.length === 0 ? "" : ` Witnesses: ${others.join(", ")}.`;
  return typeset(`${what} against steps an orbit, both logarithmic.${author}${witnesses}`);
}
