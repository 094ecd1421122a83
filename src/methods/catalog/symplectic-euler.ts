import type { Splitting } from "../definition.js";

export const symplecticEuler: Splitting = {
  name: "symplectic-euler",
  title: "Symplectic Euler method, kick first",
  family: "splitting",
  order: 1,
  source:
    "E. Hairer, C. Lubich and G. Wanner, Geometric Numerical Integration, 2nd ed. (Springer, 2006), I.1.2",
  symmetric: false,
  symplectic: true,
  note: "Conjugate to leapfrog: over whole orbits, and so in the advance, it converges at 2.",
  stages: [{ kick: "1" }, { drift: "1" }],
};
