import type { ClaimResult, Ladder } from "../../../result/result.js";
import { figure, size as inWords } from "../../../result/words.js";
import { typeset } from "../typeset.js";
import { axes, linearTicks, rungTicks } from "./axes.js";
import { type Canvas, draw } from "./frame.js";
import { spread } from "./labels.js";

interface Series {
  readonly label: string;
  readonly ink: string;
  readonly dash: string;
  readonly symbol: "circle" | "triangle" | "square";
  readonly points: readonly { readonly n: number; readonly value: number }[];
}

/** The author's figure against the step, beside its null run's: what of it stays when the effect is off. */
export function stepsPlot(canvas: Canvas, { ladders, claimed, best }: ClaimResult): string | null {
  const own = ladders.find(({ role }) => role === "solution");
  if (own === undefined || claimed === null) return null;
  const series = seriesOf(own, claimed.baseline === "subtracted");
  if (series[0]!.points.length < 2) return null;
  const authors = own.rungs.find(({ isAuthors }) => isAuthors)?.stepsPerOrbit ?? null;
  const y = frame(own, series, best.value);
  const steps = own.rungs.filter(({ status }) => status === "ok").map(({ stepsPerOrbit }) => stepsPerOrbit);
  const x: [number, number] = [Math.min(...steps) / 1.12, Math.max(...steps) * 1.12];
  const fine = claimed.halfWidth / 20;
  const ends = series
    .map(({ label, points }) => `${label} ${typeset(figure(points.at(-1)!.value, fine))}`)
    .join(", ");
  const at = (label: string, value: number | null): string =>
    value === null ? "" : `${label} ${typeset(inWords(value))}`;
  const rung = own.rungs.find(({ isAuthors }) => isAuthors);
  const there =
    rung === undefined
      ? ""
      : [at("raw figure", rung.value), at("null run", rung.null)].filter(Boolean).join(", ");
  return draw(canvas, {
    id: "steps",
    title: "Figure against the step, beside the null run",
    says: `In ${claimed.unit}, at the finest step: ${ends}.${there === "" ? "" : ` At the author's step: ${there}.`}`,
    build: (plot, size) => {
      const isWide = size === "wide";
      const height = isWide ? 320 : 280;
      const ticks = linearTicks(...y, 6);
      const across = rungTicks(steps, authors, isWide ? 8 : 4);
      const share = (value: number): number => (value - y[0]) / (y[1] - y[0]);
      const places = spread(
        series.map(({ points }) => Math.min(1, Math.max(0, share(points.at(-1)!.value)))),
        15 / (height - 72),
      );
      const inFrame = ({ value }: { value: number }): boolean => value >= y[0] && value <= y[1];
      return {
        height,
        marginLeft: 52,
        marginRight: 82,
        x: { type: "log", domain: x },
        y: { domain: y },
        marks: [
          ...axes(
            plot,
            { ticks: across, label: "steps an orbit →" },
            { ticks, label: `↑ ${claimed.unit}${ticks.factor}` },
          ),
          ...(y[0] <= 0 && y[1] >= 0 ? [plot.ruleY([0], { stroke: "var(--soft)" })] : []),
          ...(authors === null ? [] : [plot.ruleX([authors], { stroke: "var(--own)", strokeOpacity: 0.55 })]),
          ...(best.value === null
            ? []
            : [plot.ruleY([best.value], { stroke: "var(--ink)", strokeDasharray: "6 3" })]),
          ...series.toReversed().flatMap(({ points, ink, dash, symbol }) => {
            const inside = points.filter(inFrame);
            return [
              plot.line(points, {
                x: points.map(({ n }) => n),
                y: points.map(({ value }) => value),
                stroke: ink,
                strokeWidth: 1.8,
                strokeDasharray: dash,
                clip: true,
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
          }),
          ...(best.value === null
            ? []
            : [
                plot.text(["best value"], {
                  x: x[0],
                  y: best.value,
                  text: ["best value"],
                  textAnchor: "start",
                  dx: 5,
                  dy: -7,
                  fill: "var(--ink)",
                  stroke: "var(--paper)",
                  strokeWidth: 4,
                }),
              ]),
          ...series.map(({ label, ink }, k) =>
            plot.text([label], {
              x: x[1],
              y: y[0] + places[k]! * (y[1] - y[0]),
              text: [label],
              textAnchor: "start",
              dx: 6,
              fill: ink,
              fontWeight: "bold",
            }),
          ),
        ],
      };
    },
  });
}

function seriesOf({ rungs }: Ladder, isSubtracted: boolean): readonly Series[] {
  const points = (pick: "value" | "null" | "figure") =>
    rungs.flatMap((rung) => {
      const value = rung[pick];
      return value === null ? [] : [{ n: rung.stepsPerOrbit, value }];
    });
  const series: Series[] = [
    {
      label: isSubtracted ? "raw" : "figure",
      ink: "var(--own)",
      dash: "",
      symbol: "circle",
      points: points("value"),
    },
    { label: "null run", ink: "var(--null)", dash: "5 3", symbol: "triangle", points: points("null") },
  ];
  const difference: Series = {
    label: "difference",
    ink: "var(--ink)",
    dash: "2 2",
    symbol: "square",
    points: points("figure"),
  };
  return [...series, ...(isSubtracted ? [difference] : [])].filter(
    (one) => one.points.length > 0 || one === series[0],
  );
}

/**
 * What the axis shows: the best value, zero, and the author's rung with its coarser neighbour. On coarser rungs
 * still, the curves may leave the frame: they often do so by orders of magnitude.
 */
function frame({ rungs }: Ladder, series: readonly Series[], best: number | null): [number, number] {
  const found = rungs.findIndex(({ isAuthors }) => isAuthors);
  const middle = found >= 0 ? found : Math.floor(rungs.length / 2);
  const steps = rungs.slice(Math.max(0, middle - 1)).map(({ stepsPerOrbit }) => stepsPerOrbit);
  const near = series.flatMap(({ points }) =>
    points.filter(({ n }) => steps.includes(n)).map(({ value }) => value),
  );
  const values = [0, ...near, ...(best === null ? [] : [best])];
  const low = Math.min(...values);
  const high = Math.max(...values);
  const pad = (high - low || 1) * 0.06;
  return [low - pad, high + pad];
}
