import { findEquations } from "../equations/catalog/index.js";
import type { EquationsDefinition, ParameterDefinition } from "../equations/definition.js";
import { findMethod } from "../methods/catalog/index.js";
import type { MethodDefinition } from "../methods/definition.js";
import type { AuditSettings, Claim, Claimed, Scenario, Solution, Span } from "./claim.js";
import { parseClaimedValue } from "./claimed-value.js";
import { echo } from "./problem.js";
import { parseQuantity } from "./quantity.js";
import { POSITIVE, type Reporter } from "./reporter.js";
import type { RawClaim } from "./schema.js";
import { readStart } from "./start.js";

/** Without three passages no slope has an error. */
const FEWEST_ORBITS = 3;
/** An audit runs a span some hundred times. */
const MOST_ORBITS = 1e6;
const DEFAULT_RUNGS = 8;

/** Turns a claim of the right shape into SI; null, with problems noted, where its values are not right. */
export function buildClaim(
  raw: RawClaim,
  origin: { readonly file: string; readonly sha256: string },
  report: Reporter,
): Claim | null {
  const equations = findEquations(raw.scenario.equations)!;
  const claimed = readClaimed(raw, equations, report);
  const scenario = readScenario(raw, equations, report);
  const solution = raw.solution === undefined ? null : readSolution(raw.solution, equations, report);
  const audit = readAudit(raw, report);
  if (report.problems.length > 0 || claimed === null || scenario === null) return null;
  return { ...origin, title: raw.title, claimed, scenario, solution, audit };
}

function readClaimed(
  { claimed }: RawClaim,
  equations: EquationsDefinition,
  report: Reporter,
): Claimed | null {
  const value = parseClaimedValue(claimed.value);
  if ("found" in value) {
    report.at(["claimed", "value"], value);
    return null;
  }
  if (equations.form === "angle" && value.unit.per !== "orbit") {
    report.at(["claimed", "value"], {
      found: `a figure per ${value.unit.text.split("/")[1]} with ${equations.name}, which knows no time`,
      wanted: `${value.unit.angle}/orbit, or equations in time`,
    });
  }
  return { quantity: claimed.quantity, baseline: claimed.baseline ?? "included", ...value };
}

function readScenario(
  { scenario }: RawClaim,
  equations: EquationsDefinition,
  report: Reporter,
): Scenario | null {
  const parameters = readParameters(scenario.parameters ?? {}, equations, report);
  const start = readStart(scenario.start, equations, report);
  const span = readSpan(scenario.span, equations, report);
  return start === null || span === null ? null : { equations, parameters, start, span };
}

function readParameters(
  given: Readonly<Record<string, string | number>>,
  equations: EquationsDefinition,
  report: Reporter,
): Record<string, number> {
  const path = ["scenario", "parameters"];
  const settable = Object.entries(equations.parameters).filter(
    ([, { fromStart }]) => fromStart === undefined,
  );
  const known = settable.map(([name]) => name);
  for (const name of Object.keys(given)) {
    if (!known.includes(name)) report.unknownKey([...path, name], known);
  }
  const values: Record<string, number> = {};
  for (const [name, definition] of settable) {
    if (Object.hasOwn(given, name)) {
      const read = report.quantity([...path, name], given[name], definition.unit, rangeOf(definition));
      if (read !== null) values[name] = read.value;
    } else if (definition.default === undefined) {
      report.missing(path, `${name}, the ${definition.meaning}, in ${definition.unit}`);
    }
  }
  return values;
}

function rangeOf({ range }: ParameterDefinition): {
  accepts: (value: number) => boolean;
  wanted: string;
} {
  if (range === "positive") return POSITIVE;
  if (range === "non-negative") return { accepts: (value) => value >= 0, wanted: "zero or more" };
  if (range === "any") return { accepts: () => true, wanted: "a number" };
  const [least, most] = range;
  return { accepts: (value) => value >= least && value <= most, wanted: `from ${least} to ${most}` };
}

function readSpan(text: string, equations: EquationsDefinition, report: Reporter): Span | null {
  const path = ["scenario", "span"];
  const orbits = /^\s*([+\-−]?[\d.eE+]+)\s*orbits?\s*$/.exec(text);
  if (orbits !== null) {
    const count = Number(orbits[1]!.replace("−", "-"));
    if (!Number.isInteger(count) || count < FEWEST_ORBITS || count > MOST_ORBITS) {
      report.at(path, {
        found: echo(text),
        wanted: `a whole number of orbits, ${FEWEST_ORBITS} (fewer give no slope with an error) to ${MOST_ORBITS}`,
      });
      return null;
    }
    return { kind: "orbits", count, text };
  }
  const kind = equations.form === "angle" ? "angle" : "time";
  const unit = kind === "angle" ? "rad" : "s";
  const read = parseQuantity(text, unit);
  if ("found" in read || !(read.value > 0 && Number.isFinite(read.value))) {
    const found = "found" in read ? read.found : echo(text);
    report.at(path, {
      found,
      wanted: `'100 orbits', or ${kind === "angle" ? "an angle" : "a time"} more than zero`,
    });
    return null;
  }
  return { kind, length: read.value, text };
}

function readSolution(
  raw: NonNullable<RawClaim["solution"]>,
  equations: EquationsDefinition,
  report: Reporter,
): Solution | null {
  const method = findMethod(raw.method)!;
  const perOrbit = raw["steps-per-orbit"];
  if ((raw.step === undefined) === (perOrbit === undefined)) {
    report.at(["solution"], {
      found: raw.step === undefined ? "no step" : "both step and steps-per-orbit",
      wanted: "one of step and steps-per-orbit",
    });
    return null;
  }
  if (perOrbit !== undefined) {
    if (!(perOrbit > 1)) {
      report.at(["solution", "steps-per-orbit"], {
        found: echo(perOrbit),
        wanted: "more than 1: a step is a part of the orbit",
      });
      return null;
    }
    return { method, step: { kind: "per-orbit", count: perOrbit, text: `${perOrbit} steps an orbit` } };
  }
  const unit = equations.form === "angle" ? "rad" : "s";
  const step = report.quantity(["solution", "step"], raw.step, unit, POSITIVE);
  return (
    step && {
      method,
      step: {
        kind: "length",
        length: step.value,
        unit: step.unit,
        unitSize: step.unitSize,
        text: raw.step!.trim(),
      },
    }
  );
}

function readAudit({ audit, solution }: RawClaim, report: Reporter): AuditSettings {
  const names = audit?.witnesses ?? null;
  names?.forEach((name, i) => {
    const path = ["audit", "witnesses", i];
    if (name === solution?.method) {
      report.at(path, { found: `the author's own method, ${name}`, wanted: "an independent method" });
    } else if (names.indexOf(name) < i) {
      report.at(path, { found: `${name} for the second time`, wanted: "each witness once" });
    }
  });
  const witnesses = names
    ?.map(findMethod)
    .filter((method): method is MethodDefinition => method !== undefined);
  return { witnesses: witnesses ?? null, rungs: audit?.rungs ?? DEFAULT_RUNGS };
}
