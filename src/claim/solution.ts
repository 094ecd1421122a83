import type { EquationsDefinition } from "../equations/definition.js";
import { findMethod } from "../methods/catalog/index.js";
import type { Solution } from "./claim.js";
import { POSITIVE, type Reporter } from "./reporter.js";
import type { PartialClaim } from "./schema.js";

const PATH = ["solution"];

/** How the author solved it; null, with problems noted, when that is not said right. */
export function readSolution(
  raw: NonNullable<PartialClaim["solution"]>,
  equations: EquationsDefinition | null,
  report: Reporter,
): Solution | null {
  const step = readStep(raw, equations, report);
  const method = raw.method === undefined ? undefined : findMethod(raw.method);
  return method === undefined || step === null
    ? null
    : { method, arithmetic: raw.arithmetic ?? "double", step };
}

function readStep(
  { step, "steps-per-orbit": count }: NonNullable<PartialClaim["solution"]>,
  equations: EquationsDefinition | null,
  report: Reporter,
): Solution["step"] | null {
  if (step !== undefined && count !== undefined) {
    report.at(PATH, { found: "both step and steps-per-orbit", wanted: "one of step and steps-per-orbit" });
    return null;
  }
  if (count !== undefined) return { kind: "per-orbit", count, text: `${count} steps an orbit` };
  if (step === undefined) {
    const isSpoiled =
      report.isTold(PATH) ||
      ["step", "steps-per-orbit", "tolerance"].some((key) => report.isTold([...PATH, key]));
    if (!isSpoiled) report.at(PATH, { found: "no step", wanted: "one of step and steps-per-orbit" });
    return null;
  }
  if (equations === null) return null;
  const read = report.quantity([...PATH, "step"], step, equations.form === "angle" ? "rad" : "s", POSITIVE);
  if (read === null) return null;
  const { value, unit, unitSize } = read;
  return { kind: "length", length: value, unit, unitSize, text: step.trim() };
}
