import { isAlias, isMap, isSeq, type Node, visit } from "yaml";
import { echo } from "./problem.js";

/** What makes a text no claim, at an offset into it. */
export interface Fault {
  readonly offset: number;
  readonly found: string;
  readonly wanted: string;
}

/** The part of a YAML document that is used here. */
export interface ParsedYaml {
  readonly contents: Node | null;
  readonly errors: readonly { readonly pos: readonly [number, number]; readonly message: string }[];
  readonly range?: readonly [number, number, number];
  toJS(options: { maxAliasCount: number }): unknown;
}

const PLAIN_TAGS = new Set(
  ["map", "seq", "str", "int", "float", "bool", "null"].map((name) => `tag:yaml.org,2002:${name}`),
);

/** The parser's errors, in our words. */
export function syntaxFaults(document: ParsedYaml): Fault[] {
  return document.errors.map(({ pos: [offset], message }) => {
    if (message.startsWith("Map keys must be unique")) {
      return { offset, found: "a key for the second time", wanted: "each key once" };
    }
    if (message.startsWith("Missing closing")) {
      return {
        offset: startOfText(document, offset),
        found: "text that is not YAML (a quotation mark without its fellow)",
        wanted: "a closing quotation mark",
      };
    }
    return {
      offset,
      found: `text that is not YAML (${echo(message).slice(1, -1)})`,
      wanted: "well-formed YAML",
    };
  });
}

/** Where a text in quotes begins that has not ended at an offset: there, and not at its end, is the slip. */
function startOfText(document: ParsedYaml, end: number): number {
  let start = end;
  visit(document as never, {
    Scalar: (_, { range, type }) => {
      if (type?.startsWith("QUOTE") && range && range[1] === end) start = range[0];
    },
  });
  return start;
}

/** Parts of YAML that no claim needs: anchors, aliases, tags, keys that are not names. */
export function unwelcomeParts(document: ParsedYaml): Fault[] {
  const faults: Fault[] = [];
  const note = (node: Node, found: string, wanted: string) =>
    faults.push({ offset: node.range?.[0] ?? 0, found, wanted });
  visit(document as never, {
    Pair: (_, { key }) => {
      if (isMap(key) || isSeq(key)) note(key, "a block or list for a key", "a name");
    },
    Node: (_, node) => {
      const { anchor, tag } = node as { anchor?: string; tag?: string };
      if (isAlias(node)) note(node, `the alias ${echo(`*${node.source}`)}`, NO_ALIASES);
      else if (anchor !== undefined) note(node, `the anchor ${echo(`&${anchor}`)}`, NO_ALIASES);
      if (tag !== undefined && !PLAIN_TAGS.has(tag)) note(node, `the tag ${echo(tag)}`, "a plain value");
    },
  });
  return faults;
}

const NO_ALIASES = "the value itself: claims take no anchors and aliases";
