import type * as PlotModule from "@observablehq/plot";

export type Plot = typeof PlotModule;
type PlotOptions = PlotModule.PlotOptions;

/** The plotting library and a document to draw in. */
export interface Canvas {
  readonly plot: Plot;
  readonly document: NonNullable<PlotOptions["document"]>;
}

let loaded: Promise<Canvas> | undefined;

/** Loaded when the first page is made: the two take longer than all that a call for help has. */
export function canvas(): Promise<Canvas> {
  loaded ??= (async () => {
    const [plot, { parseHTML }] = await Promise.all([import("@observablehq/plot"), import("linkedom")]);
    const { document } = parseHTML("<html><body></body></html>");
    return { plot, document: document as unknown as Canvas["document"] };
  })();
  return loaded;
}

/** A plot is drawn at two widths, so that its labels have the same size on a telephone as on a desk. */
export type Size = "wide" | "narrow";
const WIDTHS: Readonly<Record<Size, number>> = { wide: 720, narrow: 340 };
const BOTH: readonly Size[] = ["wide", "narrow"];

export interface Drawing {
  /** Unique on the page. */
  readonly id: string;
  /** A name, as a tooltip and to a screen reader. */
  readonly title: string;
  /** What the plot shows, for those who do not see it. */
  readonly says: string;
  /** The widths that it is drawn at; both when left out. */
  readonly sizes?: readonly Size[];
  build(plot: Plot, size: Size): PlotOptions;
}

/** Draws a plot as SVG text, one `svg` a width; the style sheet shows the one that fits. */
export function draw({ plot, document }: Canvas, drawing: Drawing): string {
  return (drawing.sizes ?? BOTH)
    .map((size) => {
      const svg = plot.plot({
        document,
        width: WIDTHS[size],
        marginTop: 30,
        marginBottom: 42,
        ...drawing.build(plot, size),
      });
      const id = `${drawing.id}-${size}`;
      // Names on parts without a role are no help to a screen reader; the whole has one of its own.
      for (const part of svg.querySelectorAll("[aria-label],[aria-description]")) {
        part.removeAttribute("aria-label");
        part.removeAttribute("aria-description");
      }
      svg.querySelector("style")?.remove();
      svg.removeAttribute("font-family");
      svg.removeAttribute("font-size");
      svg.setAttribute("class", drawing.sizes === undefined ? size : "fixed");
      svg.setAttribute("role", "img");
      svg.setAttribute("aria-labelledby", `${id}-title ${id}-says`);
      const said = (tag: string, name: string, text: string) => {
        const element = document.createElementNS("http://www.w3.org/2000/svg", tag);
        element.setAttribute("id", `${id}-${name}`);
        element.textContent = text;
        return element;
      };
      svg.prepend(said("title", "title", drawing.title), said("desc", "says", drawing.says));
      return svg.outerHTML;
    })
    .join("");
}
