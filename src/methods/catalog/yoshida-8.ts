import type { Splitting } from "../definition.js";

/**
 * w7 to w1 of solution A of table 2. The 15 digits printed there were refined by Newton's iteration on the
 * order conditions, which leaves every printed digit but the last two as it was.
 */
const outer = [
  "1.04242620869970426434895326839766",
  "1.82020630970698006933173316612140",
  "0.15773992812370832134282578307954",
  "2.44002732616634406381689589761943",
  "-0.00716989419709533209980612924965",
  "-2.44699182370424588929469145238146",
  "-1.61582374150065378478794019745874",
];
/** w0 = 1 - 2 (w1 + ... + w7). */
const middle = `1 - 2 * (${outer.map((w) => `(${w})`).join(" + ")})`;
const steps = [...outer, middle, ...outer.toReversed()];

/** Leapfrogs of length w in a row: the kick between two of them is half the sum of both. */
const stages = steps.flatMap((w, i) => [
  { kick: i === 0 ? `(${w}) / 2` : `((${steps[i - 1]}) + (${w})) / 2` },
  { drift: w },
]);

export const yoshida8: Splitting = {
  name: "yoshida-8",
  title: "Yoshida's eighth-order method, fifteen leapfrogs (solution A)",
  family: "splitting",
  order: 8,
  source: "H. Yoshida, Phys. Lett. A 150, 262 (1990), table 2, solution A",
  symmetric: true,
  symplectic: true,
  stages: [...stages, { kick: `(${outer[0]}) / 2` }],
};
