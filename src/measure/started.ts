import type { Scenario } from "../claim/claim.js";
import type { PreparedScenario } from "./run.js";

/** Why a scenario cannot be run, in a sentence. */
export interface StartProblem {
  readonly problem: string;
}

/** What is needed of a `CompiledSystem`: the order of its state and of its parameters. */
export interface SystemShape {
  /** Coordinates, then rates, as the equations name them. */
  readonly states: readonly string[];
  /** Claim names of those that a loop takes; the others are folded in at their defaults. */
  readonly parameters: readonly string[];
}

/** All of a prepared scenario that the start settles. */
export interface Started
  extends Omit<PreparedScenario, "nullParameters" | "precise" | "span" | "startsAtPeriapsis"> {
  /** The radius is stationary; whether it is smallest is for the equations to say. */
  readonly atApsis: boolean;
  /** A small part of the time, or angle, in which the motion changes. */
  readonly instant: number;
}

/** Radial rate at an apsis given in rounded numbers, as a part of what it could be. */
export const AT_APSIS = 1e-12;

/**
 * Values of the parameters in the order of the system: the claim's own, else the default, else what the
 * start gives.
 */
export function parameterValues(
  { equations, parameters }: Omit<Scenario, "precise">,
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
