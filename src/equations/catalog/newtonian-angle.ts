import type { EquationsDefinition } from "../definition.js";
import { gravitationalParameter, inverseRadius, inverseSemiLatusRectum } from "./common.js";

export const newtonianAngle: EquationsDefinition = {
  name: "newtonian-angle",
  title: "Kepler problem as an orbit equation",
  display: "u'' + u = GM/h^2, with u = 1/r and ' = d/dphi",
  form: "angle",
  source: "J. Binet's equation; H. Goldstein, Classical Mechanics, 2nd ed. (1980), eq. 3-34",
  parameters: {
    GM: { ...gravitationalParameter, default: 1 },
    "inverse-semi-latus-rectum": inverseSemiLatusRectum,
  },
  coordinates: inverseRadius,
  acceleration: { u: "K - u" },
  conserved: {
    "first-integral": { formula: "(w^2 + u^2) / 2 - K*u", unit: "1/m^2" },
  },
};
