import type { ExplicitRungeKutta } from "../definition.js";

export const dormandPrince5: ExplicitRungeKutta = {
  name: "dormand-prince-5",
  title: "Dormand and Prince's fifth-order method",
  family: "explicit-runge-kutta",
  order: 5,
  source:
    "J. R. Dormand and P. J. Prince, J. Comput. Appl. Math. 6, 19 (1980), table 2: RK5(4)7M, fifth-order weights",
  symmetric: false,
  symplectic: false,
  note: "Its apsidal advance converges at 6: the h^5 part of its state error turns no apsis in the mean over an orbit, which is even about the apsis.",
  a: [
    [],
    ["1/5"],
    ["3/40", "9/40"],
    ["44/45", "-56/15", "32/9"],
    ["19372/6561", "-25360/2187", "64448/6561", "-212/729"],
    ["9017/3168", "-355/33", "46732/5247", "49/176", "-5103/18656"],
  ],
  b: ["35/384", "0", "500/1113", "125/192", "-2187/6784", "11/84"],
};
