import type { EquationsDefinition } from "../equations/definition.js";
import { variablesOf } from "./catalog-keys.js";
import type { Start } from "./claim.js";
import type { Reporter } from "./reporter.js";
import { type PartialStart, START } from "./start-raw.js";

const PATH = [...START, "state"];
/** A motion in the xy plane need not say so. */
const LEFT_OUT = new Set(["z", "vz"]);

/** The equations' own variables in SI; null, with problems noted, when they are not all there. */
export function readState(
  raw: PartialStart,
  equations: EquationsDefinition | null,
  report: Reporter,
): Start | null {
  for (const key of Object.keys(raw).filter((name) => name !== "state")) {
    report.atKey([...START, key], { found: `'${key}' beside state`, wanted: "either elements or state" });
  }
  if (raw.state === undefined || equations === null) return null;
  const given: Readonly<Record<string, string | undefined>> = raw.state;
  const variables = variablesOf(equations);
  for (const name of Object.keys(given)) {
    if (!variables.has(name)) report.unknownKey([...PATH, name], [...variables.keys()]);
  }
  const values: Record<string, number> = {};
  for (const [name, unit] of variables) {
    const path = [...PATH, name];
    const input = Object.hasOwn(given, name) ? given[name] : undefined;
    if (input !== undefined) {
      const read = report.quantity(path, input, unit);
      if (read !== null) values[name] = read.value;
    } else if (!LEFT_OUT.has(name) && !report.isTold(path)) {
      report.missing(path, `its starting value, in ${unit}`);
    }
  }
  return { kind: "state", values };
}
