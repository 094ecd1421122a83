import type { QuotedUnit } from "../claim/claim.js";
import type { PreparedScenario } from "../measure/run.js";
import type { Ladder, LadderShape, Rung } from "../result/result.js";
import { figureErrorOf } from "./figure.js";
import type { AnalysedLadder } from "./ladders.js";

/** An analysed ladder as the result states it. */
export function ladderResult(
  ladder: AnalysedLadder,
  scenario: PreparedScenario,
  unit: QuotedUnit,
  authors: number | null,
  subtracted: boolean,
): Ladder {
  const { runs, analysis } = ladder;
  const { method } = runs;
  return {
    method: method.name,
    role: runs.role,
    formalOrder: method.order,
    stateOrder: ladder.stateOrder?.order ?? null,
    figureOrder: analysis.order,
    figureOrderInterval: analysis.orderInterval,
    window: analysis.window,
    shape: analysis.shape,
    says: sentence(ladder, scenario),
    extrapolated: analysis.limit,
    coefficient: coefficient(ladder, scenario),
    floor: ladder.figure.at(-1)?.floor || null,
    rungs: runs.rungs.map((rung, k): Rung => {
      // A null run counts where the claim's figure needs it.
      const needed = subtracted && rung.off !== rung.on ? [rung.on, rung.off] : [rung.on];
      const readings = needed.filter((reading) => reading !== null);
      return {
        step: rung.step,
        stepsPerOrbit: scenario.period / rung.step,
        status: readings.find((reading) => reading.status !== "ok")?.status ?? "ok",
        value: ladder.raw[k]!.value,
        null: ladder.off[k]!.value,
        figure: ladder.figure[k]!.value,
        standardError: figureErrorOf(rung.on, unit),
        stateDifference: ladder.stateDistances.find((d) => d.rung === k)?.value ?? null,
        evaluations: readings.reduce((sum, reading) => sum + reading.evaluations, 0),
        seconds: readings.reduce((sum, reading) => sum + reading.seconds, 0),
        isAuthors: runs.role === "solution" && k === authors,
      };
    }),
  };
}

/**
 * The C of |Q(h) - Q*| = C n^-p with n steps an orbit: the largest over the window, so that the law bounds
 * the errors of a ladder that is not monotone.
 */
function coefficient({ analysis, figure, runs }: AnalysedLadder, scenario: PreparedScenario): number | null {
  const { window, order, limit } = analysis;
  if (window === null || order === null || limit === null) return null;
  let largest = 0;
  for (let k = window[0]; k <= window[1]; k++) {
    const { value, floor } = figure[k]!;
    if (value === null) continue;
    const error = Math.abs(value - limit.value);
    // An error below rounding says nothing of the law.
    if (error > floor) largest = Math.max(largest, error * (scenario.period / runs.rungs[k]!.step) ** order);
  }
  return largest > 0 ? largest : null;
}

function sentence({ runs, analysis }: AnalysedLadder, scenario: PreparedScenario): string {
  const perOrbit = (k: number): string => String(Math.round(scenario.period / runs.rungs[k]!.step));
  const { window, order } = analysis;
  if (analysis.shape === "asymptotic" && window !== null && order !== null) {
    const factor = (2 ** order).toPrecision(3);
    return `The error falls by ${factor} for each halving from ${perOrbit(window[0])} to ${perOrbit(window[1])} steps an orbit: order ${order.toFixed(2)}.`;
  }
  if (analysis.shape === "at-rounding" && window !== null) {
    return `From ${perOrbit(window[0])} steps an orbit on every halving shrinks the change, down to rounding.`;
  }
  return SHAPES[analysis.shape];
}

const SHAPES: Readonly<Record<LadderShape, string>> = {
  asymptotic: "The differences follow one power of the step.",
  "at-rounding": "The figure changes by no more than rounding.",
  divergent: "The differences grow as the step is halved.",
  stalled: "The differences stop shrinking although they stand clear of rounding.",
  oscillating: "The differences shrink, but their sign alternates.",
  irregular: "The differences shrink, but not by one power of the step.",
  "too-short": "Fewer than three rungs gave a figure.",
};
