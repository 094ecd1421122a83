import type { Splitting } from "../definition.js";

export const forestRuth4: Splitting = {
  name: "forest-ruth-4",
  title: "Forest and Ruth's fourth-order method, drift first",
  family: "splitting",
  order: 4,
  source: "E. Forest and R. D. Ruth, Physica D 43, 105 (1990)",
  symmetric: true,
  symplectic: true,
  stages: [
    { drift: "1/(4 - 2*2^(1/3))" },
    { kick: "1/(2 - 2^(1/3))" },
    { drift: "(1 - 2^(1/3))/(4 - 2*2^(1/3))" },
    { kick: "-2^(1/3)/(2 - 2^(1/3))" },
    { drift: "(1 - 2^(1/3))/(4 - 2*2^(1/3))" },
    { kick: "1/(2 - 2^(1/3))" },
    { drift: "1/(4 - 2*2^(1/3))" },
  ],
};
