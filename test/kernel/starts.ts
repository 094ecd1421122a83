import type { EquationsDefinition } from "../../src/equations/definition.js";
import { type CompiledSystem, compileSystem } from "../../src/kernel/system.js";

/** A system of the catalog with a start and parameters to step it from. */
export interface Start {
  readonly system: CompiledSystem;
  readonly state: readonly number[];
  readonly parameters: readonly number[];
  readonly period: number;
}

const GM = 1.3e20;
const A = 5.8e10;
const E = 0.3;

const VALUES: Readonly<Record<string, number>> = {
  GM,
  c: 299_792_458,
  "mass-ratio": 0.2,
  R: 7e8,
  J2: 0.01,
  J3: 0.002,
  J4: -0.001,
  "inverse-semi-latus-rectum": 1 / (A * (1 - E * E)),
};

/** An invented eccentric orbit under equations of the catalog, inclined where they have three dimensions. */
export function startOf(
  definition: EquationsDefinition,
  planar: boolean,
  parameters = Object.keys(definition.parameters),
): Start {
  const system = compileSystem(definition, { parameters, planar });
  const periapsis = A * (1 - E);
  const speed = Math.sqrt((GM * (1 + E)) / periapsis);
  const state =
    definition.form === "angle"
      ? [1 / periapsis, 0]
      : system.coordinates.length === 2
        ? [periapsis, 0, 0, speed]
        : [periapsis, 0, 0, 0, 0.8 * speed, 0.6 * speed];
  return {
    system,
    state,
    parameters: system.parameters.map((name) => VALUES[name]!),
    period: definition.form === "angle" ? 2 * Math.PI : 2 * Math.PI * Math.sqrt(A ** 3 / GM),
  };
}
