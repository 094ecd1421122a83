import { clean } from "../report/text.js";
import { CallError } from "./call-error.js";

/** Whoever reads closed the pipe early, as `| head -1` does: nothing more to say there, and no failure. */
const CLOSED = new Set(["EPIPE", "ERR_STREAM_DESTROYED", "ERR_STREAM_WRITE_AFTER_END"]);

/** Without listeners a stream's error would end the process; the write that failed tells of it. */
export function tameStreams(): void {
  process.stdout.on("error", () => {});
  process.stderr.on("error", () => {});
}

/**
 * Writes a result to standard output.
 *
 * @throws CallError where it cannot take it, such as on a full disk
 */
export function writeOut(text: string): Promise<void> {
  return new Promise((resolve, reject) => {
    process.stdout.write(text, (error) => {
      const code = (error as NodeJS.ErrnoException | null | undefined)?.code;
      if (!error || (code !== undefined && CLOSED.has(code))) resolve();
      else reject(new CallError(`cannot write to standard output: ${error.message}`));
    });
  });
}

/** A message for people, on standard error; names of files in it may hold anything. */
export function say(text: string): void {
  process.stderr.write(`${text.split("\n").map(clean).join("\n")}\n`);
}

/** Whether a stream may be coloured: a terminal that has colours, and NO_COLOR not set (no-color.org). */
export function mayColour(stream: NodeJS.WriteStream): boolean {
  return stream.isTTY === true && stream.hasColors();
}
