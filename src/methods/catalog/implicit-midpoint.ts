import type { ImplicitRungeKutta } from "../definition.js";

export const implicitMidpoint: ImplicitRungeKutta = {
  name: "implicit-midpoint",
  title: "Implicit midpoint rule",
  family: "implicit-runge-kutta",
  order: 2,
  source:
    "E. Hairer, C. Lubich and G. Wanner, Geometric Numerical Integration, 2nd ed. (Springer, 2006), II.1.1 (the Gauss method of one stage)",
  symmetric: true,
  symplectic: true,
  a: [["1/2"]],
  b: ["1"],
};
