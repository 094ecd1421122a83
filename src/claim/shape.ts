import type { z } from "zod";
import type { ParsedDocument, Path } from "./document.js";
import { oneOf } from "./nearest.js";
import { echo, type Problem } from "./problem.js";
import { claimSchema } from "./schema.js";

type Issue = z.core.$ZodIssue;

/** The problems that a schema finds, each with its place and what would be right. */
export function shapeProblems(issues: readonly Issue[], document: ParsedDocument, file: string): Problem[] {
  return issues.flatMap((issue) => {
    const path = issue.path as (string | number)[];
    const at = (
      place: { line: number; column: number },
      where: Path,
      found: string,
      wanted: string,
    ): Problem => ({
      file,
      ...place,
      path: where.join("."),
      found,
      wanted,
    });
    if (issue.code === "unrecognized_keys") {
      return issue.keys.map((key) =>
        at(
          document.placeOfKey([...path, key]),
          path,
          `the unknown key ${echo(key)}`,
          oneOf(key, keysAt(path)),
        ),
      );
    }
    const value = valueAt(document.data, path);
    const place = value === undefined ? document.placeOfKey(path) : document.place(path);
    return [at(place, path, value === undefined ? "nothing" : echo(value), wanted(issue, value))];
  });
}

function wanted(issue: Issue, value: unknown): string {
  switch (issue.code) {
    case "invalid_value": {
      const values = issue.values.map(String);
      return typeof value === "string"
        ? oneOf(value, values)
        : values.length === 1
          ? `'${values[0]}'`
          : `one of ${values.join(", ")}`;
    }
    case "invalid_type":
      return TYPES[issue.expected] ?? `a value of type ${issue.expected}`;
    case "too_small":
      return issue.origin === "number" || issue.origin === "int"
        ? `${issue.inclusive ? "at least" : "more than"} ${issue.minimum}`
        : "something in it";
    case "too_big":
      return issue.origin === "string" ? `at most ${issue.maximum} characters` : `at most ${issue.maximum}`;
    case "invalid_format":
      return "a single line";
    case "invalid_union":
      return "a value with its unit";
    default:
      return issue.message;
  }
}

const TYPES: Readonly<Record<string, string>> = {
  string: "text, with its unit where it has one",
  number: "a number",
  int: "a whole number",
  boolean: "true or false",
  object: "a block of keys",
  record: "a block of keys",
  array: "a list",
};

function valueAt(data: unknown, path: Path): unknown {
  return path.reduce<unknown>(
    (value, key) =>
      typeof value === "object" && value !== null && Object.hasOwn(value, key)
        ? (value as Record<string | number, unknown>)[key]
        : undefined,
    data,
  );
}

/** Keys that the schema knows at a path. */
function keysAt(path: Path): string[] {
  let schema: unknown = claimSchema;
  for (const key of path) schema = unwrap(schema).shape?.[key];
  return Object.keys(unwrap(schema).shape ?? {});
}

function unwrap(schema: unknown): { readonly shape?: Readonly<Record<string | number, unknown>> } {
  let inner = schema as { shape?: Record<string, unknown>; unwrap?: () => unknown };
  while (inner?.shape === undefined && typeof inner?.unwrap === "function")
    inner = inner.unwrap() as typeof inner;
  return inner ?? {};
}
