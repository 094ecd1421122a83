import type { EquationsDefinition, ParameterDefinition } from "../equations/definition.js";
import { settableParameters } from "./catalog-keys.js";
import type { Quantity } from "./quantity.js";
import { POSITIVE, type Range, type Reporter } from "./reporter.js";

const PATH = ["scenario", "parameters"];

/** The parameters that the claim gives, by their names in the claim. */
export function readParameters(
  given: Readonly<Record<string, string | number | undefined>>,
  equations: EquationsDefinition,
  report: Reporter,
): Record<string, Quantity> {
  // A block that was no block has been told of; its keys are not missing as well.
  const isSpoiled = report.isTold(PATH);
  const settable = settableParameters(equations);
  const known = settable.map(([name]) => name);
  for (const name of Object.keys(given)) {
    if (!known.includes(name)) report.unknownKey([...PATH, name], known);
  }
  const values: Record<string, Quantity> = {};
  for (const [name, definition] of settable) {
    const path = [...PATH, name];
    const input = Object.hasOwn(given, name) ? given[name] : undefined;
    if (input !== undefined) {
      const read = report.quantity(path, input, definition.unit, rangeOf(definition));
      if (read !== null) values[name] = read;
    } else if (definition.default === undefined && !isSpoiled && !report.isTold(path)) {
      const { meaning, unit } = definition;
      report.missing(path, `the ${meaning}, ${unit === "1" ? "a pure number" : `in ${unit}`}`);
    }
  }
  return values;
}

function rangeOf({ range }: ParameterDefinition): Range {
  if (range === "positive") return POSITIVE;
  if (range === "non-negative") return { accepts: (value) => value >= 0, wanted: "zero or more" };
  if (range === "any") return { accepts: () => true, wanted: "a number" };
  const [least, most] = range;
  return { accepts: (value) => value >= least && value <= most, wanted: `from ${least} to ${most}` };
}
