import type { EquationsDefinition } from "../definition.js";
import { newtonian } from "./newtonian.js";
import { newtonianAngle } from "./newtonian-angle.js";
import { oblate } from "./oblate.js";
import { postNewtonian1 } from "./post-newtonian-1.js";
import { schwarzschildAngle } from "./schwarzschild-angle.js";

/** Every system of equations, in the order in which they are listed. */
export const equationsCatalog: readonly EquationsDefinition[] = [
  newtonianAngle,
  schwarzschildAngle,
  newtonian,
  postNewtonian1,
  oblate,
];

export function findEquations(name: string): EquationsDefinition | undefined {
  return equationsCatalog.find((equations) => equations.name === name);
}
