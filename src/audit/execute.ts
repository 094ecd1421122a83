import type { LoopArithmetic } from "../kernel/arithmetic.js";
import type { PreparedScenario } from "../measure/run.js";
import type { MethodDefinition } from "../methods/definition.js";
import type { Outcome, SystemRecipe } from "./job.js";
import type { JobPool } from "./pool.js";
import type { PlannedTask } from "./tasks.js";

export interface ExecuteOptions {
  readonly signal?: AbortSignal;
  /** Called as work is done, with the part of the expected evaluations behind it, 0 to 1. */
  readonly onProgress?: (part: number) => void;
}

/**
 * No job is to be larger than this part of the whole, so that the last one does not keep the others waiting;
 * nor much smaller, since each thread that meets a method compiles its loop anew.
 */
const LARGEST_JOB = 1 / 4;

/**
 * Does planned tasks on a pool, the dearest jobs first. The figures do not depend on how tasks are bundled.
 *
 * @returns the outcome of each task, in the order given
 */
export async function execute(
  pool: JobPool,
  system: SystemRecipe,
  scenario: PreparedScenario,
  tasks: readonly PlannedTask[],
  { signal, onProgress }: ExecuteOptions,
): Promise<Outcome[]> {
  const total = tasks.reduce((sum, task) => sum + task.cost, 0);
  const outcomes = new Array<Outcome>(tasks.length);
  let done = 0;
  onProgress?.(0);
  await Promise.all(
    bundle(tasks, total * LARGEST_JOB).map(async ({ method, arithmetic, indices, cost }) => {
      const results = await pool.run(
        { system, method, arithmetic, scenario, tasks: indices.map((i) => tasks[i]!.task) },
        signal,
      );
      results.forEach((outcome, k) => {
        outcomes[indices[k]!] = outcome;
      });
      done += cost;
      onProgress?.(done / total);
    }),
  );
  return outcomes;
}

interface Bundle {
  readonly method: MethodDefinition;
  readonly arithmetic: LoopArithmetic;
  readonly indices: number[];
  cost: number;
}

/** Tasks of one loop together, cheap ones first in each so that the loop is warm for the dear ones. */
function bundle(tasks: readonly PlannedTask[], largest: number): Bundle[] {
  const bundles: Bundle[] = [];
  const open = new Map<MethodDefinition, Map<LoopArithmetic, Bundle>>();
  const byCost = tasks.map((_, i) => i).sort((a, b) => tasks[a]!.cost - tasks[b]!.cost || a - b);
  for (const i of byCost) {
    const { method, arithmetic, cost } = tasks[i]!;
    const ofMethod = open.get(method) ?? new Map<LoopArithmetic, Bundle>();
    open.set(method, ofMethod);
    let into = ofMethod.get(arithmetic);
    if (into === undefined || into.cost + cost > largest) {
      into = { method, arithmetic, indices: [], cost: 0 };
      ofMethod.set(arithmetic, into);
      bundles.push(into);
    }
    into.indices.push(i);
    into.cost += cost;
  }
  return bundles.sort((a, b) => b.cost - a.cost);
}
