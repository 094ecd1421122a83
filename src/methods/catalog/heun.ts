import type { ExplicitRungeKutta } from "../definition.js";

export const heun: ExplicitRungeKutta = {
  name: "heun",
  title: "Heun's second-order method (explicit trapezium rule)",
  family: "explicit-runge-kutta",
  order: 2,
  source:
    "K. Heun, Z. Math. Phys. 45, 23 (1900); E. Hairer, S. P. Nørsett and G. Wanner, Solving Ordinary Differential Equations I, 2nd ed. (Springer, 1993), II.1",
  symmetric: false,
  symplectic: false,
  a: [[], ["1"]],
  b: ["1/2", "1/2"],
};
