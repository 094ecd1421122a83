import type { EquationsDefinition } from "../definition.js";
import { gravitationalParameter, inverseRadius, inverseSemiLatusRectum, lightSpeed } from "./common.js";

export const schwarzschildAngle: EquationsDefinition = {
  name: "schwarzschild-angle",
  title: "Orbit equation of a test particle in the Schwarzschild field",
  display: "u'' + u = GM/h^2 + (3 GM/c^2) u^2, with u = 1/r and ' = d/dphi",
  form: "angle",
  source: "C. W. Misner, K. S. Thorne and J. A. Wheeler, Gravitation (1973), sect. 25.5; exact",
  parameters: {
    GM: gravitationalParameter,
    c: lightSpeed,
    "inverse-semi-latus-rectum": inverseSemiLatusRectum,
  },
  coordinates: inverseRadius,
  let: { m: "GM / c^2" },
  acceleration: { u: "K - u + 3*m*u^2" },
  conserved: {
    "first-integral": { formula: "(w^2 + u^2) / 2 - K*u - m*u^3", unit: "1/m^2" },
  },
};
