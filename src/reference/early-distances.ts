import { fromDouble, subtract, toDouble, ZERO } from "../arithmetic/double-double.js";
import { compilePreciseLoop, withoutInfinities } from "../kernel/precise-loop.js";
import type { CompiledSystem } from "../kernel/system.js";
import { earlySteps, stateDistance } from "../measure/early-state.js";
import type { PreparedScenario } from "../measure/run.js";
import type { MethodDefinition } from "../methods/definition.js";

/**
 * How far the early states of successive rungs are apart, each step half the last, with every operation in
 * double-double: the order of a method shows where doubles would be down to rounding. Relative, as
 * `stateDistance`; not a number where a run left the numbers.
 */
export function earlyDistances(
  system: CompiledSystem,
  method: MethodDefinition,
  scenario: PreparedScenario,
  coarsestStep: number,
  rungs: number,
): number[] {
  const loop = compilePreciseLoop(system, method);
  const n = system.states.length;
  const parameters = withoutInfinities(scenario.precise.parameters);
  const coarse = earlySteps(coarsestStep, scenario.period);
  const states = Array.from({ length: rungs }, (_, k) => {
    const io = new Float64Array(2 * loop.ioLength);
    scenario.precise.state.forEach(({ high, low }, i) => {
      io[i] = high;
      io[loop.ioLength + i] = low;
    });
    const step = fromDouble(coarsestStep / 2 ** k);
    for (let left = coarse * 2 ** k; left > 0; ) {
      left -= loop.run(io, parameters, step, left);
      // An implicit step that did not converge.
      if (io[2 * n + 2] !== 0) return null;
    }
    return Array.from({ length: n }, (_, i) => ({ high: io[i]!, low: io[loop.ioLength + i]! }));
  });
  const zeros = new Array<number>(n).fill(0);
  return states.slice(1).map((fine, k) => {
    const coarser = states[k]!;
    if (fine === null || coarser === null) return Number.NaN;
    const apart = fine.map((value, i) => toDouble(subtract(value, coarser[i] ?? ZERO)));
    return stateDistance(scenario, apart, zeros);
  });
}
