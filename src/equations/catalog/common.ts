import type { EquationsDefinition, ParameterDefinition } from "../definition.js";

/** Position and velocity in Cartesian coordinates. */
export const cartesian: EquationsDefinition["coordinates"] = {
  x: { rate: "vx", unit: "m" },
  y: { rate: "vy", unit: "m" },
  z: { rate: "vz", unit: "m" },
};

/** The inverse radius u = 1/r as a function of the polar angle. */
export const inverseRadius: EquationsDefinition["coordinates"] = { u: { rate: "w", unit: "1/m" } };

export const gravitationalParameter: ParameterDefinition = {
  symbol: "GM",
  unit: "m^3/s^2",
  meaning: "gravitational parameter of the centre, or of both bodies together",
  range: "positive",
};

/** The null run takes it to infinity: what is left is Newton's. */
export const lightSpeed: ParameterDefinition = {
  symbol: "c",
  unit: "m/s",
  meaning: "speed of light",
  vanishesAt: Number.POSITIVE_INFINITY,
  range: "positive",
};

export const inverseSemiLatusRectum: ParameterDefinition = {
  symbol: "K",
  unit: "1/m",
  meaning: "GM/h², the inverse of the semi-latus rectum; from the start",
  fromStart: "inverse-semi-latus-rectum",
  range: "positive",
};
