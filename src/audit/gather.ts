import { ENSEMBLE_SIZE } from "../convergence/rounding.js";
import type { LedgerReading } from "../measure/ledger.js";
import type { MethodDefinition } from "../methods/definition.js";
import type { Outcome, Reading } from "./job.js";
import type { MethodRuns } from "./method-runs.js";
import type { LadderPlan } from "./plan.js";
import type { PlannedTask } from "./tasks.js";

/** What was run with the author's method besides its ladder. */
export interface Extras {
  readonly ledger: readonly LedgerReading[] | null;
  readonly halvedLedger: readonly LedgerReading[] | null;
  /** rad an orbit, with its half-width. */
  readonly secondReading: { readonly perOrbit: number; readonly halfWidth: number } | null;
}

type Mutable<T> = { -readonly [K in keyof T]: T[K] };

/** Puts the outcomes of one method's tasks in their places. */
export function gather(
  method: MethodDefinition,
  arithmetic: MethodRuns["arithmetic"],
  role: MethodRuns["role"],
  ladder: LadderPlan,
  ensembleRung: number,
  sharedNull: boolean,
  tasks: readonly PlannedTask[],
  outcomes: readonly Outcome[],
): { readonly runs: MethodRuns; readonly extras: Extras } {
  const none = <T>(count: number): (T | null)[] => new Array<T | null>(count).fill(null);
  const rungs = ladder.steps.map((step) => ({
    step,
    on: null as Reading | null,
    off: null as Reading | null,
    early: null as readonly number[] | null,
  }));
  const coarserEarly: (readonly number[] | null)[] = [];
  const finerEarly: (readonly number[] | null)[] = [];
  const ensemble = {
    rung: ensembleRung,
    on: none<Reading>(ENSEMBLE_SIZE),
    off: none<Reading>(ENSEMBLE_SIZE),
    early: none<readonly number[]>(ENSEMBLE_SIZE),
    lessRounded: { on: null as Reading | null, off: null as Reading | null },
  };
  const extras: Mutable<Extras> = { ledger: null, halvedLedger: null, secondReading: null };

  tasks.forEach(({ method: of, slot }, i) => {
    if (of !== method) return;
    const outcome = outcomes[i]!;
    if (outcome.kind === "run" && slot.in === "less-rounded") {
      ensemble.lessRounded[slot.field] = outcome.reading;
    } else if (
      outcome.kind === "run" &&
      (slot.in === "rung" || slot.in === "ensemble") &&
      slot.field !== "early"
    ) {
      if (slot.in === "rung") rungs[slot.rung]![slot.field] = outcome.reading;
      else ensemble[slot.field][slot.member] = outcome.reading;
    } else if (outcome.kind === "early") {
      if (slot.in === "rung") rungs[slot.rung]!.early = outcome.state;
      else if (slot.in === "ensemble") ensemble.early[slot.member] = outcome.state;
      else if (slot.in === "coarser-early") coarserEarly[slot.index] = outcome.state;
      else if (slot.in === "finer-early") finerEarly[slot.index] = outcome.state;
    } else if (outcome.kind === "ledger" && slot.in === "ledger") {
      extras[slot.halved ? "halvedLedger" : "ledger"] = outcome.entries;
    } else if (outcome.kind === "second-reading" && outcome.perOrbit !== null && outcome.halfWidth !== null) {
      extras.secondReading = { perOrbit: outcome.perOrbit, halfWidth: outcome.halfWidth };
    }
  });
  // Where nothing can vanish the run is its own null run.
  if (sharedNull) {
    for (const rung of rungs) rung.off = rung.on;
    ensemble.off = ensemble.on;
    ensemble.lessRounded.off = ensemble.lessRounded.on;
  }
  return { runs: { method, arithmetic, role, rungs, coarserEarly, finerEarly, ensemble }, extras };
}
