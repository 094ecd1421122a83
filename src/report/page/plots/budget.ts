import type { ClaimResult } from "../../../result/result.js";
import { BUDGET_WORDS } from "../words.js";
import { type Canvas, decades, draw, tick } from "./frame.js";

/** The parts of the uncertainty on a logarithmic axis, beside what the quoted margin allows. */
export function budgetPlot(canvas: Canvas, { budget, claimed }: ClaimResult): string | null {
  if (budget === null || claimed === null) return null;
  const parts = (Object.keys(BUDGET_WORDS) as (keyof typeof BUDGET_WORDS)[]).flatMap((name) => {
    const size = budget[name];
    return size !== null && size > 0
      ? [{ name: BUDGET_WORDS[name], size, dominant: name === budget.dominant }]
      : [];
  });
  if (parts.length === 0) return null;
  const third = claimed.halfWidth / 3;
  const sizes = [...parts.map(({ size }) => size), third];
  const x: [number, number] = [Math.min(...sizes) / 4, Math.max(...sizes) * 4];
  const { plot } = canvas;
  return draw(
    canvas,
    `Parts of the numerical uncertainty in ${claimed.unit}: ${parts.map(({ name, size }) => `${name} ${size.toPrecision(2)}`).join(", ")}.`,
    {
      height: 60 + 28 * parts.length,
      marginLeft: 110,
      marginRight: 24,
      x: { type: "log", domain: x, label: `${claimed.unit} →`, ticks: decades(...x), tickFormat: tick },
      y: { domain: parts.map(({ name }) => name), label: null, tickSize: 0 },
      marks: [
        plot.gridX(decades(...x), { strokeOpacity: 0.1 }),
        plot.barX(parts, {
          y: "name",
          x1: () => x[0],
          x2: "size",
          fill: "currentColor",
          fillOpacity: (part: (typeof parts)[number]) => (part.dominant ? 0.75 : 0.25),
          insetTop: 5,
          insetBottom: 5,
        } as never),
        plot.ruleX([third], { stroke: "var(--accent)", strokeDasharray: "6 3" }),
        plot.text([third], {
          x: third,
          frameAnchor: "top",
          dy: -14,
          text: () => "a third of the margin",
          fill: "var(--accent)",
        } as never),
      ],
    } as never,
  );
}
