import type { EquationsDefinition } from "../equations/definition.js";
import type { Span } from "./claim.js";
import { echo } from "./problem.js";
import { parseQuantity, tidied } from "./quantity.js";
import type { Reporter } from "./reporter.js";

/** Without three passages no slope has an error. */
const FEWEST_ORBITS = 3;
/** An audit runs a span some hundred times. */
const MOST_ORBITS = 1e6;
const PATH = ["scenario", "span"];

/** The span in SI; null, with a problem noted, when it is not one. */
export function readSpan(text: string, equations: EquationsDefinition | null, report: Reporter): Span | null {
  const [, number] = /^(\S+) ?orbits?$/.exec(tidied(text) ?? "") ?? [];
  if (number !== undefined) {
    const count = /^[+-]?[\d.]+(?:e[+-]?\d+)?$/i.test(number) ? Number(number) : Number.NaN;
    if (Number.isInteger(count) && count >= FEWEST_ORBITS && count <= MOST_ORBITS) {
      return { kind: "orbits", count, text };
    }
    report.at(PATH, {
      found: echo(text),
      wanted: `a whole number of orbits, ${FEWEST_ORBITS} (fewer give no slope with an error) to ${MOST_ORBITS}`,
    });
    return null;
  }
  // Which of the two is right cannot be said without the equations.
  if (equations === null) return null;
  const kind = equations.form === "angle" ? "angle" : "time";
  const read = parseQuantity(text, kind === "angle" ? "rad" : "s");
  if ("found" in read || !(read.value > 0)) {
    report.at(PATH, {
      found: "found" in read ? read.found : echo(text),
      wanted: `'100 orbits', or ${kind === "angle" ? "an angle" : "a time"} more than zero`,
    });
    return null;
  }
  return { kind, length: read.value, text };
}
