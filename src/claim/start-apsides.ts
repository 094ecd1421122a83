import Fraction from "fraction.js";
import { type DoubleDouble, fromFraction, multiply } from "../arithmetic/double-double.js";
import { exactDecimal } from "../formula/decimal.js";
import { echo } from "./problem.js";
import type { Quantity } from "./quantity.js";
import { POSITIVE, type Reporter } from "./reporter.js";
import { type PartialStart, START } from "./start-raw.js";

type Size = Pick<Quantity, "value" | "precise">;
interface Apsides {
  readonly periapsis: Size;
  readonly apoapsis: Size;
}

const SIZES = ["periapsis", "apoapsis", "semi-major-axis", "eccentricity"] as const;
const ONE = new Fraction(1);
const CIRCLE = "a circle has no apsis to turn";

/** Least and greatest distance in m, from either pair of keys; null, with problems noted, when they are not. */
export function readApsides(raw: PartialStart, report: Reporter): Apsides | null {
  const given = SIZES.filter((name) => raw[name] !== undefined);
  const pair = given.join(" + ");
  if (pair === "periapsis + apoapsis") return fromDistances(raw, report);
  if (pair === "semi-major-axis + eccentricity") return fromAxis(raw, report);
  const isSpoiled = report.isTold(START) || SIZES.some((name) => report.isTold([...START, name]));
  if (!isSpoiled) {
    report.at(START, {
      found: given.length === 0 ? "no size and shape of the orbit" : pair,
      wanted: "periapsis + apoapsis, or semi-major-axis + eccentricity, or state",
    });
  }
  // What is there is looked at all the same.
  for (const name of given) {
    if (name !== "eccentricity") report.quantity([...START, name], raw[name]!, "m", POSITIVE);
  }
  return null;
}

function fromDistances(raw: PartialStart, report: Reporter): Apsides | null {
  const periapsis = report.quantity([...START, "periapsis"], raw.periapsis!, "m", POSITIVE);
  const apoapsis = report.quantity([...START, "apoapsis"], raw.apoapsis!, "m", POSITIVE);
  if (periapsis === null || apoapsis === null) return null;
  if (!(apoapsis.value > periapsis.value)) {
    const why = apoapsis.value === periapsis.value ? ` (${CIRCLE})` : "";
    report.at([...START, "apoapsis"], { found: echo(raw.apoapsis), wanted: `more than the periapsis${why}` });
    return null;
  }
  return { periapsis, apoapsis };
}

function fromAxis(raw: PartialStart, report: Reporter): Apsides | null {
  const axis = report.quantity([...START, "semi-major-axis"], raw["semi-major-axis"]!, "m", POSITIVE);
  const e = raw.eccentricity!;
  // Below the last bit of 1 an eccentricity makes a circle of the doubles that are stepped.
  const isCircle = e >= 0 && 1 - e === 1 + e;
  if (isCircle || !(e > 0 && e < 1)) {
    const why = isCircle ? ` (${CIRCLE})` : e >= 1 ? " (a bound orbit)" : "";
    report.at([...START, "eccentricity"], { found: echo(e), wanted: `more than 0 and less than 1${why}` });
    return null;
  }
  if (axis === null) return null;
  // What was written is the decimal; rounded before it is taken from 1, it would cost digits near 1.
  const exact = exactDecimal(String(e));
  const times = (part: Fraction): DoubleDouble => multiply(axis.precise, fromFraction(part));
  return {
    periapsis: { value: axis.value * (1 - e), precise: times(ONE.sub(exact)) },
    apoapsis: { value: axis.value * (1 + e), precise: times(ONE.add(exact)) },
  };
}
