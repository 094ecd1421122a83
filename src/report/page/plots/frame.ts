import type * as PlotModule from "@observablehq/plot";

export type Plot = typeof PlotModule;
type PlotOptions = PlotModule.PlotOptions;

/** The plotting library and a document to draw in: loaded when the first page is made. */
export interface Canvas {
  readonly plot: Plot;
  readonly document: NonNullable<PlotOptions["document"]>;
}

let loaded: Promise<Canvas> | undefined;

export function canvas(): Promise<Canvas> {
  loaded ??= (async () => {
    const [plot, { parseHTML }] = await Promise.all([import("@observablehq/plot"), import("linkedom")]);
    return {
      plot,
      document: parseHTML("<html><body></body></html>").document as unknown as Canvas["document"],
    };
  })();
  return loaded;
}

/** Wide enough for every label; narrower screens scroll the plot and not the page. */
export const PLOT_WIDTH = 720;

/**
 * Draws a plot as SVG text.
 *
 * @param alternative what the plot shows, for those who do not see it
 */
export function draw({ plot, document }: Canvas, alternative: string, options: PlotOptions): string {
  const svg = plot.plot({
    document,
    width: PLOT_WIDTH,
    marginLeft: 84,
    marginRight: 96,
    marginTop: 28,
    marginBottom: 44,
    style: { fontSize: "12px", fontFamily: "inherit", background: "none", overflow: "visible" },
    ...options,
  });
  // Labels on parts without a role are no help to a screen reader; the whole has one of its own.
  for (const part of svg.querySelectorAll("[aria-label],[aria-description]")) {
    part.removeAttribute("aria-label");
    part.removeAttribute("aria-description");
  }
  svg.setAttribute("role", "img");
  svg.setAttribute("aria-label", alternative);
  return svg.outerHTML;
}

/** A number on an axis: plain where it is short, a power of ten where it is not. */
export function tick(value: number): string {
  const magnitude = Math.abs(value);
  if (magnitude === 0 || (magnitude >= 1e-3 && magnitude < 1e5))
    return minus(String(Number(value.toPrecision(6))));
  const [mantissa, exponent] = value.toExponential().split("e") as [string, string];
  const power = `10${superscript(Number(exponent))}`;
  return Number(mantissa) === 1 ? power : `${minus(mantissa)}·${power}`;
}

export const minus = (text: string): string => text.replaceAll("-", "−");

const SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";
const superscript = (value: number): string =>
  (value < 0 ? "⁻" : "") + [...String(Math.abs(value))].map((digit) => SUPERSCRIPTS[Number(digit)]).join("");

/** Whole powers of ten inside a range, thinned to at most eight. */
export function decades(low: number, high: number): number[] {
  const first = Math.ceil(Math.log10(low) - 1e-9);
  const last = Math.floor(Math.log10(high) + 1e-9);
  const every = Math.max(1, Math.ceil((last - first + 1) / 8));
  const ticks: number[] = [];
  for (let power = first; power <= last; power += every) ticks.push(10 ** power);
  return ticks;
}
