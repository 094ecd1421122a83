import type { EquationsDefinition } from "../equations/definition.js";
import type { Start } from "./claim.js";
import { echo } from "./problem.js";
import { POSITIVE, type Reporter } from "./reporter.js";
import type { RawClaim } from "./schema.js";

type RawStart = RawClaim["scenario"]["start"];
const PATH = ["scenario", "start"];
const ORIENTATION = ["inclination", "node", "argument-of-periapsis", "true-anomaly"] as const;
const SIZES = ["periapsis", "apoapsis", "semi-major-axis", "eccentricity"] as const;

/** The starting state in SI; null, with problems noted, when it is not one. */
export function readStart(raw: RawStart, equations: EquationsDefinition, report: Reporter): Start | null {
  return raw.state === undefined ? readElements(raw, equations, report) : readState(raw, equations, report);
}

function readElements(raw: RawStart, equations: EquationsDefinition, report: Reporter): Start | null {
  const apsides = readApsides(raw, report);
  const angles = ORIENTATION.map((name) => {
    const input = raw[name];
    if (input === undefined) return 0;
    if (equations.form === "angle") {
      report.atKey([...PATH, name], {
        found: `'${name}'`,
        wanted: "no such key: an orbit equation in the angle starts at periapsis, on the x axis",
      });
      return null;
    }
    return report.quantity([...PATH, name], input, "rad")?.value ?? null;
  });
  if (apsides === null || angles.some((angle) => angle === null)) return null;
  const [inclination, node, argumentOfPeriapsis, trueAnomaly] = angles as [number, number, number, number];
  const turningPoints = raw["turning-points"] ?? false;
  if (turningPoints && trueAnomaly !== 0) {
    report.at([...PATH, "true-anomaly"], {
      found: echo(raw["true-anomaly"]),
      wanted: "0 or no such key: exact turning points start at periapsis",
    });
    return null;
  }
  return { kind: "elements", ...apsides, inclination, node, argumentOfPeriapsis, trueAnomaly, turningPoints };
}

function readApsides(raw: RawStart, report: Reporter): { periapsis: number; apoapsis: number } | null {
  const given = SIZES.filter((name) => raw[name] !== undefined);
  const pair = given.join(" + ");
  if (pair !== "periapsis + apoapsis" && pair !== "semi-major-axis + eccentricity") {
    report.at(PATH, {
      found: given.length === 0 ? "no size and shape of the orbit" : pair,
      wanted: "periapsis + apoapsis, or semi-major-axis + eccentricity, or state",
    });
    return null;
  }
  if (raw.eccentricity !== undefined) {
    const axis = report.quantity([...PATH, "semi-major-axis"], raw["semi-major-axis"], "m", POSITIVE);
    const e = raw.eccentricity;
    if (!(e > 0 && e < 1)) {
      const why = e === 0 ? " (a circle has no apsis to turn)" : e >= 1 ? " (a bound orbit)" : "";
      report.at([...PATH, "eccentricity"], { found: echo(e), wanted: `more than 0 and less than 1${why}` });
      return null;
    }
    return axis && { periapsis: axis.value * (1 - e), apoapsis: axis.value * (1 + e) };
  }
  const periapsis = report.quantity([...PATH, "periapsis"], raw.periapsis, "m", POSITIVE);
  const apoapsis = report.quantity([...PATH, "apoapsis"], raw.apoapsis, "m", POSITIVE);
  if (periapsis === null || apoapsis === null) return null;
  if (!(apoapsis.value > periapsis.value)) {
    const why = apoapsis.value === periapsis.value ? " (a circle has no apsis to turn)" : "";
    report.at([...PATH, "apoapsis"], { found: echo(raw.apoapsis), wanted: `more than the periapsis${why}` });
    return null;
  }
  return { periapsis: periapsis.value, apoapsis: apoapsis.value };
}

function readState(raw: RawStart, equations: EquationsDefinition, report: Reporter): Start | null {
  const others = Object.keys(raw).filter((key) => key !== "state");
  for (const key of others) {
    report.atKey([...PATH, key], { found: `'${key}' beside state`, wanted: "either elements or state" });
  }
  const variables = variablesOf(equations);
  const given = raw.state!;
  for (const name of Object.keys(given)) {
    if (!variables.has(name)) report.unknownKey([...PATH, "state", name], [...variables.keys()]);
  }
  const values: Record<string, number> = {};
  let complete = others.length === 0;
  for (const [name, unit] of variables) {
    // A motion in the xy plane need not say so.
    if (!Object.hasOwn(given, name) && (name === "z" || name === "vz")) continue;
    if (!Object.hasOwn(given, name)) report.missing([...PATH, "state"], `${name}, in ${unit}`);
    const value = Object.hasOwn(given, name)
      ? report.quantity([...PATH, "state", name], given[name], unit)
      : null;
    if (value === null) complete = false;
    else values[name] = value.value;
  }
  return complete ? { kind: "state", values } : null;
}

/** Coordinates and rates with their units. */
function variablesOf({ coordinates, form }: EquationsDefinition): Map<string, string> {
  const all = Object.entries(coordinates);
  return new Map([
    ...all.map(([name, { unit }]) => [name, unit] as const),
    ...all.map(([, { rate, unit }]) => [rate, form === "angle" ? unit : `${unit}/s`] as const),
  ]);
}
