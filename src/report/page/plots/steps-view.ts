import type { ClaimResult, Ladder } from "../../../result/result.js";

export interface Series {
  readonly label: string;
  readonly ink: string;
  readonly dash: string;
  readonly symbol: "circle" | "triangle" | "square";
  readonly points: readonly { readonly n: number; readonly value: number }[];
}

/** What of the author's ladder and its null run's is to be seen on a linear axis. */
export interface StepsView {
  readonly series: readonly Series[];
  readonly authors: number | null;
  /** Steps an orbit of the rungs shown. */
  readonly steps: readonly number[];
  readonly x: readonly [number, number];
  readonly y: readonly [number, number];
  /** Steps an orbit below which the curves leave the frame; null where they do not. */
  readonly leavesBelow: number | null;
}

/** The next coarser rung is taken in where the axis grows by no more than this for it. */
const STRETCH = 4;

/** Null without a ladder of the author's with at least two figures. */
export function stepsView({ ladders, claimed, best }: ClaimResult): StepsView | null {
  const own = ladders.find(({ role }) => role === "solution");
  if (own === undefined || claimed === null) return null;
  const series = seriesOf(own, claimed.baseline === "subtracted");
  if ((series[0]?.points.length ?? 0) < 2) return null;
  const y = frame(own, series, best.value);
  const ok = own.rungs.filter(({ value }) => value !== null).map(({ stepsPerOrbit }) => stepsPerOrbit);
  const isOutside = (n: number): boolean =>
    series.some(({ points }) =>
      points.some((point) => point.n === n && (point.value < y[0] || point.value > y[1])),
    );
  const lastOutside = ok.findLastIndex(isOutside);
  // The last rung outside is kept, to show where the curves come from.
  const steps = ok.slice(Math.max(0, lastOutside));
  return {
    series,
    authors: own.rungs.find(({ isAuthors }) => isAuthors)?.stepsPerOrbit ?? null,
    steps,
    x: [Math.min(...steps) / 1.1, Math.max(...steps) * 1.1],
    y,
    leavesBelow: lastOutside < 0 ? null : (steps[1] ?? null),
  };
}

function seriesOf({ rungs }: Ladder, isSubtracted: boolean): readonly Series[] {
  const points = (pick: "value" | "null" | "figure") =>
    rungs.flatMap((rung) => {
      const value = rung[pick];
      return value === null ? [] : [{ n: rung.stepsPerOrbit, value }];
    });
  const run: Series = {
    label: isSubtracted ? "raw" : "figure",
    ink: "var(--own)",
    dash: "",
    symbol: "circle",
    points: points("value"),
  };
  const empty: Series = {
    label: "null run",
    ink: "var(--null)",
    dash: "5 3",
    symbol: "triangle",
    // Where nothing can be switched off the null run is the run itself, and one curve is enough.
    points: rungs.every((rung) => rung.null === rung.value) ? [] : points("null"),
  };
  const difference: Series = {
    label: "difference",
    ink: "var(--ink)",
    dash: "2 2",
    symbol: "square",
    points: isSubtracted ? points("figure") : [],
  };
  return [run, empty, difference].filter((one) => one.points.length > 0);
}

/**
 * Zero, the best value, the author's rung and the finer ones, and the next coarser where it does not press the
 * rest flat: coarse rungs are often off by orders of magnitude.
 */
function frame({ rungs }: Ladder, series: readonly Series[], best: number | null): readonly [number, number] {
  const found = rungs.findIndex(({ isAuthors }) => isAuthors);
  const from = found >= 0 ? found : Math.floor(rungs.length / 2);
  const hull = (first: number): readonly [number, number] => {
    const steps = rungs.slice(Math.max(0, first)).map(({ stepsPerOrbit }) => stepsPerOrbit);
    const values = series.flatMap(({ points }) =>
      points.filter(({ n }) => steps.includes(n)).map(({ value }) => value),
    );
    const all = [0, ...values, ...(best === null ? [] : [best])];
    return [Math.min(...all), Math.max(...all)];
  };
  const near = hull(from);
  const wider = hull(from - 1);
  const [low, high] = wider[1] - wider[0] <= STRETCH * (near[1] - near[0]) ? wider : near;
  const pad = (high - low || 1) * 0.06;
  return [low - pad, high + pad];
}
