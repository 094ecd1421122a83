import Fraction from "fraction.js";
import { PI } from "../arithmetic/words.js";

/** Powers of length, time and angle. */
export interface Dimension {
  readonly length: number;
  readonly time: number;
  readonly angle: number;
}

export interface Unit {
  /** Size in SI: exact, but for the 100 digits of π in an angle. */
  readonly size: Fraction;
  readonly dimension: Dimension;
}

interface NamedUnit {
  readonly name: string;
  readonly meaning: string;
  readonly source: string;
  readonly unit: Unit;
}

const SI_BROCHURE = "SI Brochure, 9th ed. (2019)";
const JULIAN = "IAU Style Manual (1989), 5.15: the Julian year of 365.25 d";

const length = (size: string | number): Unit => ({
  size: new Fraction(size),
  dimension: { length: 1, time: 0, angle: 0 },
});
const time = (size: string | number): Unit => ({
  size: new Fraction(size),
  dimension: { length: 0, time: 1, angle: 0 },
});
const partOfPi = (size: string): Unit => ({
  size: PI.mul(size),
  dimension: { length: 0, time: 0, angle: 1 },
});

const DAY = 86_400;

/** Every unit that a claim may use. */
export const unitsCatalog: readonly NamedUnit[] = [
  { name: "m", meaning: "metre", source: SI_BROCHURE, unit: length(1) },
  { name: "km", meaning: "kilometre", source: SI_BROCHURE, unit: length(1000) },
  {
    name: "au",
    meaning: "astronomical unit, 149 597 870 700 m",
    source: "IAU 2012 Resolution B2",
    unit: length(149_597_870_700),
  },
  { name: "s", meaning: "second", source: SI_BROCHURE, unit: time(1) },
  { name: "min", meaning: "minute", source: `${SI_BROCHURE}, table 8`, unit: time(60) },
  { name: "h", meaning: "hour", source: `${SI_BROCHURE}, table 8`, unit: time(3600) },
  { name: "d", meaning: "day of 86 400 s", source: `${SI_BROCHURE}, table 8`, unit: time(DAY) },
  { name: "yr", meaning: "Julian year of 365.25 d", source: JULIAN, unit: time("31557600") },
  { name: "century", meaning: "Julian century of 36 525 d", source: JULIAN, unit: time("3155760000") },
  {
    name: "rad",
    meaning: "radian",
    source: SI_BROCHURE,
    unit: { size: new Fraction(1), dimension: { length: 0, time: 0, angle: 1 } },
  },
  { name: "deg", meaning: "degree", source: `${SI_BROCHURE}, table 8`, unit: partOfPi("1/180") },
  { name: "arcmin", meaning: "minute of arc", source: `${SI_BROCHURE}, table 8`, unit: partOfPi("1/10800") },
  { name: "arcsec", meaning: "second of arc", source: `${SI_BROCHURE}, table 8`, unit: partOfPi("1/648000") },
  {
    name: "mas",
    meaning: "thousandth of a second of arc",
    source: `${SI_BROCHURE}, table 8`,
    unit: partOfPi("1/648000000"),
  },
  {
    name: "uas",
    meaning: "millionth of a second of arc, also µas",
    source: `${SI_BROCHURE}, table 8`,
    unit: partOfPi("1/648000000000"),
  },
];

/** The micro sign and the Greek letter are both in use. */
const SPELLINGS: Readonly<Record<string, string>> = { µas: "uas", μas: "uas" };

export function namedUnit(name: string): Unit | undefined {
  const spelling = SPELLINGS[name] ?? name;
  return unitsCatalog.find((unit) => unit.name === spelling)?.unit;
}

export const NO_UNIT: Unit = { size: new Fraction(1), dimension: { length: 0, time: 0, angle: 0 } };

const FACTOR = /^([\p{L}]+|1)(?:\^([+-]?\d))?$/u;

/**
 * Reads a product of powers of units: `m^3/s^2`, `km^3 s^-2`, `au/d`. A slash divides by the next factor
 * alone.
 *
 * @returns the name that is not a unit where there is one
 */
export function parseUnit(text: string): Unit | { readonly unknown: string } {
  const parts = text
    .trim()
    .replaceAll(/\s*([*/·])\s*/g, "$1")
    .split(/([*/·]|\s+)/);
  let unit = NO_UNIT;
  for (let i = 0; i < parts.length; i += 2) {
    const [, name, power] = FACTOR.exec(parts[i]!) ?? [];
    if (name === undefined) return { unknown: parts[i]! };
    const factor = name === "1" ? NO_UNIT : namedUnit(name);
    if (factor === undefined) return { unknown: name };
    const exponent = Number(power ?? 1) * (parts[i - 1] === "/" ? -1 : 1);
    unit = times(unit, factor, exponent);
  }
  return unit;
}

function times(unit: Unit, factor: Unit, exponent: number): Unit {
  const { length: l, time: t, angle: a } = factor.dimension;
  return {
    size: unit.size.mul(factor.size.pow(exponent)!),
    dimension: {
      length: unit.dimension.length + l * exponent,
      time: unit.dimension.time + t * exponent,
      angle: unit.dimension.angle + a * exponent,
    },
  };
}

export function sameDimension(one: Dimension, other: Dimension): boolean {
  return one.length === other.length && one.time === other.time && one.angle === other.angle;
}
