import type { ExplicitRungeKutta } from "../definition.js";

export const midpoint: ExplicitRungeKutta = {
  name: "midpoint",
  title: "Explicit midpoint method",
  family: "explicit-runge-kutta",
  order: 2,
  source:
    "C. Runge, Math. Ann. 46, 167 (1895); E. Hairer, S. P. Nørsett and G. Wanner, Solving Ordinary Differential Equations I, 2nd ed. (Springer, 1993), II.1, table 1.1",
  symmetric: false,
  symplectic: false,
  a: [[], ["1/2"]],
  b: ["0", "1"],
};
