import { z } from "zod";
import { anyVariables } from "./catalog-keys.js";

/** A quantity is a text; how one looks is told to editors, and to those who forget the unit. */
export const dimensional = (description: string, ...examples: string[]) =>
  z.string().meta({ description, examples });

export const start = z
  .strictObject({
    periapsis: dimensional(
      "Least distance, with unit; with apoapsis. Osculating and Newtonian.",
      "0.21 au",
    ).optional(),
    apoapsis: dimensional("Greatest distance, with unit; with periapsis.", "0.34 au").optional(),
    "semi-major-axis": dimensional(
      "With unit; with eccentricity. Osculating and Newtonian.",
      "0.28 au",
    ).optional(),
    eccentricity: z
      .number()
      .meta({ description: "More than 0 and less than 1; with semi-major-axis." })
      .optional(),
    inclination: dimensional(
      "Against the xy plane, an angle from 0 to 180 deg; 0 when left out.",
      "28 deg",
    ).optional(),
    node: dimensional("Longitude of the ascending node, an angle; 0 when left out.", "40 deg").optional(),
    "argument-of-periapsis": dimensional("From the node, an angle; 0 when left out.", "75 deg").optional(),
    "true-anomaly": dimensional(
      "Where on the orbit the start is, an angle from periapsis; 0 when left out.",
      "180 deg",
    ).optional(),
    "turning-points": z
      .boolean()
      .meta({
        description:
          "True: periapsis and apoapsis are the exact turning points under the equations themselves.",
      })
      .optional(),
    state: anyVariables
      .meta({ description: "Instead of elements: the equations' own variables, each with its unit." })
      .optional(),
  })
  .meta({
    description: "The starting state: periapsis + apoapsis, or semi-major-axis + eccentricity, or state.",
  });
