import type { ClaimResult } from "../../../result/result.js";
import { type Canvas, draw, tick } from "./frame.js";

interface Row {
  readonly name: string;
  readonly value: number;
  readonly low: number;
  readonly high: number;
  readonly symbol: "circle" | "square" | "triangle" | "diamond2";
}

/** When everything together spans more margins than this, a second axis shows the claim's surroundings. */
const ZOOM_FROM = 30;
/** The second axis shows so many margins to each side. */
const ZOOM = 5;

export interface IntervalPlots {
  readonly whole: string;
  readonly zoomed: string | null;
}

/** Claimed and recomputed figures on one axis; null for a claim that was not read. */
export function intervals(canvas: Canvas, result: ClaimResult): IntervalPlots | null {
  const { claimed } = result;
  if (claimed === null) return null;
  const rows = rowsOf(result);
  const low = Math.min(...rows.map((row) => row.low));
  const high = Math.max(...rows.map((row) => row.high));
  const unit = claimed.unit;
  const says = rows.map(({ name, value }) => `${name} ${Number(value.toPrecision(8))}`).join(", ");
  const whole = axis(canvas, rows, [low, high], unit, `Figures on one axis in ${unit}: ${says}.`);
  if (high - low <= ZOOM_FROM * claimed.halfWidth) return { whole, zoomed: null };
  const near: [number, number] = [
    claimed.value - ZOOM * claimed.halfWidth,
    claimed.value + ZOOM * claimed.halfWidth,
  ];
  return {
    whole,
    zoomed: axis(
      canvas,
      rows,
      near,
      unit,
      `The same close to the claim, from ${near[0]} to ${near[1]} ${unit}.`,
    ),
  };
}

function rowsOf({ claimed, asSolved, best }: ClaimResult): Row[] {
  const row = (name: string, value: number | null, half: number | null, symbol: Row["symbol"]): Row[] =>
    value === null ? [] : [{ name, value, low: value - (half ?? 0), high: value + (half ?? 0), symbol }];
  return [
    ...row("claimed", claimed!.value, claimed!.halfWidth, "square"),
    ...row("as solved", asSolved.value, null, "circle"),
    ...(claimed!.baseline === "included" ? row("null run", asSolved.null, null, "triangle") : []),
    ...row("best value", best.value, best.halfWidth, "diamond2"),
  ];
}

function axis(
  canvas: Canvas,
  rows: readonly Row[],
  [low, high]: readonly [number, number],
  unit: string,
  alternative: string,
): string {
  const { plot } = canvas;
  const pad = (high - low) * 0.06 || 1;
  const domain: [number, number] = [low - pad, high + pad];
  const inside = rows.filter(({ value }) => value >= domain[0] && value <= domain[1]);
  const outside = rows.filter((row) => !inside.includes(row));
  return draw(canvas, alternative, {
    height: 40 + 26 * rows.length + 30,
    marginRight: 24,
    x: { domain, label: `${unit} →`, tickFormat: tick, ticks: 6, nice: false },
    y: { domain: rows.map(({ name }) => name), label: null, tickSize: 0 },
    marks: [
      plot.gridX({ strokeOpacity: 0.12 }),
      plot.ruleY(inside, {
        y: "name",
        x1: (row: Row) => Math.max(row.low, domain[0]),
        x2: (row: Row) => Math.min(row.high, domain[1]),
        stroke: "currentColor",
        strokeWidth: 5,
        strokeOpacity: 0.35,
      }),
      plot.dot(inside, {
        y: "name",
        x: "value",
        symbol: (row: Row) => row.symbol,
        r: 5,
        fill: (row: Row) => (row.name === "claimed" ? "var(--accent)" : "currentColor"),
      }),
      plot.text(outside, {
        y: "name",
        x: (row: Row) => (row.value < domain[0] ? domain[0] : domain[1]),
        text: (row: Row) =>
          row.value < domain[0]
            ? `← ${tick(Number(row.value.toPrecision(6)))}`
            : `${tick(Number(row.value.toPrecision(6)))} →`,
        textAnchor: (row: Row) => (row.value < domain[0] ? "start" : "end"),
        fill: "currentColor",
      } as never),
    ],
    symbol: { type: "identity" },
    color: { type: "identity" },
  } as never);
}
