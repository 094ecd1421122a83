import type { PreparedScenario } from "./run.js";

/** Where a run is cut off. Counted in work, never by the clock, so that a run ends the same everywhere. */
export interface RunLimits {
  /** Whole steps. */
  readonly steps: number;
  /** Right-hand-side evaluations; none when left out. */
  readonly evaluations?: number;
}

/**
 * How many times longer than its osculating Newtonian period an orbit may take before the run is cut off.
 * A strong field lengthens the orbit, by a fifth in angle at a periapsis of 15 GM/c²; one that takes four
 * times as long as it should is no longer the orbit that was asked for.
 */
const PATIENCE = 4;

/** Length of the span in the independent variable, as the osculating period puts it: s, or rad. */
export function nominalLength(scenario: PreparedScenario): number {
  return scenario.span.kind === "length" ? scenario.span.length : scenario.span.count * scenario.period;
}

export function runLimits(scenario: PreparedScenario, step: number): RunLimits {
  const patience = scenario.span.kind === "length" ? 1 : PATIENCE;
  // A start just past a periapsis needs up to one orbit more to the first passage.
  const length = nominalLength(scenario) + (scenario.span.kind === "length" ? 0 : scenario.period);
  return { steps: Math.ceil((patience * length) / step) };
}
