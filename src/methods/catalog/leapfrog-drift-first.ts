import type { Splitting } from "../definition.js";

export const leapfrogDriftFirst: Splitting = {
  name: "leapfrog-drift-first",
  title: "Leapfrog (Störmer-Verlet), drift-kick-drift",
  family: "splitting",
  order: 2,
  source:
    "E. Hairer, C. Lubich and G. Wanner, Geometric Numerical Integration, 2nd ed. (Springer, 2006), I.1.4",
  symmetric: true,
  symplectic: true,
  stages: [{ drift: "1/2" }, { kick: "1" }, { drift: "1/2" }],
};
