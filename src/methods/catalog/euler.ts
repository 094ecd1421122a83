import type { ExplicitRungeKutta } from "../definition.js";

export const euler: ExplicitRungeKutta = {
  name: "euler",
  title: "Explicit Euler method",
  family: "explicit-runge-kutta",
  order: 1,
  source:
    "L. Euler, Institutiones Calculi Integralis I (1768), sect. II, cap. VII; E. Hairer, S. P. Nørsett and G. Wanner, Solving Ordinary Differential Equations I, 2nd ed. (Springer, 1993), I.7",
  symmetric: false,
  symplectic: false,
  a: [[]],
  b: ["1"],
};
