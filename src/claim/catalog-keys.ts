import { z } from "zod";
import { equationsCatalog } from "../equations/catalog/index.js";
import type { EquationsDefinition } from "../equations/definition.js";

/** What a claim may give of the equations' parameters: those that the start does not set. */
export function settableParameters({ parameters }: EquationsDefinition) {
  return Object.entries(parameters).filter(([, { fromStart }]) => fromStart === undefined);
}

/**
 * What a starting state is made of, with units: coordinates, rates, and the parameters that elements would
 * set, GM/h² of an orbit equation.
 */
export function variablesOf({ coordinates, form, parameters }: EquationsDefinition): Map<string, string> {
  const all = Object.entries(coordinates);
  return new Map([
    ...all.map(([name, { unit }]) => [name, unit] as const),
    ...all.map(([, { rate, unit }]) => [rate, form === "angle" ? unit : `${unit}/s`] as const),
    ...Object.entries(parameters)
      .filter(([, { fromStart }]) => fromStart !== undefined)
      .map(([name, { unit }]) => [name, unit] as const),
  ]);
}

const withUnit = (unit: string): string => (unit === "1" ? "a pure number" : `in ${unit} or the like`);

/** Every parameter of the catalog, for editors; which of them belong to which equations is checked later. */
export const anyParameters = z
  .object(
    Object.fromEntries(
      equationsCatalog.flatMap(settableParameters).map(([name, { meaning, unit }]) => [
        name,
        z
          .union([z.string(), z.number()])
          .meta({ description: `${meaning}, ${withUnit(unit)}` })
          .optional(),
      ]),
    ),
  )
  .catchall(z.union([z.string(), z.number()]));

/** Every variable of the catalog, for editors. */
export const anyVariables = z
  .object(
    Object.fromEntries(
      equationsCatalog
        .flatMap((equations) => [...variablesOf(equations)])
        .map(([name, unit]) => [
          name,
          z
            .string()
            .meta({ description: `${name}, ${withUnit(unit)}`, examples: [`0 ${unit}`] })
            .optional(),
        ]),
    ),
  )
  .catchall(z.string());
