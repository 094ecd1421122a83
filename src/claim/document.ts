import { isAlias, isMap, isScalar, isSeq, LineCounter, type Node, parseAllDocuments, visit } from "yaml";
import { echo, type Problem } from "./problem.js";

/** A step into a document: a key of a map, or an index of a list. */
export type Path = readonly (string | number)[];

/** A parsed file: plain data, and where each part of it stands. */
export interface ParsedDocument {
  readonly data: unknown;
  /** Line and column of a value, from 1; of the nearest enclosing one when it is missing. */
  place(path: Path): { readonly line: number; readonly column: number };
  /** Line and column of a key. */
  placeOfKey(path: Path): { readonly line: number; readonly column: number };
}

/** Claims nest four levels; anything deep is not one. */
const DEEPEST = 32;

const PLAIN_TAGS = new Set(
  ["map", "seq", "str", "int", "float", "bool", "null"].map((name) => `tag:yaml.org,2002:${name}`),
);

/** Parses YAML (and JSON, being a subset) into plain data. Nothing in it is run, expanded or included. */
export function parseDocument(
  text: string,
  file: string,
):
  | { readonly ok: true; readonly document: ParsedDocument }
  | { readonly ok: false; readonly problems: Problem[] } {
  const lines = new LineCounter();
  const at = (offset: number) => {
    const { line, col } = lines.linePos(offset);
    return { line: Math.max(1, line), column: Math.max(1, col) };
  };
  const problem = (offset: number, found: string, wanted: string): Problem => ({
    file,
    ...at(offset),
    path: "",
    found,
    wanted,
  });
  if (deepest(text) > DEEPEST) {
    return {
      ok: false,
      problems: [problem(0, "brackets nested without end", "a claim, which nests four levels")],
    };
  }
  let documents: ReturnType<typeof parseAllDocuments>;
  try {
    documents = parseAllDocuments(text, { lineCounter: lines, prettyErrors: false });
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return {
      ok: false,
      problems: [problem(0, "blocks nested without end", "a claim, which nests four levels")],
    };
  }
  const [document, second] = documents as unknown as ParsedYaml[];
  if (document === undefined || document.contents === null) {
    return {
      ok: false,
      problems: [problem(0, "nothing in the file", "a claim: 'cupel: claim/1' and its keys")],
    };
  }
  const problems = document.errors.map(({ pos, message }) => problem(pos[0], ...inWords(message)));
  if (second !== undefined) {
    problems.push(problem(second.range?.[0] ?? 0, "a second document", "one claim a file"));
  }
  visit(document as never, {
    Node: (_, node) => {
      const { anchor, range } = node as { anchor?: string; range?: [number, number, number] };
      if (isAlias(node) || anchor !== undefined) {
        problems.push(
          problem(
            range?.[0] ?? 0,
            isAlias(node) ? `the alias ${echo(`*${node.source}`)}` : `the anchor ${echo(`&${anchor}`)}`,
            "the value itself: claims take no anchors and aliases",
          ),
        );
      }
      const tag = (node as { tag?: string }).tag;
      if (tag !== undefined && !PLAIN_TAGS.has(tag)) {
        problems.push(problem(range?.[0] ?? 0, `the tag ${echo(tag)}`, "a plain value"));
      }
    },
  });
  if (problems.length > 0) return { ok: false, problems };
  const root = document.contents;
  return {
    ok: true,
    document: {
      data: document.toJS({ maxAliasCount: 0 }),
      place: (path) => at(find(root, path).range?.[0] ?? 0),
      placeOfKey: (path) => at((keyOf(root, path) ?? find(root, path)).range?.[0] ?? 0),
    },
  };
}

/** The part of a YAML document that is used here. */
interface ParsedYaml {
  readonly contents: Node | null;
  readonly errors: readonly { readonly pos: readonly [number, number]; readonly message: string }[];
  readonly range?: readonly [number, number, number];
  toJS(options: { maxAliasCount: number }): unknown;
}

/** What a YAML error found and wants. */
function inWords(message: string): [string, string] {
  if (message.startsWith("Map keys must be unique")) return ["a key for the second time", "each key once"];
  return [`text that is not YAML (${echo(message).slice(1, -1)})`, "well-formed YAML"];
}

function find(root: Node, path: Path): Node {
  let node: Node = root;
  for (const step of path) {
    const next: unknown = isMap(node) || isSeq(node) ? node.get(step, true) : undefined;
    if (next === undefined || next === null) break;
    node = next as Node;
  }
  return node;
}

function keyOf(root: Node, path: Path): Node | null {
  const parent = find(root, path.slice(0, -1));
  if (!isMap(parent)) return null;
  const pair = parent.items.find(({ key }) => isScalar(key) && String(key.value) === String(path.at(-1)));
  return (pair?.key as Node | undefined) ?? null;
}

/** Greatest depth of brackets, whatever they stand in: a cheap bound ahead of the parser's own recursion. */
function deepest(text: string): number {
  let depth = 0;
  let most = 0;
  for (const character of text) {
    if (character === "[" || character === "{") most = Math.max(most, ++depth);
    else if (character === "]" || character === "}") depth = Math.max(0, depth - 1);
  }
  return most;
}
