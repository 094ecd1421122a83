import type { ExplicitRungeKutta } from "../definition.js";

export const rk4: ExplicitRungeKutta = {
  name: "rk4",
  title: "Classical fourth-order Runge-Kutta method",
  family: "explicit-runge-kutta",
  order: 4,
  source:
    "W. Kutta, Z. Math. Phys. 46, 435 (1901); E. Hairer, S. P. Nørsett and G. Wanner, Solving Ordinary Differential Equations I, 2nd ed. (Springer, 1993), II.1, table 1.2",
  symmetric: false,
  symplectic: false,
  a: [[], ["1/2"], ["0", "1/2"], ["0", "0", "1"]],
  b: ["1/6", "1/3", "1/3", "1/6"],
};
