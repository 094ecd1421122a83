import type { MethodDefinition } from "../definition.js";
import { dormandPrince5 } from "./dormand-prince-5.js";
import { dormandPrince8 } from "./dormand-prince-8.js";
import { euler } from "./euler.js";
import { forestRuth4 } from "./forest-ruth-4.js";
import { gaussLegendre6 } from "./gauss-legendre-6.js";
import { heun } from "./heun.js";
import { implicitMidpoint } from "./implicit-midpoint.js";
import { leapfrog } from "./leapfrog.js";
import { leapfrogDriftFirst } from "./leapfrog-drift-first.js";
import { midpoint } from "./midpoint.js";
import { rk4 } from "./rk4.js";
import { symplecticEuler } from "./symplectic-euler.js";
import { yoshida8 } from "./yoshida-8.js";

/** Every method, in the order in which they are listed. */
export const methodsCatalog: readonly MethodDefinition[] = [
  euler,
  midpoint,
  heun,
  rk4,
  dormandPrince5,
  dormandPrince8,
  symplecticEuler,
  leapfrog,
  leapfrogDriftFirst,
  forestRuth4,
  yoshida8,
  implicitMidpoint,
  gaussLegendre6,
];

export function findMethod(name: string): MethodDefinition | undefined {
  return methodsCatalog.find((method) => method.name === name);
}
