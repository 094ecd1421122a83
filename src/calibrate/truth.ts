import { type DoubleDouble, divide, fromDouble, multiply } from "../arithmetic/double-double.js";
import type { Prepared } from "../audit/prepare.js";
import type { Claim } from "../claim/claim.js";
import { TURN } from "../measure/apsidal-angle.js";
import { exactOrbit } from "../truth/exact-orbit.js";

/** The figure of a claim, known without any stepping; in the claim's unit. */
export interface Truth {
  readonly value: DoubleDouble;
  readonly halfWidth: number;
}

/** Null where no quadrature gives it. A null run here is Newton's, which turns no apsis. */
export function truthOf(
  { claimed: { unit }, scenario: { equations } }: Claim,
  { system, scenario }: Prepared,
): Truth | null {
  const parameters = Object.fromEntries(
    system.parameters.map((name, i) => [name, scenario.precise.parameters[i]!]),
  );
  const orbit = exactOrbit(equations.name, parameters, scenario.precise.state);
  if (orbit === null) return null;
  const perOrbit = divide(orbit.advance, fromDouble(unit.radians));
  if (unit.per === "orbit") return { value: perOrbit, halfWidth: (orbit.bound * TURN) / unit.radians };
  const value = divide(multiply(perOrbit, fromDouble(unit.per)), orbit.period);
  return { value, halfWidth: ((orbit.bound * TURN) / unit.radians) * (unit.per / orbit.period.high) };
}
