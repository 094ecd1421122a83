import type { ImplicitRungeKutta } from "../definition.js";

export const gaussLegendre6: ImplicitRungeKutta = {
  name: "gauss-legendre-6",
  title: "Gauss-Legendre method of three stages",
  family: "implicit-runge-kutta",
  order: 6,
  source:
    "J. C. Butcher, Math. Comp. 18, 50 (1964); E. Hairer, C. Lubich and G. Wanner, Geometric Numerical Integration, 2nd ed. (Springer, 2006), II.1.3, table 1.1",
  symmetric: true,
  symplectic: true,
  a: [
    ["5/36", "2/9 - sqrt(15)/15", "5/36 - sqrt(15)/30"],
    ["5/36 + sqrt(15)/24", "2/9", "5/36 - sqrt(15)/24"],
    ["5/36 + sqrt(15)/30", "2/9 + sqrt(15)/15", "5/36"],
  ],
  b: ["5/18", "4/9", "5/18"],
};
