import { nearest } from "../claim/nearest.js";
import { echo } from "../claim/problem.js";
import { CallError } from "./call-error.js";
import { sections } from "./catalog-entries.js";
import { labelled, separated } from "./columns.js";

/**
 * What there is, generated from the definitions.
 *
 * @param what a section, an entry, or undefined for a list of all
 * @throws CallError for a name that is neither
 */
export function catalogText(what: string | undefined): string {
  return `${(what === undefined ? list() : chosen(what)).join("\n")}\n`;
}

function list(): string[] {
  return separated([
    ...Object.entries(sections).map(([section, entries]) => [
      section,
      ...entries.flatMap(({ name, brief }) => labelled(name, brief)),
    ]),
    ["'cupel catalog NAME' shows a section or one entry in full."],
  ]);
}

function chosen(what: string): readonly string[] {
  if (Object.hasOwn(sections, what)) return separated(sections[what]!.map(({ lines }) => lines));
  const entries = Object.values(sections).flat();
  const entry = entries.find(({ name }) => name === what);
  if (entry !== undefined) return entry.lines;
  // Units are short, so that any mistyped name would be near one.
  const known = [...Object.keys(sections), ...entries.map(({ name }) => name)].filter(
    (name) => name.length > 2,
  );
  const near = nearest(what, known);
  const wanted = near === null ? "a name that 'cupel catalog' lists" : `'${near}'?`;
  throw new CallError(`found no entry ${echo(what)} in the catalog; wanted ${wanted}`);
}
