import type { EquationsDefinition } from "../definition.js";
import { cartesian, gravitationalParameter } from "./common.js";

export const newtonian: EquationsDefinition = {
  name: "newtonian",
  title: "Kepler problem in time",
  display: "r'' = -GM r / |r|^3",
  form: "time",
  source: "I. Newton, Principia, Book I, Prop. 11; H. Goldstein, Classical Mechanics, 2nd ed. (1980), ch. 3",
  parameters: { GM: gravitationalParameter },
  coordinates: cartesian,
  let: { s: "1 / sqrt(x^2 + y^2 + z^2)" },
  potential: "-GM * s",
  conserved: {
    "angular-momentum": {
      formula: ["y*vz - z*vy", "z*vx - x*vz", "x*vy - y*vx"],
      unit: "m^2/s",
    },
    "eccentricity-vector": {
      formula: [
        "(vy*(x*vy - y*vx) - vz*(z*vx - x*vz)) / GM - x * s",
        "(vz*(y*vz - z*vy) - vx*(x*vy - y*vx)) / GM - y * s",
        "(vx*(z*vx - x*vz) - vy*(y*vz - z*vy)) / GM - z * s",
      ],
      unit: "1",
    },
  },
};
