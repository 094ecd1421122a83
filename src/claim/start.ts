import { ZERO } from "../arithmetic/double-double.js";
import type { EquationsDefinition } from "../equations/definition.js";
import { echo } from "./problem.js";
import type { Quantity } from "./quantity.js";
import type { Range, Reporter } from "./reporter.js";
import { readApsides } from "./start-apsides.js";
import { type PartialStart, type ReadStart, START } from "./start-raw.js";
import { readState } from "./start-state.js";

const TURN: Range = {
  accepts: (angle) => Math.abs(angle) <= 2 * Math.PI,
  wanted: "an angle of at most a turn either way",
};
const ORIENTATION: Readonly<
  Record<"inclination" | "node" | "argument-of-periapsis" | "true-anomaly", Range>
> = {
  inclination: { accepts: (angle) => angle >= 0 && angle <= Math.PI, wanted: "from 0 to 180 deg" },
  node: TURN,
  "argument-of-periapsis": TURN,
  "true-anomaly": TURN,
};

/** The starting state; null, with problems noted, when it is not one. */
export function readStart(
  raw: PartialStart,
  equations: EquationsDefinition | null,
  report: Reporter,
): ReadStart | null {
  return raw.state !== undefined || report.isToldWithin([...START, "state"])
    ? readState(raw, equations, report)
    : readElements(raw, equations, report);
}

function readElements(
  raw: PartialStart,
  equations: EquationsDefinition | null,
  report: Reporter,
): ReadStart | null {
  const apsides = readApsides(raw, report);
  const inclination = readAngle("inclination", raw, equations, report);
  const node = readAngle("node", raw, equations, report);
  const argumentOfPeriapsis = readAngle("argument-of-periapsis", raw, equations, report);
  const trueAnomaly = readAngle("true-anomaly", raw, equations, report);
  const turningPoints = raw["turning-points"] ?? false;
  if (turningPoints && trueAnomaly !== null && trueAnomaly.value !== 0) {
    report.at([...START, "true-anomaly"], {
      found: echo(raw["true-anomaly"]),
      wanted: "0 or no such key: exact turning points start at periapsis",
    });
  }
  if (
    apsides === null ||
    inclination === null ||
    node === null ||
    argumentOfPeriapsis === null ||
    trueAnomaly === null
  ) {
    return null;
  }
  const read = { ...apsides, inclination, node, argumentOfPeriapsis, trueAnomaly };
  const value = (name: keyof typeof read): number => read[name].value;
  return {
    start: {
      kind: "elements",
      periapsis: value("periapsis"),
      apoapsis: value("apoapsis"),
      inclination: value("inclination"),
      node: value("node"),
      argumentOfPeriapsis: value("argumentOfPeriapsis"),
      trueAnomaly: value("trueAnomaly"),
      turningPoints,
    },
    precise: Object.fromEntries(Object.entries(read).map(([name, { precise }]) => [name, precise])),
  };
}

type Angle = Pick<Quantity, "value" | "precise">;

/** An angle of the orientation in rad, 0 when left out; null, with a problem noted, when it is not right. */
function readAngle(
  name: keyof typeof ORIENTATION,
  raw: PartialStart,
  equations: EquationsDefinition | null,
  report: Reporter,
): Angle | null {
  const input = raw[name];
  if (input === undefined) return { value: 0, precise: ZERO };
  if (equations?.form === "angle") {
    report.atKey([...START, name], {
      found: `'${name}'`,
      wanted: "no such key: an orbit equation in the angle starts at periapsis, on the x axis",
    });
    return null;
  }
  return report.quantity([...START, name], input, "rad", ORIENTATION[name]);
}
