import { cut } from "../report/text.js";

/** A line on a terminal that says how far the work is; nothing anywhere else. */
export class Progress {
  readonly #stream: NodeJS.WriteStream;
  readonly #shown: boolean;
  #last = "";

  constructor(stream: NodeJS.WriteStream, wanted: boolean) {
    this.#stream = stream;
    this.#shown = wanted && stream.isTTY === true;
  }

  /**
   * @param part of the work behind, 0 to 1
   * @param what is being done
   */
  show(part: number, what: string): void {
    if (!this.#shown) return;
    const line = cut(
      `${String(Math.floor(100 * part)).padStart(3)} %  ${what}`,
      (this.#stream.columns || 80) - 1,
    );
    if (line === this.#last) return;
    this.#last = line;
    this.#stream.write(`\r\u001b[K${line}`);
  }

  clear(): void {
    if (this.#last !== "") this.#stream.write("\r\u001b[K");
    this.#last = "";
  }
}
