import { columns, padEnd, wrap } from "../report/text.js";

const WIDTH = 80;
const LABEL = 22;
const INDENT = 2;

/** Lines of text set in from the left. */
export function indented(text: string, indent = INDENT): string[] {
  return wrap(text, WIDTH - indent).map((line) => " ".repeat(indent) + line);
}

/** A label and its text beside it; under it where the label is long. */
export function labelled(label: string, text: string): string[] {
  const lines = indented(text, INDENT + LABEL);
  const set = " ".repeat(INDENT) + label;
  if (columns(label) >= LABEL) return [set, ...lines];
  const [first = "", ...rest] = lines;
  return [padEnd(set, INDENT + LABEL) + first.trimStart(), ...rest];
}

/** Blocks of lines with an empty line between each two. */
export function separated(blocks: readonly (readonly string[])[]): string[] {
  return blocks.flatMap((lines, i) => (i === 0 ? lines : ["", ...lines]));
}
