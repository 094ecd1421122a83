import type { EquationsDefinition } from "../definition.js";
import { cartesian, gravitationalParameter, lightSpeed } from "./common.js";

export const postNewtonian1: EquationsDefinition = {
  name: "post-newtonian-1",
  title: "Relative motion of two bodies at first post-Newtonian order",
  display:
    "r'' = -(GM/r^2) { [1 + ((1 + 3 nu) v^2 - 2 (2 + nu) GM/r - (3/2) nu (n.v)^2)/c^2] n - 2 (2 - nu) (n.v) v/c^2 }",
  form: "time",
  source:
    "L. Blanchet, Living Rev. Relativ. 17, 2 (2014), eqs. 219-220 to order 1/c^2, harmonic coordinates; " +
    "T. Damour and N. Deruelle, Ann. Inst. H. Poincaré 43, 107 (1985)",
  parameters: {
    GM: gravitationalParameter,
    c: lightSpeed,
    "mass-ratio": {
      symbol: "nu",
      unit: "1",
      meaning: "symmetric mass ratio m1 m2/(m1 + m2)^2; 0 for a test particle",
      default: 0,
      range: [0, 0.25],
    },
  },
  coordinates: cartesian,
  let: {
    k: "1 / c^2",
    s: "1 / sqrt(x^2 + y^2 + z^2)",
    m: "GM * s",
    v2: "vx^2 + vy^2 + vz^2",
    n: "(x*vx + y*vy + z*vz) * s",
    g: "m * s",
    along: "g * s * (1 + k * ((1 + 3*nu)*v2 - (4 + 2*nu)*m - 3/2*nu*n^2))",
    across: "g * k * (4 - 2*nu) * n",
    factor: "1 + k * ((1 - 3*nu)/2*v2 + (3 + nu)*m)",
  },
  acceleration: {
    x: "across*vx - along*x",
    y: "across*vy - along*y",
    z: "across*vz - along*z",
  },
  conserved: {
    energy: {
      formula: "v2/2 - m + k * (3/8*(1 - 3*nu)*v2^2 + m/2*((3 + nu)*v2 + nu*n^2) + m^2/2)",
      unit: "m^2/s^2",
      truncatedAt: "(GM/(c^2 r))^2",
    },
    "angular-momentum": {
      formula: ["factor * (y*vz - z*vy)", "factor * (z*vx - x*vz)", "factor * (x*vy - y*vx)"],
      unit: "m^2/s",
      truncatedAt: "(GM/(c^2 r))^2",
    },
  },
};
