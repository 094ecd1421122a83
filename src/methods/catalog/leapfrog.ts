import type { Splitting } from "../definition.js";

export const leapfrog: Splitting = {
  name: "leapfrog",
  title: "Leapfrog (Störmer-Verlet), kick-drift-kick",
  family: "splitting",
  order: 2,
  source:
    "L. Verlet, Phys. Rev. 159, 98 (1967); E. Hairer, C. Lubich and G. Wanner, Geometric Numerical Integration, 2nd ed. (Springer, 2006), I.1.4",
  symmetric: true,
  symplectic: true,
  stages: [{ kick: "1/2" }, { drift: "1" }, { kick: "1/2" }],
};
