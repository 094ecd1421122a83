import type { z } from "zod";
import type { ParsedDocument, Path } from "./document.js";
import { oneOf } from "./nearest.js";
import { echo } from "./problem.js";
import type { Reporter } from "./reporter.js";
import { claimSchema, type PartialClaim } from "./schema.js";
import { keysAt, unitAt } from "./schema-lookup.js";

type Issue = z.core.$ZodIssue;

/**
 * Holds the data against the schema. What is wrong is reported and taken out of the data, so that the rest
 * can be looked at too: all problems of a file are told at once.
 */
export function shapeOf(document: ParsedDocument, report: Reporter): PartialClaim {
  const issues = claimSchema.safeParse(document.data).error?.issues ?? [];
  for (const issue of issues) {
    const path = issue.path as (string | number)[];
    if (issue.code === "unrecognized_keys") {
      for (const key of issue.keys) report.unknownKey([...path, key], keysAt(path));
    } else if (!report.isTold(path)) {
      tell(issue, path, document, report);
    }
  }
  for (const issue of issues) {
    const path = issue.path as (string | number)[];
    if (issue.code === "unrecognized_keys") {
      for (const key of issue.keys) takeOut(document.data, [...path, key]);
    } else {
      takeOut(document.data, path);
    }
  }
  // The data themselves and not zod's copy, which leaves out a key of the name __proto__ without a word.
  return isBlock(document.data) && !Array.isArray(document.data) ? (document.data as PartialClaim) : {};
}

function tell(issue: Issue, path: Path, document: ParsedDocument, report: Reporter): void {
  const value = valueAt(document.data, path);
  if (value === undefined) {
    report.missing(path, wanted(issue, value, path));
    return;
  }
  const found = echo(typeof value === "number" ? (document.written(path) ?? value) : value);
  report.at(path, { found, wanted: wanted(issue, value, path, document.written(path)) });
}

function wanted(issue: Issue, value: unknown, path: Path, written?: string): string {
  switch (issue.code) {
    case "invalid_value": {
      const values = issue.values.map(String);
      if (typeof value === "string") return oneOf(value, values);
      return values.length === 1 ? `'${values[0]}'` : `one of ${values.join(", ")}`;
    }
    case "invalid_type":
      return typeWanted(issue.expected, value, path, written);
    case "too_small":
      if (issue.origin === "array") return "something in it";
      return `${issue.inclusive ? "at least" : "more than"} ${issue.minimum}${why(path)}`;
    case "too_big":
      return `at most ${issue.maximum}${issue.origin === "string" ? " characters" : ""}`;
    case "invalid_format":
      return "a single line of text that can be seen, without control characters";
    case "invalid_union":
      return "a value with its unit";
    default:
      return issue.message;
  }
}

function typeWanted(expected: string, value: unknown, path: Path, written?: string): string {
  if (expected === "string") {
    const unit = unitAt(path);
    if (unit === undefined) return typeof value === "number" ? "text: put it in quotes" : "text";
    return `a value with its unit, such as '${Number.isFinite(value) ? written : "1"} ${unit}'`;
  }
  if (expected === "number" && typeof value === "string") return "a plain number, without unit or quotes";
  return TYPES[expected] ?? `a value of type ${expected}`;
}

const TYPES: Readonly<Record<string, string>> = {
  number: "a finite number",
  int: "a whole number",
  boolean: "true or false",
  object: "a block of keys",
  array: "a list",
};

const why = (path: Path): string =>
  path.at(-1) === "steps-per-orbit" ? ": a step is a part of the orbit" : "";

const isBlock = (value: unknown): value is Record<string | number, unknown> =>
  typeof value === "object" && value !== null;

function valueAt(data: unknown, path: Path): unknown {
  return path.reduce<unknown>(
    (value, key) => (isBlock(value) && Object.hasOwn(value, key) ? value[key] : undefined),
    data,
  );
}

/** Takes a part out of a block; a wrong element takes its whole list along. */
function takeOut(data: unknown, path: Path): void {
  if (path.length === 0) return;
  const parent = valueAt(data, path.slice(0, -1));
  if (Array.isArray(parent)) takeOut(data, path.slice(0, -1));
  else if (isBlock(parent)) delete parent[path.at(-1)!];
}
