import type { Observable } from "../kernel/observables.js";
import type { StepLoop } from "../kernel/step-loop.js";
import type { DriftPattern, LedgerEntry } from "../result/result.js";
import { aspectsOf, widestAspect } from "./aspects.js";
import { conditioningOf } from "./conditioning.js";
import { driftOf } from "./drift.js";
import { type OrbitMean, orbitMean } from "./orbit-mean.js";
import type { PreparedScenario, Run } from "./run.js";
import { ioAt, walk } from "./stepping.js";
import { ThinnedSeries } from "./thinned-series.js";

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
/** Points kept of each series for the page. */
const MOST_POINTS = 600;
/**
 * A quantity below this part of what it is made of has lost half its digits to cancellation: a change
 * relative to itself would tell of rounding.
 */
const NEAR_NOTHING = Math.sqrt(Number.EPSILON);
/**
 * What rounding may do. The roundings of n steps make a walk, which strays beyond four times its standard
 * deviation once in some 8000 walks. Rounded coefficients push one way instead: by a unit of the increment,
 * and the increments of an orbit add up to 2π times the state.
 */
const WALK = 4;
const PUSH = 2 * Math.PI;

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
  const every = Math.max(1, Math.round(scenario.period / step / SAMPLES_PER_ORBIT));
  const books = quantities.map((observable) => new Book(observable, scenario, run, step));
  const values = Float64Array.from(parameters);
  const io = ioAt(loop, scenario.state);
  const state = io.subarray(0, loop.dimension);
  const enter = (taken: number): void => {
    for (const book of books) book.enter(taken * step, state);
  };
  enter(0);
  for (let taken = 0; taken < run.steps; ) {
    const next = Math.min(every, run.steps - taken);
    if (walk(loop, io, values, step, next, (more) => enter(taken + more)) !== "done") break;
    taken += next;
    enter(taken);
  }
  return books.map((book) => book.close());
}

/** The running account of one quantity: keeps one orbit's samples at a time. */
class Book {
  readonly #observable: Observable;
  readonly #period: number;
  readonly #passages: readonly number[];
  readonly #steps: number;
  readonly #start: readonly number[];
  readonly #scale: number;
  readonly #nearNothing: boolean;
  readonly #series: ThinnedSeries;
  readonly #orbits: OrbitMean[] = [];
  /** Index of the passage that ends the orbit under way; 0 before the first passage. */
  #next = 0;
  #phases: number[] = [];
  #rows: (readonly number[])[] = [];
  #last: readonly number[] = [];
  #largest = 0;
  #noise = 0;

  constructor(observable: Observable, scenario: PreparedScenario, run: Run, step: number) {
    this.#observable = observable;
    this.#period = scenario.period;
    this.#passages = run.times;
    this.#steps = run.steps;
    const state = Float64Array.from(scenario.state);
    this.#start = observable.value(state);
    const size = Math.hypot(...this.#start);
    const { natural } = conditioningOf(observable.value, state);
    this.#nearNothing = size < NEAR_NOTHING * natural;
    // A quantity made of nothing at all changes by its own value.
    this.#scale = (this.#nearNothing ? natural : size) || 1;
    this.#series = new ThinnedSeries((run.steps * step) / scenario.period, MOST_POINTS);
  }

  enter(time: number, state: Float64Array): void {
    const row = this.#observable.value(state).map((value, j) => (value - this.#start[j]!) / this.#scale);
    const size = Math.hypot(...row);
    this.#last = row;
    this.#largest = Math.max(this.#largest, size);
    this.#series.add(time / this.#period, row.length === 1 ? row[0]! : size);
    while (this.#next < this.#passages.length && time >= this.#passages[this.#next]!) {
      this.#closeOrbit();
      this.#next++;
    }
    if (this.#next === 0 || this.#next === this.#passages.length) return;
    const [from, to] = [this.#passages[this.#next - 1]!, this.#passages[this.#next]!];
    this.#phases.push((time - from) / (to - from));
    this.#rows.push(row);
    if (this.#next === 1) {
      const { rounding } = conditioningOf(this.#observable.value, state);
      this.#noise = Math.max(this.#noise, rounding / this.#scale);
    }
  }

  #closeOrbit(): void {
    const mean = orbitMean(this.#phases, this.#rows);
    if (mean !== null) this.#orbits.push(mean);
    this.#phases = [];
    this.#rows = [];
  }

  /** Where there are no two whole orbits to compare: the start and the end of the run. */
  #ends(): OrbitMean[] {
    const rest = { early: null, late: null, swing: 0 };
    return [
      { mean: this.#last.map(() => 0), ...rest },
      { mean: this.#last, ...rest },
    ];
  }

  close(): LedgerReading {
    const { name, truncatedAt } = this.#observable;
    const start = this.#nearNothing ? null : this.#start.map((value) => value / this.#scale);
    const aspect = widestAspect(aspectsOf(this.#orbits.length > 1 ? this.#orbits : this.#ends(), start))!;
    const swing = this.#orbits.reduce((most, orbit) => Math.max(most, orbit.swing), 0);
    const largest =
      truncatedAt === null
        ? this.#largest
        : aspect.mean.reduce((most, value) => Math.max(most, Math.abs(value - aspect.mean[0]!)), 0);
    const rounding = this.#noise * (WALK * Math.sqrt(this.#steps) + PUSH * this.#orbits.length);
    const drift = driftOf(largest, aspect, truncatedAt === null ? swing : 0, rounding, this.#noise);
    const points = this.#series.points();
    return {
      quantity: name,
      largest,
      ...drift,
      relativeTo: this.#nearNothing ? "parts" : "start",
      truncatedAt,
      series: { orbits: points.map(({ x }) => x), change: points.map(({ y }) => y) },
    };
  }
}
