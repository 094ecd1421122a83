import { powerOfTen, superscript } from "../typeset.js";
import type { Plot } from "./frame.js";

/** Ticks of an axis and how they are written. */
export interface Ticks {
  readonly values: number[];
  format(value: number): string;
  /** What the written numbers have to be multiplied by, as ` × 10⁻⁹`; empty for 1. */
  readonly factor: string;
}

/**
 * About `count` round numbers in a range, all written with the same decimals. Very large and very small ones
 * are written as multiples of a power of ten that belongs in the axis label.
 */
export function linearTicks(low: number, high: number, count: number): Ticks {
  const rough = (high - low) / count;
  const base = 10 ** Math.floor(Math.log10(rough));
  const step =
    base *
    (rough / base < Math.SQRT2
      ? 1
      : rough / base < Math.sqrt(10)
        ? 2
        : rough / base < Math.sqrt(50)
          ? 5
          : 10);
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  const values = Array.from({ length: last - first + 1 }, (_, k) => (first + k) * step);
  const largest = Math.max(Math.abs(low), Math.abs(high));
  const exponent = largest >= 1e6 || largest < 1e-2 ? Math.floor(Math.log10(largest)) : 0;
  const decimals = Math.min(20, Math.max(0, exponent - Math.floor(Math.log10(step) + 1e-9)));
  return {
    values,
    format: (value) =>
      (value / 10 ** exponent)
        .toFixed(decimals)
        .replace(/^-(?=0(\.0*)?$)/, "")
        .replace("-", "−"),
    factor: exponent === 0 ? "" : ` × 10${superscript(exponent)}`,
  };
}

/** Powers of ten in a range, thinned to at most `most`; with their 2 and 5 multiples where there are few. */
export function logTicks(low: number, high: number, most: number): Ticks {
  const first = Math.ceil(Math.log10(low) - 1e-9);
  const last = Math.floor(Math.log10(high) + 1e-9);
  const every = Math.max(1, Math.ceil((last - first + 1) / most));
  const powers: number[] = [];
  for (let k = Math.ceil(first / every) * every; k <= last; k += every) powers.push(Number(`1e${k}`));
  if (powers.length > 2) return { values: powers, format: powerOfTen, factor: "" };
  const between = [first - 1, ...Array.from({ length: last - first + 1 }, (_, k) => first + k)]
    .flatMap((k) => [1, 2, 5].map((digit) => Number(`${digit}e${k}`)))
    .filter((value) => value >= low && value <= high);
  return { values: between, format: multiple, factor: "" };
}

function multiple(value: number): string {
  if (value >= 1e-3 && value < 1e5) return String(value);
  const [digit, exponent] = value.toExponential(0).split("e") as [string, string];
  const power = `10${superscript(Number(exponent))}`;
  return digit === "1" ? power : `${digit} × ${power}`;
}

/** Steps an orbit at which there are rungs, thinned to `most`, the author's always among them. */
export function rungTicks(steps: readonly number[], authors: number | null, most: number): Ticks {
  const every = Math.max(1, Math.ceil(steps.length / most));
  const keep = authors === null ? steps.length - 1 : Math.max(0, steps.indexOf(authors));
  return {
    values: steps.filter((_, k) => (k - keep) % every === 0),
    format: (value) => String(value < 100 ? Number(value.toPrecision(2)) : Math.round(value)),
    factor: "",
  };
}

/**
 * The two axes with our own ticks, for an axis of categories none. On a logarithmic scale the library would leave
 * out every label that is not of a round number.
 */
export function axes(
  plot: Plot,
  x: { readonly ticks: Ticks; readonly label: string },
  y: { readonly ticks: Ticks; readonly label: string } | null,
) {
  const horizontal = plot.axisX(x.ticks.values, { text: x.ticks.values.map(x.ticks.format), label: x.label });
  if (y === null) return [plot.gridX(x.ticks.values, GRID), horizontal];
  return [
    plot.gridY(y.ticks.values, GRID),
    horizontal,
    plot.axisY(y.ticks.values, { text: y.ticks.values.map(y.ticks.format), label: y.label }),
  ];
}

const GRID = { stroke: "var(--rule)", strokeOpacity: 1 };
