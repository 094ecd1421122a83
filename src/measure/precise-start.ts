import {
  add,
  type DoubleDouble,
  divide,
  fromDouble,
  multiply,
  negate,
  ONE,
  shift,
  sqrt,
  subtract,
} from "../arithmetic/double-double.js";
import { cosineAndSine } from "../arithmetic/elementary.js";
import type { PreciseScenario, Scenario } from "../claim/claim.js";
import type { PreparedScenario } from "./run.js";
import type { SystemShape } from "./started.js";

/** A start as doubles, and the null run's values of the parameters. */
type Doubles = Pick<PreparedScenario, "state" | "parameters" | "nullParameters">;
type Precise = PreparedScenario["precise"];

/** A start whose doubles are all that is known of it. */
export const startOfDoubles = ({ state, parameters, nullParameters }: Doubles): Precise => ({
  state: state.map(fromDouble),
  parameters: parameters.map(fromDouble),
  nullParameters: nullParameters?.map(fromDouble) ?? null,
});

/**
 * A start to 31 digits, from the claim's own numbers and by the formulas of the start in doubles. An orbit of
 * exact turning points has its speed, or GM/h², from a search in doubles: it starts from the doubles found, for
 * all methods and for the reference.
 */
export function preciseStart(
  scenario: Omit<Scenario, "precise">,
  precise: PreciseScenario,
  system: SystemShape,
  doubles: Doubles,
): Precise {
  const { equations, start } = scenario;
  if (start.kind === "elements" && start.turningPoints) return startOfDoubles(doubles);
  const inAngle = equations.form === "angle";
  const given = precise.parameters;
  const found =
    start.kind === "state"
      ? { ...precise.start }
      : inAngle
        ? startInAngle(precise.start)
        : startInTime(
            precise.start,
            given.GM ?? fromDouble(equations.parameters.GM?.default ?? Number.NaN),
            Object.entries(equations.coordinates),
          );
  const parameters = system.parameters.map((name, i) => {
    const { fromStart } = equations.parameters[name]!;
    const known = fromStart === undefined ? given[name] : (found[name] ?? given[name]);
    return known ?? fromDouble(doubles.parameters[i]!);
  });
  return {
    state: system.states.map((name, i) => found[name] ?? fromDouble(doubles.state[i]!)),
    parameters,
    nullParameters:
      doubles.nullParameters?.map((value, i) =>
        equations.parameters[system.parameters[i]!]!.vanishesAt === undefined
          ? parameters[i]!
          : fromDouble(value),
      ) ?? null,
  };
}

type Elements = PreciseScenario["start"];
type Named = Record<string, DoubleDouble>;

/** u = K (1 + e cos ν), u' = -K e sin ν and K = GM/h² = (rp + ra)/(2 rp ra). */
function startInAngle({ periapsis, apoapsis, trueAnomaly }: Elements): Named {
  const [rp, ra] = [periapsis!, apoapsis!];
  const sum = add(rp, ra);
  const K = divide(sum, shift(multiply(rp, ra), 2));
  const e = divide(subtract(ra, rp), sum);
  const [cosine, sine] = cosineAndSine(trueAnomaly!);
  const atPeriapsis = trueAnomaly!.high === 0;
  return {
    u: atPeriapsis ? divide(ONE, rp) : multiply(K, add(ONE, multiply(e, cosine))),
    w: negate(multiply(K, multiply(e, sine))),
    "inverse-semi-latus-rectum": K,
  };
}

/** r = p/(1 + e cos ν) and the velocity sqrt(GM/p) (-sin ν, e + cos ν) in the orbit's plane, turned into space. */
function startInTime(
  elements: Elements,
  GM: DoubleDouble,
  coordinates: readonly (readonly [string, { readonly rate: string }])[],
): Named {
  const [rp, ra] = [elements.periapsis!, elements.apoapsis!];
  const sum = add(rp, ra);
  const e = divide(subtract(ra, rp), sum);
  const p = divide(shift(multiply(rp, ra), 2), sum);
  const [cosine, sine] = cosineAndSine(elements.trueAnomaly!);
  const r = elements.trueAnomaly!.high === 0 ? rp : divide(p, add(ONE, multiply(e, cosine)));
  const speed = sqrt(divide(GM, p));
  const turned = orientation(elements);
  const position = turned(multiply(r, cosine), multiply(r, sine));
  const velocity = turned(negate(multiply(speed, sine)), multiply(speed, add(e, cosine)));
  return Object.fromEntries(
    coordinates.flatMap(([name, { rate }], i) => [
      [name, position[i]!],
      [rate, velocity[i]!],
    ]),
  );
}

/** Turns a vector by the argument of periapsis, the inclination and the node, as `orientation.ts` does. */
function orientation({ inclination, node, argumentOfPeriapsis }: Elements) {
  const [ci, si] = cosineAndSine(inclination!);
  const [cn, sn] = cosineAndSine(node!);
  const [cw, sw] = cosineAndSine(argumentOfPeriapsis!);
  return (along: DoubleDouble, across: DoubleDouble): readonly DoubleDouble[] => {
    const p = subtract(multiply(along, cw), multiply(across, sw));
    const q = add(multiply(along, sw), multiply(across, cw));
    const flat = multiply(q, ci);
    return [
      subtract(multiply(p, cn), multiply(flat, sn)),
      add(multiply(p, sn), multiply(flat, cn)),
      multiply(q, si),
    ];
  };
}
