import type { Claim } from "../claim/claim.js";
import { type BestValue, chooseBest, type MethodEstimate } from "../convergence/best.js";
import { ENSEMBLE_SIZE } from "../convergence/rounding.js";
import { nominalLength } from "../measure/limits.js";
import type { MethodDefinition } from "../methods/definition.js";
import { type ExecuteOptions, execute } from "./execute.js";
import { type Extras, gather } from "./gather.js";
import { type AnalysedLadder, analyseRuns } from "./ladders.js";
import { type LadderPlan, planLadder, rungsWorthRunning } from "./plan.js";
import type { JobPool } from "./pool.js";
import { withPreciseOrder } from "./precise-order.js";
import type { Prepared } from "./prepare.js";
import { findReference, type NoReference, type Reference } from "./reference.js";
import { costPerStep, planTasks } from "./tasks.js";

/** Everything that was run for a claim, analysed; figures in the claim's unit. */
export interface Investigation {
  readonly plan: LadderPlan;
  /** The author's first, where there is one. */
  readonly ladders: readonly AnalysedLadder[];
  readonly solution: AnalysedLadder | null;
  readonly extras: Extras | null;
  readonly estimates: readonly MethodEstimate[];
  /** By extrapolation of the witnesses' ladders. */
  readonly extrapolated: BestValue | null;
  readonly reference: Reference | NoReference;
}

export interface AuditOptions extends ExecuteOptions {
  /** Judge as if the equations could not be solved in double-double. */
  readonly withoutReference?: boolean;
}

/** Methods of this order or less are among the witnesses for the eye. */
const LOW_ORDER = 2;
/** Evaluations that a whole audit takes by choice: some ten seconds on one core. */
const AFFORDABLE = 1e9;
/** Evaluations that it takes where the author's own step asks for them: some minutes. */
const MOST = 2e10;

export async function investigate(
  claim: Claim,
  prepared: Prepared,
  pool: JobPool,
  options: AuditOptions,
): Promise<Investigation | { readonly problem: string }> {
  const { recipe, scenario, witnesses, authorsStep } = prepared;
  const { unit, baseline } = claim.claimed;
  const subtracted = baseline === "subtracted";
  const authors = claim.solution?.method ?? null;
  const methods = authors === null ? [...witnesses] : [authors, ...witnesses];
  const arithmeticOf = (method: MethodDefinition): "double" | "single" =>
    method === authors ? claim.solution!.arithmetic : "double";
  const orbits = nominalLength(scenario) / scenario.period;
  const perStep = methods.reduce((sum, method) => sum + costPerStep(method), 0);
  const cost = (stepsPerOrbit: number): number => stepsPerOrbit * orbits * perStep * (subtracted ? 2 : 1);
  const authorsCost = authorsStep === null ? 0 : cost(scenario.period / authorsStep);
  if (authorsCost > MOST) {
    return {
      problem:
        `the author's step over the span takes ${authorsCost.toExponential(1)} evaluations with ${methods.length} methods, ` +
        `and an audit spends at most ${MOST.toExponential(0)}: a shorter span shows the same, or fewer witnesses`,
    };
  }
  const plan = planLadder(authorsStep, scenario.period, claim.audit.rungs, cost, AFFORDABLE);
  const ensembleCost = (step: number): number => ENSEMBLE_SIZE * cost(scenario.period / step);
  // A witness of low order that nobody asked for shows where it is going; it never carries the value.
  const idle = (method: MethodDefinition): boolean =>
    method !== authors && claim.audit.witnesses === null && method.order <= LOW_ORDER;
  const own = (method: MethodDefinition): { readonly ladder: LadderPlan; readonly ensembleRung: number } => {
    const fewest = Math.min(claim.audit.rungs, plan.steps.length);
    const count = idle(method) ? fewest : rungsWorthRunning(plan, method.order, scenario, fewest);
    const ladder = method === authors ? plan : { ...plan, steps: plan.steps.slice(0, count) };
    let ensembleRung = Math.min(plan.authors ?? Math.floor(plan.steps.length / 2), ladder.steps.length - 1);
    // A coarser rung tells of rounding too, where the ensemble would cost more than the ladder may.
    while (ensembleRung > 0 && ensembleCost(plan.steps[ensembleRung]!) > AFFORDABLE / 2) ensembleRung--;
    return { ladder, ensembleRung };
  };
  const tasks = methods.flatMap((method) =>
    planTasks(method, arithmeticOf(method), scenario, own(method).ladder, own(method).ensembleRung, {
      nullRuns: subtracted || method === authors,
      ledger: method === authors,
      ensemble: !idle(method),
      halvedLedger: authorsCost < AFFORDABLE / 4,
    }),
  );
  const [outcomes, reference] = await Promise.all([
    execute(pool, recipe, scenario, tasks, options),
    options.withoutReference
      ? { none: "none was asked for" }
      : findReference(claim.claimed, prepared, pool, options.signal),
  ]);
  const gathered = methods.map((method) =>
    gather(
      method,
      arithmeticOf(method),
      method === authors ? "solution" : "witness",
      own(method).ladder,
      own(method).ensembleRung,
      scenario.nullParameters === null,
      tasks,
      outcomes,
    ),
  );
  const analysed = gathered.map(({ runs }) => analyseRuns(runs, scenario, unit, subtracted));
  const ladders = await Promise.all(
    analysed.map((ladder) =>
      ladder.runs.role === "witness"
        ? ladder
        : withPreciseOrder(ladder, recipe, scenario, pool, options.signal),
    ),
  );
  const estimates = ladders
    .filter(({ runs }) => runs.role === "witness")
    .flatMap(({ runs, analysis }) =>
      analysis.limit === null ? [] : [{ method: runs.method.name, ...analysis.limit }],
    );
  return {
    plan,
    ladders,
    solution: authors === null ? null : ladders[0]!,
    extras: authors === null ? null : gathered[0]!.extras,
    estimates,
    extrapolated: chooseBest(estimates),
    reference,
  };
}
