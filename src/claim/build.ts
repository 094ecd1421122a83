import { findEquations } from "../equations/catalog/index.js";
import type { EquationsDefinition } from "../equations/definition.js";
import { readAuditSettings } from "./audit-settings.js";
import type { Claim, Claimed, Scenario } from "./claim.js";
import { parseClaimedValue } from "./claimed-value.js";
import { readParameters } from "./parameters.js";
import { preciseOf, valuesOf } from "./quantity.js";
import type { Reporter } from "./reporter.js";
import type { PartialClaim } from "./schema.js";
import { readSolution } from "./solution.js";
import { readSpan } from "./span.js";
import { readStart } from "./start.js";

/**
 * Turns a claim into SI. Parts that are missing here were told of by the schema; whatever is there is looked
 * at all the same. Null when there is any problem.
 */
export function buildClaim(
  raw: PartialClaim,
  origin: { readonly file: string; readonly sha256: string },
  report: Reporter,
): Claim | null {
  const name = raw.scenario?.equations;
  const equations = name === undefined ? null : (findEquations(name) ?? null);
  const claimed = readClaimed(raw.claimed ?? {}, equations, report);
  const scenario = readScenario(raw.scenario ?? {}, equations, report);
  const solution = raw.solution === undefined ? null : readSolution(raw.solution, equations, report);
  const audit = readAuditSettings(raw, report);
  if (report.problems.length > 0) return null;
  return { ...origin, title: raw.title!, claimed: claimed!, scenario: scenario!, solution, audit };
}

function readClaimed(
  { value: text, quantity, baseline = "included" }: NonNullable<PartialClaim["claimed"]>,
  equations: EquationsDefinition | null,
  report: Reporter,
): Claimed | null {
  if (text === undefined) return null;
  const path = ["claimed", "value"];
  const value = parseClaimedValue(text);
  if ("found" in value) {
    report.at(path, value);
    return null;
  }
  const { unit } = value;
  if (equations?.form === "angle" && unit.per !== "orbit") {
    report.at(path, {
      found: `a figure per ${unit.text.split("/")[1]} with ${equations.name}, which knows no time`,
      wanted: `${unit.angle}/orbit, or equations in time`,
    });
  }
  return quantity === undefined ? null : { quantity, baseline, ...value };
}

function readScenario(
  raw: NonNullable<PartialClaim["scenario"]>,
  equations: EquationsDefinition | null,
  report: Reporter,
): Scenario | null {
  const parameters = equations && readParameters(raw.parameters ?? {}, equations, report);
  const start = raw.start === undefined ? null : readStart(raw.start, equations, report);
  const span = raw.span === undefined ? null : readSpan(raw.span, equations, report);
  return (
    equations &&
    parameters &&
    start &&
    span && {
      equations,
      parameters: valuesOf(parameters),
      start: start.start,
      span,
      precise: { parameters: preciseOf(parameters), start: start.precise },
    }
  );
}
