import type { ClaimResult, PassageSeries } from "../../../result/result.js";
import { size as inWords } from "../../../result/words.js";
import { typeset } from "../typeset.js";
import { axes, linearTicks } from "./axes.js";
import { type Canvas, draw } from "./frame.js";
import { spread } from "./labels.js";

/** The apsidal angle from passage to passage, less whole turns, of the author's run and its null run. */
export function passagesPlot(canvas: Canvas, { passages, claimed }: ClaimResult): string | null {
  if (passages === null || claimed === null || passages.solution.number.length < 2) return null;
  const line = (
    label: string,
    { number, angle }: PassageSeries,
    ink: string,
    dash: string,
    symbol: "circle" | "triangle",
  ) => ({
    label,
    ink,
    dash,
    symbol,
    number: thin(number),
    angle: thin(angle),
  });
  const lines = [
    line("solution", passages.solution, "var(--own)", "", "circle"),
    ...(passages.null === null ? [] : [line("null run", passages.null, "var(--null)", "5 3", "triangle")]),
  ];
  const angles = lines.flatMap(({ angle }) => angle);
  const low = Math.min(0, ...angles);
  const high = Math.max(0, ...angles);
  const y: [number, number] = [low, high === low ? low + 1 : high];
  const first = Math.min(...lines.map(({ number }) => number[0]!));
  const last = Math.max(...lines.map(({ number }) => number.at(-1)!));
  const unit = claimed.unit.split("/")[0];
  const ends = lines
    .map(
      ({ label, number, angle }) =>
        `${label} ${typeset(inWords(angle.at(-1)!))} ${unit} at passage ${number.at(-1)}`,
    )
    .join(", ");
  return draw(canvas, {
    id: "passages",
    title: "Apsidal angle, less whole turns, from passage to passage",
    says: `From 0 at passage ${first}: ${ends}.`,
    build: (plot, size) => {
      const height = size === "wide" ? 300 : 260;
      const ticks = linearTicks(...y, 5);
      const across = linearTicks(first, last, size === "wide" ? 8 : 4);
      const places = spread(
        lines.map(({ angle }) => (angle.at(-1)! - y[0]) / (y[1] - y[0])),
        16 / (height - 72),
      );
      return {
        height,
        marginLeft: 52,
        marginRight: 72,
        x: { domain: [first, last] },
        y: { domain: y },
        marks: [
          ...axes(
            plot,
            { ticks: across, label: "passage →" },
            { ticks, label: `↑ apsidal angle, ${unit}${ticks.factor}` },
          ),
          plot.ruleY([0], { stroke: "var(--soft)" }),
          ...lines.toReversed().map(({ number, angle, ink, dash }) =>
            plot.line(number, {
              x: [...number],
              y: [...angle],
              stroke: ink,
              strokeWidth: 1.8,
              strokeDasharray: dash,
            }),
          ),
          ...lines
            .filter(({ number }) => number.length <= FEW)
            .map(({ number, angle, ink, symbol }) =>
              plot.dot(number, {
                x: [...number],
                y: [...angle],
                symbol,
                r: 3.4,
                fill: symbol === "circle" ? ink : "var(--paper)",
                stroke: ink,
              }),
            ),
          ...lines.map(({ label, ink }, k) =>
            plot.text([label], {
              x: last,
              y: y[0] + places[k]! * (y[1] - y[0]),
              text: [label],
              textAnchor: "start",
              dx: 10,
              fill: ink,
              fontWeight: "bold",
            }),
          ),
        ],
      };
    },
  });
}

/** So many passages can be marked one by one. */
const FEW = 40;
/** More points than this are not told apart at the widest. */
const MOST = 400;

/** Angles run in a line with little to hide between two passages: every n-th will do, the last with them. */
function thin(values: readonly number[]): readonly number[] {
  if (values.length <= MOST) return values;
  const last = values.length - 1;
  return Array.from({ length: MOST }, (_, k) => values[Math.round((k * last) / (MOST - 1))]!);
}
