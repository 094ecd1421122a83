import type { Scenario } from "../claim/claim.js";
import type { PreparedScenario } from "./run.js";

/** Why a scenario cannot be run, in a sentence. */
export interface StartProblem {
  readonly problem: string;
}

/** What is needed of a compiled system: the order of its state and of its parameters. */
export interface SystemShape {
  /** Coordinates, then rates, as the equations name them. */
  readonly variables: readonly string[];
  /** Claim names. */
  readonly parameters: readonly string[];
}

/** All of a prepared scenario that the start settles. */
export type Started = Omit<PreparedScenario, "nullParameters" | "span">;

/**
 * Values of the parameters in the order of the system: the claim's own, else the default, else what the
 * start gives.
 */
export function parameterValues(
  { equations, parameters }: Scenario,
  system: SystemShape,
  fromStart: Readonly<Record<string, number>> = {},
): number[] | StartProblem {
  const values: number[] = [];
  for (const name of system.parameters) {
    const value = fromStart[name] ?? parameters[name] ?? equations.parameters[name]?.default;
    if (value === undefined) return { problem: `${equations.name} needs the parameter ${name}` };
    values.push(value);
  }
  return values;
}
