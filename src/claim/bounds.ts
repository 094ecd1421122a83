import { Lexer, Parser } from "yaml";
import type { Fault } from "./faults.js";

/**
 * Words, marks and line ends of a text. A claim has some hundreds; the parser compares the keys of a block
 * pair by pair, so that its time grows as the square: 10 000 of them take it 0.1 s.
 */
const MOST_PARTS = 10_000;

/** Claims nest four levels; the parser calls itself once a level and must not run out of stack. */
const DEEPEST = 32;

/** What makes a text no claim before it is parsed in full, and where; null when it is within bounds. */
export function outOfBounds(text: string): Fault | null {
  const parser = new Parser();
  let parts = 0;
  for (const part of new Lexer().lex(text)) {
    const { offset } = parser;
    if (++parts > MOST_PARTS) {
      return {
        offset,
        found: `more than ${MOST_PARTS} words and marks`,
        wanted: "a claim, which is a page of text",
      };
    }
    for (const token of parser.next(part)) {
      if (token.type === "directive") {
        return { offset: token.offset, found: "a directive", wanted: "plain YAML, without lines in %" };
      }
    }
    if (parser.stack.length > DEEPEST) {
      return { offset, found: "blocks nested without end", wanted: "a claim, which nests four levels" };
    }
  }
  return null;
}
