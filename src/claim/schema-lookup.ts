import { z } from "zod";
import type { Path } from "./document.js";
import { claimSchema } from "./schema.js";

type Block = z.ZodObject<Record<string, z.ZodType>>;

/** Keys that the schema knows at a path. */
export function keysAt(path: Path): string[] {
  const schema = schemaAt(path);
  return schema instanceof z.ZodObject ? Object.keys((schema as Block).shape) : [];
}

/** The unit of the example of a quantity: `au` of '0.21 au'; undefined where none belongs. */
export function unitAt(path: Path): string | undefined {
  const examples = schemaAt(path)?.meta()?.examples;
  return Array.isArray(examples) ? /\s(.+)$/.exec(String(examples[0]))?.[1] : undefined;
}

/** The schema at a path, without its being optional. */
function schemaAt(path: Path): z.ZodType | undefined {
  let schema: z.ZodType | undefined = claimSchema;
  for (const key of path) {
    if (!(schema instanceof z.ZodObject)) return undefined;
    const { shape } = schema as Block;
    schema = Object.hasOwn(shape, key) ? bare(shape[key]!) : undefined;
  }
  return schema;
}

function bare(schema: z.ZodType): z.ZodType {
  return schema instanceof z.ZodOptional ? bare(schema.unwrap() as z.ZodType) : schema;
}
