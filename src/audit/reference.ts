import {
  type DoubleDouble,
  divide,
  fromDouble,
  multiply,
  subtract,
  toDouble,
} from "../arithmetic/double-double.js";
import type { Claimed, QuotedUnit } from "../claim/claim.js";
import { nominalLength } from "../measure/limits.js";
import { type PreciseOrbit, type ReferenceMethod, referenceMethods } from "../reference/orbit.js";
import type { JobPool } from "./pool.js";
import type { Prepared } from "./prepare.js";

/** The figure that two independent methods give in double-double; in the claim's unit. */
export interface Reference {
  readonly value: number;
  /** Truth never leaves it: twice the distance of the two, and what a double can say of the value. */
  readonly halfWidth: number;
  readonly apart: number;
  /** In words; the first carries the value. */
  readonly methods: readonly [string, string];
  readonly evaluations: number;
  readonly seconds: number;
}

/** Why there is none, in a sentence. */
export interface NoReference {
  readonly none: string;
}

/** The two methods are to agree to this part of the margin... */
const SHARE_OF_MARGIN = 1e-6;
/** ...or to as much of a radian an orbit, where that is more. */
const FINEST = 1e-20;
/** Errors of steps add up over the orbit, and turn the apsis by 1/e times as much: a hundredth leaves room. */
const STEP_SHARE = 0.01;
const TOLERANCES = { coarsest: 1e-14, finest: 1e-27 } as const;
const MOST_ROUNDS = 3;
/** Evaluations that one method may take, some seconds; and what an orbit takes at the least. */
const AFFORDABLE = 2e7;
const LEAST_AN_ORBIT = 1000;

/**
 * Solves the scenario in double-double with two methods that share nothing but the equations, and tightens both
 * until they agree.
 */
export async function findReference(
  claimed: Claimed,
  { recipe, scenario }: Prepared,
  pool: JobPool,
  signal?: AbortSignal,
): Promise<Reference | NoReference> {
  const began = performance.now();
  const { unit, baseline } = claimed;
  const orbits = nominalLength(scenario) / scenario.period;
  if (orbits * LEAST_AN_ORBIT > AFFORDABLE) {
    return { none: `${Math.round(orbits)} orbits in double-double would take too long` };
  }
  const perRadian = (unit.per === "orbit" ? 1 : unit.per / scenario.period) / unit.radians;
  const target = Math.max(SHARE_OF_MARGIN * claimed.halfWidth, FINEST * perRadian);
  const needsNull = baseline === "subtracted" && scenario.nullParameters !== null;
  const effects = needsNull ? (["on", "off"] as const) : (["on"] as const);
  let tolerance = clamped((target / perRadian) * scenario.eccentricity * STEP_SHARE);
  let evaluations = 0;

  const solve = async (method: ReferenceMethod): Promise<Solved | NoReference> => {
    const job = { system: recipe, scenario, method, tolerance, evaluations: AFFORDABLE };
    const orbits = await Promise.all(effects.map((effect) => pool.run({ ...job, effect }, signal)));
    for (const orbit of orbits) evaluations += orbit.evaluations;
    const failed = orbits.find(({ advance }) => advance === null);
    if (failed !== undefined) return { none: whyNot(failed) };
    const [on, off] = orbits.map((orbit) => figureOf(orbit, unit));
    // Where nothing can vanish the run is its own null run.
    const figure = baseline === "included" ? on! : subtract(on!, off ?? on!);
    return { figure, name: orbits[0]!.method, passages: orbits[0]!.passages };
  };

  for (let round = 1; ; round++) {
    const solved = await Promise.all(referenceMethods.map(solve));
    const problem = solved.find((one) => "none" in one);
    if (problem !== undefined) return problem;
    const [other, first] = solved as [Solved, Solved];
    if (first.passages !== other.passages)
      return { none: "the two methods see a different number of passages" };
    const apart = Math.abs(toDouble(subtract(first.figure, other.figure)));
    if (apart <= target) {
      const value = toDouble(first.figure);
      return {
        value,
        halfWidth: 2 * apart + STEP_SHARE * target + Number.EPSILON * Math.abs(value),
        apart,
        methods: [first.name, other.name],
        evaluations,
        seconds: (performance.now() - began) / 1000,
      };
    }
    const finer = clamped((tolerance * target * STEP_SHARE) / apart);
    if (round === MOST_ROUNDS || finer === tolerance) {
      return {
        none: `${first.name} and ${other.name} stay ${apart.toPrecision(2)} ${unit.text} apart in double-double`,
      };
    }
    tolerance = finer;
  }
}

interface Solved {
  readonly figure: DoubleDouble;
  readonly name: string;
  readonly passages: number;
}

const clamped = (tolerance: number): number =>
  Math.min(TOLERANCES.coarsest, Math.max(TOLERANCES.finest, tolerance));

/** The advance of an orbit in the claim's unit; a figure per time by the orbit's own mean radial period. */
function figureOf({ advance, period }: PreciseOrbit, unit: QuotedUnit): DoubleDouble {
  const perOrbit = divide(advance!, fromDouble(unit.radians));
  return unit.per === "orbit" ? perOrbit : divide(multiply(perOrbit, fromDouble(unit.per)), period!);
}

function whyNot({ end, method }: PreciseOrbit): string {
  switch (end) {
    case "too-dear":
      return `${method} would take more than ${AFFORDABLE.toExponential(0)} evaluations in double-double`;
    case "too-few-passages":
      return "the span holds fewer than three passages";
    default:
      return `${method} cannot follow the orbit`;
  }
}
