import type { ClaimResult, Ladder } from "../../../result/result.js";
import { type Canvas, decades, draw, tick } from "./frame.js";

interface Point {
  readonly method: string;
  readonly n: number;
  readonly error: number;
}

/** Error against steps an orbit, both logarithmic, for the author's method and, quietly, the witnesses. */
export function ladderPlot(canvas: Canvas, result: ClaimResult): string | null {
  const { ladders, best, claimed } = result;
  if (best.value === null || claimed === null) return null;
  const own = ladders.find(({ role }) => role === "solution") ?? null;
  const lines = ladders.map((ladder) => ({ ladder, points: pointsOf(ladder, best.value!) }));
  const all = lines.flatMap(({ points }) => points);
  if (all.length < 2) return null;
  const { plot } = canvas;
  const n: [number, number] = [
    Math.min(...all.map((p) => p.n)) / 1.15,
    Math.max(...all.map((p) => p.n)) * 1.15,
  ];
  const errors = all.map((p) => p.error);
  const y: [number, number] = [Math.min(...errors) / 3, Math.max(...errors) * 3];
  const third = claimed.halfWidth / 3;
  const ownPoints = lines.find(({ ladder }) => ladder === own)?.points ?? [];
  const authors = own?.rungs.find(({ isAuthors }) => isAuthors)?.stepsPerOrbit;
  const ends = lines.flatMap(({ points }) => points.slice(-1));
  const floor = own?.floor ?? null;
  const law = own === null ? [] : lawOf(own, y);
  const window = own?.window ?? null;
  return draw(canvas, alternative(result, own), {
    height: 400,
    marginRight: 150,
    x: {
      type: "log",
      domain: n,
      label: "steps an orbit →",
      ticks: rungTicks(own ?? ladders[0]!),
      tickFormat: (v: number) => String(Math.round(v)),
    },
    y: {
      type: "log",
      domain: y,
      label: `↑ distance from the best value, ${claimed.unit}`,
      ticks: decades(...y),
      tickFormat: tick,
    },
    symbol: { type: "identity" },
    color: { type: "identity" },
    marks: [
      plot.gridY(decades(...y), { strokeOpacity: 0.1 }),
      ...(window !== null && own !== null
        ? [
            plot.rectX([own], {
              x1: () => own.rungs[window[0]]!.stepsPerOrbit,
              x2: () => own.rungs[window[1]]!.stepsPerOrbit,
              fill: "currentColor",
              fillOpacity: 0.05,
            }),
          ]
        : []),
      ...(third >= y[0] && third <= y[1]
        ? [
            plot.ruleY([third], { stroke: "var(--accent)", strokeDasharray: "6 3" }),
            plot.text([third], {
              x: n[0],
              y: third,
              text: () => "a third of the margin",
              textAnchor: "start",
              dy: -7,
              dx: 4,
              fill: "var(--accent)",
            } as never),
          ]
        : []),
      ...(floor !== null && floor >= y[0] && floor <= y[1]
        ? [
            plot.ruleY([floor], { stroke: "currentColor", strokeDasharray: "1 4" }),
            plot.text([floor], {
              x: n[0],
              y: floor,
              text: () => "rounding",
              textAnchor: "start",
              dy: -7,
              dx: 4,
              fill: "currentColor",
            } as never),
          ]
        : []),
      ...lines
        .filter(({ ladder }) => ladder !== own)
        .flatMap(({ points }) => [
          plot.line(points, {
            x: "n",
            y: "error",
            stroke: "currentColor",
            strokeOpacity: 0.35,
            strokeWidth: 1,
          }),
          plot.dot(points, { x: "n", y: "error", r: 1.6, fill: "currentColor", fillOpacity: 0.45 }),
        ]),
      plot.line(law, { x: "n", y: "error", stroke: "currentColor", strokeDasharray: "3 3", strokeWidth: 1 }),
      plot.line(ownPoints, { x: "n", y: "error", stroke: "currentColor", strokeWidth: 1.8 }),
      plot.dot(ownPoints, { x: "n", y: "error", r: 3.6, fill: "currentColor" }),
      plot.dot(
        ownPoints.filter((point) => point.n === authors),
        { x: "n", y: "error", r: 8, stroke: "var(--accent)", strokeWidth: 2 },
      ),
      plot.text(spread(ends, y), {
        x: () => n[1],
        y: "at",
        text: "method",
        textAnchor: "start",
        dx: 6,
        fill: "currentColor",
        fontWeight: (point: Point) => (point.method === own?.method ? "bold" : "normal"),
      } as never),
    ],
  } as never);
}

function pointsOf({ method, rungs }: Ladder, best: number): Point[] {
  return rungs.flatMap(({ stepsPerOrbit, figure }) => {
    const error = figure === null ? 0 : Math.abs(figure - best);
    return error > 0 ? [{ method, n: stepsPerOrbit, error }] : [];
  });
}

/** The fitted law over the window, where it lies inside the plot. */
function lawOf(
  { coefficient, figureOrder, window, rungs }: Ladder,
  [low, high]: readonly [number, number],
): Point[] {
  if (coefficient === null || figureOrder === null || window === null) return [];
  return rungs
    .slice(window[0])
    .map(({ stepsPerOrbit: n }) => ({ method: "", n, error: coefficient * n ** -figureOrder }))
    .filter(({ error }) => error >= low && error <= high);
}

const rungTicks = ({ rungs }: Ladder): number[] => {
  const every = Math.ceil(rungs.length / 7);
  return rungs
    .filter((_, k) => (rungs.length - 1 - k) % every === 0)
    .map(({ stepsPerOrbit }) => stepsPerOrbit);
};

/** Labels at the right, moved apart where they would cover each other; positions on the logarithmic axis. */
function spread(ends: readonly Point[], [low, high]: readonly [number, number]): (Point & { at: number })[] {
  const height = Math.log10(high / low);
  const least = height / 22;
  const sorted = ends
    .map((end) => ({ ...end, place: Math.log10(end.error / low) }))
    .sort((a, b) => a.place - b.place);
  for (let k = 1; k < sorted.length; k++) {
    sorted[k]!.place = Math.max(sorted[k]!.place, sorted[k - 1]!.place + least);
  }
  const over = Math.max(0, (sorted.at(-1)?.place ?? 0) - height + least / 2);
  return sorted.map(({ place, ...end }) => ({ ...end, at: low * 10 ** Math.max(0, place - over) }));
}

function alternative({ ladders }: ClaimResult, own: Ladder | null): string {
  const said = own === null ? "" : ` ${own.method}: ${own.says}`;
  return `Error against steps an orbit on logarithmic axes for ${ladders.map(({ method }) => method).join(", ")}.${said}`;
}
