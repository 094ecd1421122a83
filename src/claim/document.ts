import { isMap, isScalar, isSeq, LineCounter, type Node, parseAllDocuments } from "yaml";
import { outOfBounds } from "./bounds.js";
import { type Fault, type ParsedYaml, syntaxFaults, unwelcomeParts } from "./faults.js";
import type { Problem } from "./problem.js";

/** A step into a document: a key of a map, or an index of a list. */
export type Path = readonly (string | number)[];

/** A parsed file: plain data, and where each part of it stands. */
export interface ParsedDocument {
  readonly data: unknown;
  /** Line and column of a value, from 1; of the nearest enclosing one when it is missing. */
  place(path: Path): Place;
  /** Line and column of a key. */
  placeOfKey(path: Path): Place;
  /** A plain value as the file has it: `1e999`, and not the infinity that it is read as. */
  written(path: Path): string | undefined;
}

export interface Place {
  readonly line: number;
  readonly column: number;
}

/** Parses YAML (and JSON, being a subset) into plain data. Nothing in it is run, expanded or included. */
export function parseDocument(
  text: string,
  file: string,
):
  | { readonly ok: true; readonly document: ParsedDocument }
  | { readonly ok: false; readonly problems: Problem[] } {
  const at = placesIn(text);
  const problem = ({ offset, found, wanted }: Fault): Problem => ({
    file,
    ...at(offset),
    path: "",
    found,
    wanted,
  });
  const bounds = outOfBounds(text);
  if (bounds !== null) return { ok: false, problems: [problem(bounds)] };
  const documents = parseAllDocuments(text, { prettyErrors: false, logLevel: "silent" });
  const [document, second] = documents as unknown as ParsedYaml[];
  const faults = document === undefined ? [] : [...syntaxFaults(document), ...unwelcomeParts(document)];
  if (second !== undefined) {
    faults.push({ offset: second.range?.[0] ?? 0, found: "a second document", wanted: "one claim a file" });
  }
  if (document === undefined || (document.contents === null && faults.length === 0)) {
    faults.push({
      offset: 0,
      found: "nothing in the file",
      wanted: "a claim: 'cupel: claim/1' and its keys",
    });
  }
  if (document === undefined || faults.length > 0) {
    return { ok: false, problems: faults.filter(isFirstAtItsPlace).map(problem) };
  }
  const root = document.contents!;
  return {
    ok: true,
    document: {
      data: document.toJS({ maxAliasCount: 0 }),
      place: (path) => at(find(root, path).range?.[0] ?? 0),
      placeOfKey: (path) => at((keyOf(root, path) ?? find(root, path)).range?.[0] ?? 0),
      written: (path) => writtenAt(root, path),
    },
  };
}

/** Line and column, from 1, of an offset. */
function placesIn(text: string): (offset: number) => Place {
  const lines = new LineCounter();
  lines.addNewLine(0);
  for (const { index } of text.matchAll(/\n/g)) lines.addNewLine(index + 1);
  return (offset) => {
    const { line, col } = lines.linePos(offset);
    return { line, column: col };
  };
}

/** One slip of the pen makes several errors of syntax at one place. */
function isFirstAtItsPlace(fault: Fault, index: number, all: readonly Fault[]): boolean {
  return all.findIndex(({ offset }) => offset === fault.offset) === index;
}

/** The node at a path, or the last one on the way to it. */
function find(root: Node, path: Path): Node {
  let node: Node = root;
  for (const step of path) {
    const next = child(node, step);
    if (next === null) break;
    node = next;
  }
  return node;
}

function child(node: Node, step: string | number): Node | null {
  return isMap(node) || isSeq(node) ? ((node.get(step, true) as Node | null | undefined) ?? null) : null;
}

function writtenAt(root: Node, path: Path): string | undefined {
  const node = path.reduce<Node | null>((inner, step) => inner && child(inner, step), root);
  return isScalar(node) ? node.source : undefined;
}

function keyOf(root: Node, path: Path): Node | null {
  const parent = find(root, path.slice(0, -1));
  if (!isMap(parent)) return null;
  const pair = parent.items.find(({ key }) => isScalar(key) && String(key.value) === String(path.at(-1)));
  return (pair?.key as Node | undefined) ?? null;
}
