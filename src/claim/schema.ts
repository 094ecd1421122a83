import { z } from "zod";
import { equationsCatalog } from "../equations/catalog/index.js";
import { methodsCatalog } from "../methods/catalog/index.js";
import { anyParameters } from "./catalog-keys.js";
import { dimensional, start } from "./schema-of-start.js";

const names = (catalog: readonly { readonly name: string }[]) =>
  catalog.map(({ name }) => name) as [string, ...string[]];
const method = z.enum(names(methodsCatalog));
/** A run of a single orbit takes minutes at that, and every step adds its rounding: nobody goes there. */
const MOST_STEPS_PER_ORBIT = 1e9;

const solution = z
  .strictObject({
    method: method.meta({ description: "The author's method, by its catalog name." }),
    step: dimensional(
      "The step: a time, or an angle for angle-form equations.",
      "0.1 d",
      "0.5 deg",
    ).optional(),
    "steps-per-orbit": z
      .number()
      .gt(1)
      .max(MOST_STEPS_PER_ORBIT)
      .meta({ description: "Instead of step: the osculating Newtonian period in so many steps." })
      .optional(),
    arithmetic: z
      .enum(["double", "single"])
      .meta({ description: "The arithmetic of the author's program." })
      .optional(),
    "read-off": z.enum(["refined"]).meta({ description: "How the author located the apsis." }).optional(),
    fit: z
      .enum(["slope"])
      .meta({ description: "How the author got one figure from many passages." })
      .optional(),
  })
  .meta({ description: "How the author solved it; may be left out by someone who has only the text." });

/** At least one character that is seen, and none that breaks the line, turns its direction or is half a pair. */
const ONE_LINE =
  /^(?=.*[^\s\p{C}])[^\p{Cc}\p{Cs}\u2028\u2029\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]+$/u;

/** The claim file as it is written. */
export const claimSchema = z
  .strictObject({
    cupel: z.literal("claim/1").meta({ description: "Format and version of this file." }),
    title: z.string().max(200).regex(ONE_LINE).meta({ description: "One line for people." }),
    claimed: z
      .strictObject({
        quantity: z.enum(["apsidal-advance"]).meta({ description: "What the figure is." }),
        value: z.string().meta({
          description:
            "The figure as quoted, with unit: 104.41(2) arcsec/century, 12.1 ± 0.1 arcmin/orbit, or bare digits.",
          examples: ["104.41(2) arcsec/century"],
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
        parameters: anyParameters
          .meta({ description: "Parameters of the equations, each with its unit." })
          .optional(),
        start,
        span: z.string().meta({
          description: "'100 orbits', or a time, or an angle for angle-form equations.",
          examples: ["100 orbits"],
        }),
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

/** A claim of which some parts were wrong and have been taken out. */
export type PartialClaim = Part<RawClaim>;
type Part<T> = T extends readonly unknown[]
  ? T
  : T extends object
    ? { [K in keyof T]?: Part<T[K]> | undefined }
    : T;

/** The JSON Schema (draft 2020-12) of claim files, for editors. */
export function claimJsonSchema(): object {
  return z.toJSONSchema(claimSchema, { target: "draft-2020-12", io: "input" });
}
