import { z } from "zod";
import { equationsCatalog } from "../equations/catalog/index.js";
import { methodsCatalog } from "../methods/catalog/index.js";

const names = (catalog: readonly { readonly name: string }[]) =>
  catalog.map(({ name }) => name) as [string, ...string[]];
const method = z.enum(names(methodsCatalog));
const dimensional = (what: string) => z.string().meta({ description: what });

const start = z
  .strictObject({
    periapsis: dimensional("Least distance, with unit; with apoapsis. Osculating and Newtonian.").optional(),
    apoapsis: dimensional("Greatest distance, with unit; with periapsis.").optional(),
    "semi-major-axis": dimensional("With unit; with eccentricity. Osculating and Newtonian.").optional(),
    eccentricity: z
      .number()
      .meta({ description: "More than 0 and less than 1; with semi-major-axis." })
      .optional(),
    inclination: dimensional("Against the xy plane, an angle; 0 when left out.").optional(),
    node: dimensional("Longitude of the ascending node, an angle; 0 when left out.").optional(),
    "argument-of-periapsis": dimensional("From the node, an angle; 0 when left out.").optional(),
    "true-anomaly": dimensional(
      "Where on the orbit the start is, an angle from periapsis; 0 when left out.",
    ).optional(),
    "turning-points": z
      .boolean()
      .meta({
        description:
          "True: periapsis and apoapsis are the exact turning points under the equations themselves.",
      })
      .optional(),
    state: z
      .record(z.string(), z.string())
      .meta({ description: "Instead of elements: the equations' own variables, each with its unit." })
      .optional(),
  })
  .meta({
    description: "The starting state: periapsis + apoapsis, or semi-major-axis + eccentricity, or state.",
  });

const solution = z
  .strictObject({
    method: method.meta({ description: "The author's method, by its catalog name." }),
    step: dimensional("The step: a time, or an angle for angle-form equations.").optional(),
    "steps-per-orbit": z
      .number()
      .positive()
      .meta({ description: "Instead of step: the osculating Newtonian period in so many steps." })
      .optional(),
    arithmetic: z
      .enum(["double"])
      .meta({ description: "The arithmetic of the author's program." })
      .optional(),
    "read-off": z.enum(["refined"]).meta({ description: "How the author located the apsis." }).optional(),
    fit: z
      .enum(["slope"])
      .meta({ description: "How the author got one figure from many passages." })
      .optional(),
  })
  .meta({ description: "How the author solved it; may be left out by someone who has only the text." });

/** The claim file as it is written. */
export const claimSchema = z
  .strictObject({
    cupel: z.literal("claim/1").meta({ description: "Format and version of this file." }),
    title: z
      .string()
      .min(1)
      .max(200)
      .regex(/^[^\n\r]*$/)
      .meta({ description: "One line for people." }),
    claimed: z
      .strictObject({
        quantity: z.enum(["apsidal-advance"]).meta({ description: "What the figure is." }),
        value: z.string().meta({
          description:
            "The figure as quoted, with unit: 104.41(2) arcsec/century, 12.1 ± 0.1 arcmin/orbit, or bare digits.",
        }),
        baseline: z
          .enum(["included", "subtracted"])
          .meta({
            description: "subtracted: the author took off the figure of a null run.",
            default: "included",
          })
          .optional(),
      })
      .meta({ description: "The quoted figure." }),
    scenario: z
      .strictObject({
        equations: z.enum(names(equationsCatalog)).meta({ description: "A catalog name of equations." }),
        parameters: z
          .record(z.string(), z.union([z.string(), z.number()]))
          .meta({ description: "Parameters of the equations, each with its unit." })
          .optional(),
        start,
        span: z
          .string()
          .meta({ description: "'100 orbits', or a time, or an angle for angle-form equations." }),
      })
      .meta({ description: "What was integrated." }),
    solution: solution.optional(),
    audit: z
      .strictObject({
        witnesses: z
          .array(method)
          .min(1)
          .meta({ description: "Independent methods, never the author's." })
          .optional(),
        rungs: z
          .int()
          .min(4)
          .max(16)
          .meta({ description: "Rungs of each ladder, at least; 8 when left out." })
          .optional(),
      })
      .meta({ description: "How to audit; every value has a good default." })
      .optional(),
  })
  .meta({
    title: "Cupel claim, version 1",
    description: "A figure read off an orbit integration, and how it was computed.",
  });

export type RawClaim = z.infer<typeof claimSchema>;

/** The JSON Schema (draft 2020-12) of claim files, for editors. */
export function claimJsonSchema(): object {
  return z.toJSONSchema(claimSchema, { target: "draft-2020-12", io: "input" });
}
