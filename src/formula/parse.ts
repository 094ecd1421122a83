import { type FunctionName, functionNames, type Graph, type Node } from "./graph.js";

/** A formula that cannot be read: where, what was found, what would be right. */
export class FormulaError extends Error {
  override readonly name = "FormulaError";
  /** Offset into the text. */
  readonly offset: number;
  readonly found: string;
  readonly wanted: string;

  constructor(offset: number, found: string, wanted: string) {
    super(`found ${found}, wanted ${wanted}`);
    this.offset = offset;
    this.found = found;
    this.wanted = wanted;
  }
}

const LONGEST = 10_000;
const DEEPEST = 200;
const MOST_NODES = 20_000;
const LONGEST_NUMBER = 100;
const LONGEST_ECHO = 40;
const NUMBER = /(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?/y;
const NAME = /[A-Za-z_][A-Za-z0-9_]*/y;
const SPACE = /\s*/y;

/**
 * Reads a formula: numbers, names, + - * / ^, parentheses and the functions of `functionNames`. The power
 * binds tighter than a sign and to the right: -2^2 is -4 and 2^3^2 is 2^9. Nothing is multiplied by
 * standing side by side. The text is never evaluated.
 *
 * @param meaning what a name stands for; null for one that is not known
 * @throws FormulaError
 *
 * @example parseFormula(graph, "-GM / sqrt(x^2 + y^2)")
 */
export function parseFormula(
  graph: Graph,
  text: string,
  meaning: (name: string) => Node | null = (name) => graph.symbol(name),
): Node {
  if (text.length > LONGEST)
    throw new FormulaError(LONGEST, `${text.length} characters`, `at most ${LONGEST}`);
  return new Parser(graph, text, meaning).whole();
}

class Parser {
  readonly #graph: Graph;
  readonly #text: string;
  readonly #meaning: (name: string) => Node | null;
  #at = 0;
  #depth = 0;

  constructor(graph: Graph, text: string, meaning: (name: string) => Node | null) {
    this.#graph = graph;
    this.#text = text;
    this.#meaning = meaning;
  }

  whole(): Node {
    const node = this.#sum();
    if (this.#at < this.#text.length) this.#fail("an operator or the end");
    return node;
  }

  #fail(wanted: string, at = this.#at, found?: string): never {
    const character = this.#text.codePointAt(at);
    const here = character === undefined ? "the end" : quoted(String.fromCodePoint(character));
    throw new FormulaError(at, found ?? here, wanted);
  }

  #match(pattern: RegExp): string | null {
    pattern.lastIndex = this.#at;
    const found = pattern.exec(this.#text)?.[0] ?? null;
    if (found !== null) this.#at += found.length;
    return found;
  }

  #take(character: string): boolean {
    this.#match(SPACE);
    if (this.#text[this.#at] !== character) return false;
    this.#at++;
    return true;
  }

  #deeper<T>(inner: () => T): T {
    if (++this.#depth > DEEPEST) this.#fail(`at most ${DEEPEST} levels of nesting`);
    const result = inner();
    this.#depth--;
    return result;
  }

  #sum(): Node {
    let left = this.#product();
    for (;;) {
      if (this.#take("+")) left = this.#graph.add(left, this.#product());
      else if (this.#take("-")) left = this.#graph.subtract(left, this.#product());
      else return left;
    }
  }

  #product(): Node {
    let left = this.#signed();
    for (;;) {
      if (this.#take("*")) left = this.#graph.multiply(left, this.#signed());
      else if (this.#take("/")) left = this.#graph.divide(left, this.#signed());
      else return left;
    }
  }

  #signed(): Node {
    let negative = false;
    for (;;) {
      if (this.#take("-")) negative = !negative;
      else if (!this.#take("+")) break;
    }
    const power = this.#power();
    return negative ? this.#graph.negate(power) : power;
  }

  #power(): Node {
    const base = this.#atom();
    if (!this.#take("^")) return base;
    return this.#graph.power(
      base,
      this.#deeper(() => this.#signed()),
    );
  }

  #atom(): Node {
    if (this.#graph.size > MOST_NODES) this.#fail(`at most ${MOST_NODES} operations in all`);
    if (this.#take("(")) return this.#closing();
    const start = this.#at;
    const number = this.#match(NUMBER);
    if (number !== null) return this.#number(number, start);
    const name = this.#match(NAME);
    if (name === null) return this.#fail("a number, a name or '('");
    const isFunction = (functionNames as readonly string[]).includes(name);
    if (this.#take("(")) {
      if (!isFunction) this.#fail(`a function: ${functionNames.join(", ")}`, start, quoted(`${name}(`));
      return this.#graph.call(name as FunctionName, this.#closing());
    }
    if (isFunction) this.#fail(`'(' after ${name}`);
    return this.#meaning(name) ?? this.#fail("a name that is defined", start, quoted(name));
  }

  #number(text: string, start: number): Node {
    if (!/[1-9]/.test(text.split(/e/i)[0]!)) return this.#graph.zero;
    const size = Number(text);
    if (text.length > LONGEST_NUMBER || size === 0 || size === Number.POSITIVE_INFINITY) {
      this.#fail(
        `at most ${LONGEST_NUMBER} characters and a size from 5e-324 to 1.7e308`,
        start,
        quoted(text),
      );
    }
    return this.#graph.number(text);
  }

  #closing(): Node {
    const inner = this.#deeper(() => this.#sum());
    if (!this.#take(")")) this.#fail("')'");
    return inner;
  }
}

function quoted(text: string): string {
  return text.length > LONGEST_ECHO ? `'${text.slice(0, LONGEST_ECHO)}…'` : `'${text}'`;
}
