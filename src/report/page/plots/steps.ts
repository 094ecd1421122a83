import type { ClaimResult } from "../../../result/result.js";
import { type Canvas, draw, tick } from "./frame.js";

interface Point {
  readonly n: number;
  readonly value: number;
}

/** The run's figure against the step, beside its null run's: what of it stays when the effect is off. */
export function stepsPlot(canvas: Canvas, { ladders, claimed, best }: ClaimResult): string | null {
  const own = ladders.find(({ role }) => role === "solution");
  if (own === undefined || claimed === null) return null;
  const points = (pick: "value" | "null"): Point[] =>
    own.rungs.flatMap((rung) => {
      const value = rung[pick];
      return value === null ? [] : [{ n: rung.stepsPerOrbit, value }];
    });
  const run = points("value");
  const base = points("null");
  if (run.length < 2) return null;
  const { plot } = canvas;
  const authors = own.rungs.find(({ isAuthors }) => isAuthors)?.stepsPerOrbit;
  const shown = authors === undefined ? run : run.filter(({ n }) => n >= authors / 4);
  const rest = base.filter(({ n }) => shown.some((point) => point.n === n));
  const x: [number, number] = [
    Math.min(...shown.map((p) => p.n)) / 1.1,
    Math.max(...shown.map((p) => p.n)) * 1.1,
  ];
  return draw(canvas, `The figure of ${own.method} and of its null run against steps an orbit.`, {
    height: 280,
    x: {
      type: "log",
      domain: x,
      label: "steps an orbit →",
      ticks: shown.map((p) => p.n),
      tickFormat: (v: number) => String(Math.round(v)),
    },
    y: { label: `↑ ${claimed.unit}`, tickFormat: tick, ticks: 6, nice: true, zero: true },
    color: { type: "identity" },
    symbol: { type: "identity" },
    marks: [
      plot.gridY({ strokeOpacity: 0.1 }),
      plot.ruleY([0], { strokeOpacity: 0.5 }),
      ...(best.value === null || claimed.baseline === "subtracted"
        ? []
        : [plot.ruleY([best.value], { stroke: "var(--accent)", strokeDasharray: "6 3" })]),
      plot.line(rest, { x: "n", y: "value", stroke: "currentColor", strokeDasharray: "2 3" }),
      plot.dot(rest, {
        x: "n",
        y: "value",
        symbol: "triangle",
        r: 4,
        stroke: "currentColor",
        fill: "var(--paper)",
      }),
      plot.line(shown, { x: "n", y: "value", stroke: "currentColor", strokeWidth: 1.6 }),
      plot.dot(shown, { x: "n", y: "value", r: 3.6, fill: "currentColor" }),
      plot.dot(
        shown.filter(({ n }) => n === authors),
        { x: "n", y: "value", r: 8, stroke: "var(--accent)", strokeWidth: 2 },
      ),
      plot.text(shown.slice(-1), {
        x: "n",
        y: "value",
        text: () => "run",
        dx: 12,
        textAnchor: "start",
        fill: "currentColor",
      } as never),
      plot.text(rest.slice(-1), {
        x: "n",
        y: "value",
        text: () => "null run",
        dx: 12,
        textAnchor: "start",
        fill: "currentColor",
      } as never),
    ],
  } as never);
}
