import { nearestDouble } from "../formula/nearest-double.js";
import type { QuotedUnit } from "./claim.js";
import { nearest } from "./nearest.js";
import { echo } from "./problem.js";
import type { Misreading } from "./quantity.js";
import { namedUnit, unitsCatalog } from "./units.js";

const ANGLES = unitsCatalog.filter(({ unit }) => unit.dimension.angle === 1).map(({ name }) => name);
const TIMES = unitsCatalog.filter(({ unit }) => unit.dimension.time === 1).map(({ name }) => name);

/** Reads `arcsec/century`, `arcmin/orbit`, also with spaces or "per". */
export function parseQuotedUnit(text: string): QuotedUnit | Misreading {
  const [, angle, per] = /^(\S+?)\s*(?:\/|\bper\b)\s*(\S+)$/u.exec(text) ?? [];
  if (angle === undefined || per === undefined) {
    return {
      found: `the unit ${echo(text)}`,
      wanted: "an angle per orbit, d, yr or century, such as 'arcsec/century'",
    };
  }
  const angleUnit = namedUnit(angle);
  if (angleUnit === undefined || angleUnit.dimension.angle !== 1) {
    return { found: `the unit ${echo(angle)}`, wanted: suggestion(angle, ANGLES, "an angle") };
  }
  const perUnit = per === "orbit" ? null : namedUnit(per);
  if (perUnit === undefined || (perUnit !== null && perUnit.dimension.time !== 1)) {
    return { found: `per ${echo(per)}`, wanted: suggestion(per, ["orbit", ...TIMES], "a time or orbit") };
  }
  return {
    text: `${angle}/${per}`,
    angle,
    radians: nearestDouble(angleUnit.size),
    per: perUnit === null ? "orbit" : nearestDouble(perUnit.size),
  };
}

function suggestion(name: string, known: readonly string[], what: string): string {
  const near = nearest(name, known);
  return near === null ? `${what}: ${known.join(", ")}` : `'${near}'?`;
}
