import type { EquationsDefinition } from "../definition.js";
import { cartesian, gravitationalParameter } from "./common.js";

export const oblate: EquationsDefinition = {
  name: "oblate",
  title: "Motion about an oblate body, zonal harmonics J2 to J4",
  display: "Phi = -(GM/r) [1 - J2 (R/r)^2 P2(z/r) - J3 (R/r)^3 P3(z/r) - J4 (R/r)^4 P4(z/r)]",
  form: "time",
  source: "W. M. Kaula, Theory of Satellite Geodesy (1966), sect. 1.1 and 3.6; axis of symmetry along z",
  parameters: {
    GM: gravitationalParameter,
    R: {
      symbol: "R",
      unit: "m",
      meaning: "equatorial radius that the harmonics refer to",
      range: "positive",
    },
    J2: { symbol: "J2", unit: "1", meaning: "second zonal harmonic", vanishesAt: 0, range: "any" },
    J3: { symbol: "J3", unit: "1", meaning: "third zonal harmonic", default: 0, vanishesAt: 0, range: "any" },
    J4: {
      symbol: "J4",
      unit: "1",
      meaning: "fourth zonal harmonic",
      default: 0,
      vanishesAt: 0,
      range: "any",
    },
  },
  coordinates: cartesian,
  let: {
    s: "1 / sqrt(x^2 + y^2 + z^2)",
    q: "R * s",
    t: "z * s",
    t2: "t^2",
    P2: "(3*t2 - 1) / 2",
    P3: "t * (5*t2 - 3) / 2",
    P4: "(35*t2^2 - 30*t2 + 3) / 8",
  },
  potential: "-GM * s * (1 - q^2 * (J2*P2 + J3*q*P3 + J4*q^2*P4))",
  conserved: {
    "angular-momentum-z": { formula: "x*vy - y*vx", unit: "m^2/s" },
  },
};
