import type { Scenario, Start } from "../claim/claim.js";
import { type Motion, motionAtPeriapsis, motionFromElements, problemOfElements } from "./elements.js";
import type { StartProblem } from "./started.js";

/**
 * The motion that a scenario in time starts with.
 *
 * @param GM null where the equations have none
 * @param shoot the speed at the periapsis of an orbit with exact turning points; null where there is none
 */
export function motionOfStart(
  { equations, start }: Omit<Scenario, "precise">,
  GM: number | null,
  shoot: (motionAt: (speed: number) => Motion, periapsis: number, apoapsis: number) => number | null,
): Motion | StartProblem {
  if (start.kind === "state") return motionOfState(equations.coordinates, start.values);
  if (GM === null) {
    return {
      problem: `${equations.name} has no parameter GM, which osculating elements need: give the start as a state`,
    };
  }
  const problem = problemOfElements(start);
  if (problem !== null) return { problem };
  if (!start.turningPoints) return motionFromElements(start, GM);
  const motionAt = (speed: number): Motion => motionAtPeriapsis(start, speed);
  const speed = shoot(motionAt, start.periapsis, start.apoapsis);
  return speed === null ? { problem: noOrbitBetween(equations.name) } : motionAt(speed);
}

export const noOrbitBetween = (equations: string): string =>
  `no orbit of ${equations} turns at both the periapsis and the apoapsis given`;

/** The equations' own variables; a third dimension that is left out is 0. */
function motionOfState(
  coordinates: Scenario["equations"]["coordinates"],
  values: Extract<Start, { kind: "state" }>["values"],
): Motion | StartProblem {
  const position: [number, number, number] = [0, 0, 0];
  const velocity: [number, number, number] = [0, 0, 0];
  for (const [i, [name, { rate }]] of Object.entries(coordinates).entries()) {
    for (const [variable, target] of [
      [name, position],
      [rate, velocity],
    ] as const) {
      const value = values[variable] ?? (i === 2 ? 0 : undefined);
      if (value === undefined) return { problem: `the starting state lacks ${variable}` };
      target[i] = value;
    }
  }
  return { position, velocity };
}
