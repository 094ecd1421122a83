import type { Observable } from "../kernel/observables.js";
import type { StepLoop } from "../kernel/step-loop.js";
import type { DriftPattern, LedgerEntry } from "../result/result.js";
import { LedgerBook } from "./ledger-book.js";
import type { PreparedScenario, Run } from "./run.js";
import { ioAt, walk } from "./stepping.js";

/** What one run does to one conserved quantity. All changes are relative. */
export interface LedgerReading {
  readonly quantity: string;
  /** Largest change over the span; of a truncated quantity, of its orbit means. */
  readonly largest: number;
  readonly perOrbit: number;
  readonly pattern: DriftPattern;
  readonly exponent: number | null;
  /** What changes are relative to: the starting value, or what it is made of where it starts near nothing. */
  readonly relativeTo: "start" | "parts";
  readonly truncatedAt: string | null;
  readonly series: LedgerEntry["series"];
}

/** Samples an orbit, evenly, besides one at each passage, where what swings within an orbit peaks. */
const SAMPLES_PER_ORBIT = 48;
/**
 * A truncated quantity swings within an orbit by itself. How much is seen at a step so many times finer,
 * where the swing that a method of the second order adds is down by 256.
 */
const FINER = 16;

/**
 * Runs a scenario once more, samples what it conserves by whole steps, and says what became of it.
 *
 * @param run the passages of the same loop, scenario, parameters and step
 */
export function runLedger(
  loop: StepLoop,
  scenario: PreparedScenario,
  parameters: readonly number[],
  step: number,
  run: Run,
  quantities: readonly Observable[],
): LedgerReading[] {
  const values = Float64Array.from(parameters);
  const books = quantities.map((quantity) => new LedgerBook(loop, quantity, scenario, run, step));
  const sample = (
    length: number,
    steps: number,
    enter: (taken: number, state: Float64Array) => void,
  ): void => {
    const every = Math.max(1, Math.round(scenario.period / length / SAMPLES_PER_ORBIT));
    const io = ioAt(loop, scenario.state);
    const state = io.subarray(0, loop.dimension);
    enter(0, state);
    for (let taken = 0; taken < steps; ) {
      const next = Math.min(every, steps - taken);
      const end = walk(loop, io, values, length, next, (more) => enter(taken + more, state));
      if (end !== "done") return;
      taken += next;
      enter(taken, state);
    }
  };
  sample(step, run.steps, (taken, state) => {
    for (const book of books) book.enter(taken * step, state);
  });
  const truncated = books.filter((book) => book.isTruncated);
  if (truncated.length > 0) {
    const fine = step / FINER;
    sample(fine, Math.round(scenario.period / fine), (_, state) => {
      for (const book of truncated) book.enterOwnSwing(state);
    });
  }
  return books.map((book) => book.close());
}
