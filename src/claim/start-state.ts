import type { EquationsDefinition } from "../equations/definition.js";
import { variablesOf } from "./catalog-keys.js";
import { preciseOf, type Quantity, valuesOf } from "./quantity.js";
import type { Reporter } from "./reporter.js";
import { type PartialStart, type ReadStart, START } from "./start-raw.js";

const PATH = [...START, "state"];
/** A motion in the xy plane need not say so. */
const LEFT_OUT = new Set(["z", "vz"]);

/** The equations' own variables; null, with problems noted, when they are not all there. */
export function readState(
  raw: PartialStart,
  equations: EquationsDefinition | null,
  report: Reporter,
): ReadStart | null {
  for (const key of Object.keys(raw).filter((name) => name !== "state")) {
    report.atKey([...START, key], { found: `'${key}' beside state`, wanted: "either elements or state" });
  }
  if (raw.state === undefined || equations === null) return null;
  const given: Readonly<Record<string, string | undefined>> = raw.state;
  const variables = variablesOf(equations);
  for (const name of Object.keys(given)) {
    if (!variables.has(name)) report.unknownKey([...PATH, name], [...variables.keys()]);
  }
  const read: Record<string, Quantity> = {};
  for (const [name, unit] of variables) {
    const path = [...PATH, name];
    const input = Object.hasOwn(given, name) ? given[name] : undefined;
    if (input !== undefined) {
      const quantity = report.quantity(path, input, unit);
      if (quantity !== null) read[name] = quantity;
    } else if (!LEFT_OUT.has(name) && !report.isTold(path)) {
      report.missing(path, `its starting value, in ${unit}`);
    }
  }
  return { start: { kind: "state", values: valuesOf(read) }, precise: preciseOf(read) };
}
