import type { Observable } from "../kernel/observables.js";
import type { StepLoop } from "../kernel/step-loop.js";
import type { MethodDefinition } from "../methods/definition.js";
import { aspectsOf, widestAspect } from "./aspects.js";
import { conditioningOf } from "./conditioning.js";
import { driftOf } from "./drift.js";
import type { LedgerReading } from "./ledger.js";
import { type OrbitMean, orbitMean } from "./orbit-mean.js";
import type { PreparedScenario, Run } from "./run.js";
import { ThinnedSeries } from "./thinned-series.js";

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

/** The running account of one conserved quantity: keeps one orbit's samples at a time. */
export class LedgerBook {
  readonly #observable: Observable;
  readonly #period: number;
  readonly #passages: readonly number[];
  readonly #roundings: number;
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
  #least: number[] = [];
  #most: number[] = [];

  constructor(loop: StepLoop, observable: Observable, scenario: PreparedScenario, run: Run, step: number) {
    this.#observable = observable;
    this.#roundings = run.steps * roundingsPerStep(loop.method);
    this.#period = scenario.period;
    this.#passages = run.times;
    const state = Float64Array.from(scenario.state);
    this.#start = observable.value(state);
    const size = Math.hypot(...this.#start);
    const { natural } = conditioningOf(observable.value, state);
    this.#nearNothing = size < NEAR_NOTHING * natural;
    // A quantity made of nothing at all changes by its own value.
    this.#scale = (this.#nearNothing ? natural : size) || 1;
    this.#series = new ThinnedSeries((run.steps * step) / scenario.period, MOST_POINTS);
  }

  get isTruncated(): boolean {
    return this.#observable.truncatedAt !== null;
  }

  #change(state: Float64Array): number[] {
    return this.#observable.value(state).map((value, j) => (value - this.#start[j]!) / this.#scale);
  }

  /** A sample of an orbit at a step so fine that what swings is the quantity itself. */
  enterOwnSwing(state: Float64Array): void {
    for (const [j, value] of this.#change(state).entries()) {
      this.#least[j] = Math.min(this.#least[j] ?? value, value);
      this.#most[j] = Math.max(this.#most[j] ?? value, value);
    }
  }

  /** A sample of the run. */
  enter(time: number, state: Float64Array): void {
    const row = this.#change(state);
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
    const own = this.#most.reduce((most, value, j) => Math.max(most, (value - this.#least[j]!) / 2), 0);
    const largest = !this.isTruncated
      ? this.#largest
      : aspect.mean.reduce((most, value) => Math.max(most, Math.abs(value - aspect.mean[0]!)), 0);
    const rounding = this.#noise * (WALK * Math.sqrt(this.#roundings) + PUSH * this.#orbits.length);
    const drift = driftOf(largest, aspect, Math.max(0, swing - own), rounding, this.#noise);
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

/** Times that a step rounds the state: once, or once a kick and drift. */
function roundingsPerStep(method: MethodDefinition): number {
  return method.family === "splitting" ? method.stages.length / 2 : 1;
}
