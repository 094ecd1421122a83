import type { ClaimResult } from "../../../result/result.js";
import { size as inWords } from "../../../result/words.js";
import { shown } from "../../format.js";
import { typeset } from "../typeset.js";
import { axes, linearTicks } from "./axes.js";
import { type Canvas, draw } from "./frame.js";

interface Row {
  readonly name: string;
  readonly value: number;
  readonly half: number;
  readonly symbol: "circle" | "square" | "triangle" | "diamond2";
  readonly ink: string;
}

type Domain = readonly [number, number];

/** Together within so many margins, the claim's own bar is wide enough to be seen and one axis will do. */
const ONE_AXIS = 30;
/** The second axis takes in what lies within so many margins of the claim: its bar keeps some twelve pixels. */
const NEAR = 100;
/** A bar shorter than this share of the axis lies under its own mark: caps would only blur it. */
const CAPS = 0.012;

/** Claimed and recomputed figures on one axis, and once more from near where that hides the claim's margin. */
export function intervalsPlot(canvas: Canvas, result: ClaimResult): string | null {
  if (result.claimed === null) return null;
  const rows = rowsOf(result);
  const whole = hull(rows);
  const near = zoomOf(result, rows, whole);
  return (
    axis(canvas, result, rows, whole, "all") + (near === null ? "" : axis(canvas, result, rows, near, "near"))
  );
}

/** What the second axis shows, if there is to be one. */
export function isZoomed(result: ClaimResult): boolean {
  if (result.claimed === null) return false;
  const rows = rowsOf(result);
  return zoomOf(result, rows, hull(rows)) !== null;
}

function zoomOf({ claimed }: ClaimResult, rows: readonly Row[], whole: Domain): Domain | null {
  const { value, halfWidth } = claimed!;
  if (whole[1] - whole[0] <= ONE_AXIS * halfWidth) return null;
  const close = rows.filter((row) => Math.abs(row.value - value) <= NEAR * halfWidth);
  const [low, high] = hull(close);
  // At least two margins about the claim, even where everything else falls on it.
  return [Math.min(low, value - 2 * halfWidth), Math.max(high, value + 2 * halfWidth)];
}

function rowsOf({ claimed, asSolved, best }: ClaimResult): Row[] {
  const row = (
    name: string,
    value: number | null,
    half: number | null,
    symbol: Row["symbol"],
    ink: string,
  ): Row[] => (value === null ? [] : [{ name, value, half: half ?? 0, symbol, ink }]);
  return [
    ...row("claimed", claimed!.value, claimed!.halfWidth, "square", "var(--ink)"),
    ...row("as solved", asSolved.value, null, "circle", "var(--own)"),
    ...row("null run", asSolved.null, null, "triangle", "var(--null)"),
    ...row("best value", best.value, best.halfWidth, "diamond2", "var(--ink)"),
  ];
}

function hull(rows: readonly Row[]): Domain {
  return [
    Math.min(...rows.map(({ value, half }) => value - half)),
    Math.max(...rows.map(({ value, half }) => value + half)),
  ];
}

function axis(
  canvas: Canvas,
  { claimed, best }: ClaimResult,
  rows: readonly Row[],
  [low, high]: Domain,
  which: "all" | "near",
): string {
  const pad = (high - low) * 0.07;
  const domain: Domain = [low - pad, high + pad];
  const isInside = ({ value }: Row): boolean => value >= domain[0] && value <= domain[1];
  const fine = Math.max(best.halfWidth ?? 0, claimed!.halfWidth / 20);
  const written = ({ value }: Row): string => typeset(shown(value, fine));
  const list = rows
    .map((row) => `${row.name} ${written(row)}${row.half > 0 ? ` ± ${typeset(inWords(row.half))}` : ""}`)
    .join(", ");
  const outside = rows.filter((row) => !isInside(row));
  const gone =
    outside.length === 0 ? "" : ` Outside this range: ${outside.map(({ name }) => name).join(", ")}.`;
  return draw(canvas, {
    id: `intervals-${which}`,
    title: which === "all" ? "Claimed and recomputed figures" : "The same, close to the claim",
    says: `In ${claimed!.unit}: ${list}.${gone}`,
    build: (plot, size) => {
      const ticks = linearTicks(...domain, size === "wide" ? 7 : 4);
      return {
        height: 30 + 26 * rows.length + 40,
        marginTop: 8,
        marginLeft: 76,
        marginRight: 18,
        x: { domain },
        y: { domain: rows.map(({ name }) => name), label: null, tickSize: 0 },
        marks: [
          ...axes(
            plot,
            {
              ticks,
              label: `${which === "near" ? "close to the claim, " : ""}${claimed!.unit}${ticks.factor} →`,
            },
            null,
          ),
          plot.rectX([claimed!], {
            x1: Math.max(domain[0], claimed!.value - claimed!.halfWidth),
            x2: Math.min(domain[1], claimed!.value + claimed!.halfWidth),
            fill: "var(--wash)",
            inset: -0.5,
          }),
          ...rows.filter(isInside).flatMap((row) => [
            plot.ruleY([row.name], {
              x1: Math.max(row.value - row.half, domain[0]),
              x2: Math.min(row.value + row.half, domain[1]),
              stroke: row.ink,
              strokeWidth: 2,
            }),
            plot.tickX(
              [row.value - row.half, row.value + row.half].filter(
                (end) => row.half > CAPS * (domain[1] - domain[0]) && end >= domain[0] && end <= domain[1],
              ),
              { x: (end: number) => end, y: () => row.name, stroke: row.ink, strokeWidth: 2, inset: 8 },
            ),
            plot.dot([row.name], {
              x: [row.value],
              y: [row.name],
              symbol: row.symbol,
              r: 4.5,
              fill: row.ink,
            }),
          ]),
          ...outside.map((row) =>
            plot.text([row.name], {
              x: [row.value < domain[0] ? domain[0] : domain[1]],
              y: [row.name],
              text: [row.value < domain[0] ? `◂ ${written(row)}` : `${written(row)} ▸`],
              textAnchor: row.value < domain[0] ? "start" : "end",
              dx: row.value < domain[0] ? 4 : -4,
              fill: row.ink,
            }),
          ),
        ],
      };
    },
  });
}
