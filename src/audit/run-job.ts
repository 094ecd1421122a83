import type { LoopArithmetic } from "../kernel/arithmetic.js";
import { compileStepLoop } from "../kernel/compile.js";
import { conservedObservables } from "../kernel/observables.js";
import type { StepLoop } from "../kernel/step-loop.js";
import { type CompiledSystem, compileSystem } from "../kernel/system.js";
import { apsidalAdvance } from "../measure/advance.js";
import { stateAfter } from "../measure/early-state.js";
import { eccentricityDrift } from "../measure/eccentricity-vector.js";
import { runLedger } from "../measure/ledger.js";
import { runLimits } from "../measure/limits.js";
import { runPassages } from "../measure/passages.js";
import type { PreparedScenario, Run } from "../measure/run.js";
import type { MethodDefinition } from "../methods/definition.js";
import { earlyDistances } from "../reference/early-distances.js";
import { type PreciseOrbit, preciseOrbit } from "../reference/orbit.js";
import type { AnyJob, Done, Job, Outcome, Reading, ReferenceJob, SystemRecipe, Task } from "./job.js";

interface Built {
  readonly system: CompiledSystem;
  readonly loops: Map<string, StepLoop>;
}

/** Loops built so far in this thread: jobs of one audit share them, and the compiler's work on them. */
const built = new Map<string, Built>();
/** A claim asks for one system; more than a few at once only come from a long list of claims. */
const KEPT_SYSTEMS = 8;

function systemOf(recipe: SystemRecipe): Built {
  const key = JSON.stringify(recipe);
  let known = built.get(key);
  if (known === undefined) {
    if (built.size >= KEPT_SYSTEMS) built.delete(built.keys().next().value!);
    known = { system: compileSystem(recipe.definition, recipe), loops: new Map() };
    built.set(key, known);
  }
  return known;
}

/** The step loop of a method over a system, built once a thread. */
export function loopOf(
  recipe: SystemRecipe,
  method: MethodDefinition,
  arithmetic: LoopArithmetic = "double",
): StepLoop {
  const { system, loops } = systemOf(recipe);
  // By its coefficients: an author's own may go by any name.
  const key = JSON.stringify([arithmetic, method]);
  let loop = loops.get(key);
  if (loop === undefined) {
    loop = compileStepLoop(system, method, arithmetic);
    loops.set(key, loop);
  }
  return loop;
}

/** Does the tasks of a job in order. Pure but for the time it takes: the same job gives the same figures. */
export default function runJob<J extends AnyJob>(job: J): Done<J>;
export default function runJob(job: AnyJob): Outcome[] | PreciseOrbit | number[] {
  if ("kind" in job) {
    return earlyDistances(systemOf(job.system).system, job.method, job.scenario, job.step, job.rungs);
  }
  if ("effect" in job) return follow(job);
  const loop = loopOf(job.system, job.method, job.arithmetic);
  return job.tasks.map((task) => runTask(job, loop, task));
}

function follow({ system, scenario, method, effect, tolerance, evaluations }: ReferenceJob): PreciseOrbit {
  const { parameters, nullParameters } = scenario.precise;
  const values = effect === "on" ? parameters : (nullParameters ?? parameters);
  return preciseOrbit(method, systemOf(system).system, scenario, values, tolerance, evaluations);
}

function runTask(job: Job, loop: StepLoop, task: Task): Outcome {
  const { scenario, system } = job;
  switch (task.kind) {
    case "run":
      return { kind: "run", reading: read(runOf(loop, scenario, task)) };
    case "early": {
      const start = task.state === undefined ? scenario : { ...scenario, state: task.state };
      const after = stateAfter(loop, start, scenario.parameters, task.step, task.steps);
      return { kind: "early", state: after.status === "done" ? after.state : null };
    }
    case "ledger": {
      const run = runPassages(loop, scenario, scenario.parameters, task.step);
      if (run.status !== "ok") return { kind: "ledger", entries: null };
      const watched = conservedObservables(systemOf(system).system, scenario.parameters);
      return {
        kind: "ledger",
        entries: runLedger(loop, scenario, scenario.parameters, task.step, run, watched),
      };
    }
    case "second-reading":
      return { kind: "second-reading", ...secondReading(loop, scenario, task.step) };
  }
}

/**
 * The drift of the eccentricity vector an orbit, rad. In time an orbit is the osculating period; what a radial
 * period differs from it widens the reading. In the angle it is the radial period of the run itself, which a
 * strong field makes much longer than a turn.
 */
function secondReading(
  loop: StepLoop,
  scenario: PreparedScenario,
  step: number,
): { readonly perOrbit: number | null; readonly halfWidth: number | null } {
  const none = { perOrbit: null, halfWidth: null };
  // The vector turns in the plane of the start; an apsis counted from the node does not.
  if (scenario.apsidalAngle === "from-node") return none;
  const advance = apsidalAdvance(runPassages(loop, scenario, scenario.parameters, step));
  if (advance === null) return none;
  const orbit = scenario.apsidalAngle === "polar" ? advance.radialPeriod : scenario.period;
  const drift = eccentricityDrift(loop, scenario, scenario.parameters, step, orbit);
  if (drift === null) return none;
  const stretch = Math.abs(drift.perOrbit * (advance.radialPeriod / orbit - 1));
  return { perOrbit: drift.perOrbit, halfWidth: drift.halfWidth + stretch };
}

function parametersOf(scenario: PreparedScenario, effect: "on" | "off"): readonly number[] {
  return effect === "on" ? scenario.parameters : (scenario.nullParameters ?? scenario.parameters);
}

function runOf(loop: StepLoop, scenario: PreparedScenario, task: Task & { kind: "run" }): Run {
  const start = task.state === undefined ? scenario : { ...scenario, state: task.state };
  const limits = { ...runLimits(scenario, task.step), evaluations: task.evaluations };
  return runPassages(loop, start, parametersOf(scenario, task.effect), task.step, limits);
}

function read(run: Run): Reading {
  const advance = apsidalAdvance(run);
  return {
    status: run.status,
    advance: advance?.perOrbit ?? null,
    advanceError: advance?.perOrbitError ?? null,
    period: advance?.radialPeriod ?? null,
    numbers: run.numbers,
    times: run.times,
    advances: run.advances,
    evaluations: run.evaluations,
    seconds: run.seconds,
  };
}
