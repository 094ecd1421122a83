import type { ParsedDocument, Path } from "./document.js";
import { oneOf } from "./nearest.js";
import { echo, type Problem } from "./problem.js";
import { type Misreading, parseQuantity, type Quantity } from "./quantity.js";

/** Collects the problems of one claim, each at its place. */
export class Reporter {
  readonly problems: Problem[] = [];
  readonly #document: ParsedDocument;
  readonly #file: string;

  constructor(document: ParsedDocument, file: string) {
    this.#document = document;
    this.#file = file;
  }

  /** At a value. */
  at(path: Path, { found, wanted }: Misreading): void {
    this.#add(path, this.#document.place(path), found, wanted);
  }

  /** At a key. */
  atKey(path: Path, { found, wanted }: Misreading): void {
    this.#add(path, this.#document.placeOfKey(path), found, wanted);
  }

  /** A key that must be there; told at the block that it is missing from. */
  missing(path: Path, wanted: string): void {
    this.#add(path, this.#document.place(path), "nothing", wanted);
  }

  /** Whether a problem has been told of this very part. */
  isTold(path: Path): boolean {
    return this.problems.some((problem) => problem.path === path.join("."));
  }

  /** The same of this part or anything in it. */
  isToldWithin(path: Path): boolean {
    return (
      this.isTold(path) || this.problems.some((problem) => problem.path.startsWith(`${path.join(".")}.`))
    );
  }

  unknownKey(path: Path, known: readonly string[]): void {
    const key = String(path.at(-1));
    const place = this.#document.placeOfKey(path);
    this.#add(path.slice(0, -1), place, `the unknown key ${echo(key)}`, oneOf(key, known));
  }

  /** Reads a quantity; null, with a problem noted, when it cannot be read or is not as it must be. */
  quantity(path: Path, input: string | number, unit: string, range: Range = ANY): Quantity | null {
    const read = parseQuantity(input, unit);
    if ("found" in read) {
      this.at(path, read);
      return null;
    }
    if (!Number.isFinite(read.value) || !range.accepts(read.value)) {
      this.at(path, { found: echo(input), wanted: range.wanted });
      return null;
    }
    return read;
  }

  #add(
    path: Path,
    place: { readonly line: number; readonly column: number },
    found: string,
    wanted: string,
  ): void {
    this.problems.push({ file: this.#file, ...place, path: path.join("."), found, wanted });
  }
}

/** What a value may be, and how to say so. */
export interface Range {
  readonly accepts: (value: number) => boolean;
  readonly wanted: string;
}

const ANY: Range = { accepts: () => true, wanted: "a number" };
export const POSITIVE: Range = { accepts: (value) => value > 0, wanted: "more than zero" };
