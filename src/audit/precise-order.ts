import type { Difference } from "../convergence/differences.js";
import { stateOrder } from "../convergence/state-order.js";
import type { PreparedScenario } from "../measure/run.js";
import type { SystemRecipe } from "./job.js";
import type { AnalysedLadder } from "./ladders.js";
import type { JobPool } from "./pool.js";
import { costPerStep } from "./tasks.js";

/** A state order as far off as this from the formal one may be the work of rounding, or of steps still too coarse. */
const DOUBTFUL = 0.4;
/** Evaluations that the double-double runs may take, a quarter of a second; and rungs, the last far below any step. */
const AFFORDABLE = 1e6;
const MOST_RUNGS = 16;
/** Two units of the last place of double-double, for each step. */
const ROUNDING = 2 ** -103;

/**
 * The ladder with its state order measured in double-double, where doubles left it open: a method of high order
 * may be down to rounding before its exponents settle.
 */
export async function withPreciseOrder(
  ladder: AnalysedLadder,
  system: SystemRecipe,
  scenario: PreparedScenario,
  pool: JobPool,
  signal?: AbortSignal,
): Promise<AnalysedLadder> {
  const { method, rungs } = ladder.runs;
  const known = ladder.stateOrder?.order ?? null;
  if (known !== null && Math.abs(known - method.order) <= DOUBTFUL) return ladder;
  const first = rungs[0]!.step * 2 ** ladder.runs.coarserEarly.length;
  const perStep = costPerStep(method);
  let count = 4;
  while (count < MOST_RUNGS && ((2 * scenario.period) / first) * 2 ** count * perStep < AFFORDABLE) count++;
  const distances = await pool.run(
    { kind: "early-distances", system, method, scenario, step: first, rungs: count },
    signal,
  );
  const measured = distances.flatMap((value, rung): Difference[] => {
    const noise = (ROUNDING * scenario.period * 2 ** rung) / first;
    return Number.isFinite(value) ? [{ rung, value, noise, clear: value > 4 * noise }] : [];
  });
  const precise = stateOrder(measured);
  return precise === null ? ladder : { ...ladder, stateOrder: precise };
}
