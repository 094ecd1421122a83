import type { Plot } from "./frame.js";

interface Place {
  readonly x: number;
  readonly y: number;
  /** Which side of the place the text is on. */
  readonly side: "left" | "right";
  readonly dx?: number;
  readonly dy?: number;
  readonly ink?: string;
  readonly isBold?: boolean;
}

/** A word in the plot, with paper round it where lines pass. */
export function note(plot: Plot, text: string, place: Place) {
  const { x, y, side, dx = 5, dy = -7, ink = "var(--ink)", isBold = false } = place;
  return plot.text([text], {
    x: [x],
    y: [y],
    text: [text],
    textAnchor: side === "right" ? "start" : "end",
    dx: side === "right" ? dx : -dx,
    dy,
    fill: ink,
    stroke: "var(--paper)",
    strokeWidth: 4,
    fontWeight: isBold ? "bold" : "normal",
  });
}
