import type { LadderPoint } from "../../../src/convergence/differences.js";
import { ENSEMBLE_SIZE, roundingHalfWidth } from "../../../src/convergence/rounding.js";
import { type Case, cutShort } from "./case.js";

/** A linear congruential generator (W. H. Press et al., Numerical Recipes (1992), §7.1, ranqd1): uniform in [0, 1). */
function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(1664525, state) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** A power series in the step, h = 2^-k: [exponent, coefficient]. */
type Terms = readonly (readonly [number, number])[];
const errorAt = (terms: Terms, k: number): number =>
  terms.reduce((sum, [power, factor]) => sum + factor * 2 ** (-power * k), 0);

type Random = () => number;
const between = (random: Random, low: number, high: number): number => low + (high - low) * random();
const whole = (random: Random, low: number, high: number): number =>
  Math.floor(between(random, low, high + 1));
/** Of either sign, over three decades. */
const coefficient = (random: Random): number => (random() < 0.5 ? -1 : 1) * 10 ** between(random, -3, 0);
/** From a well-behaved expansion in h: the later terms shrink or grow with the size of the coarsest step. */
const series = (random: Random, first: number, gap: number, scale: number): Terms =>
  Array.from({ length: 5 }, (_, i) => [first + i * gap, coefficient(random) * scale ** i] as const);

interface Shape {
  readonly kind: string;
  make(random: Random): { readonly terms: Terms; readonly order: number; readonly symmetric: boolean };
}

/** Two terms of which the lower order takes over somewhere on the ladder; of opposite signs, through nought. */
function crossing(random: Random, sign: 1 | -1) {
  const order = whole(random, 1, 6);
  const gap = whole(random, 1, 4);
  const high = coefficient(random);
  const low = sign * high * 2 ** (-gap * between(random, 2, 7));
  const terms: Terms = [
    [order, low],
    [order + gap, high],
  ];
  return { order, symmetric: false, terms };
}

const shapes: readonly Shape[] = [
  {
    kind: "all powers",
    make: (random) => {
      const order = whole(random, 1, 8);
      return { order, symmetric: false, terms: series(random, order, 1, 10 ** between(random, -1, 1)) };
    },
  },
  {
    kind: "even powers",
    make: (random) => {
      const order = 2 * whole(random, 1, 4);
      return { order, symmetric: true, terms: series(random, order, 2, 10 ** between(random, -1, 1)) };
    },
  },
  {
    kind: "superconvergent",
    make: (random) => {
      const order = whole(random, 1, 7);
      return { order, symmetric: false, terms: series(random, order + 1, 1, 10 ** between(random, -1, 1)) };
    },
  },
  { kind: "change of order", make: (random) => crossing(random, 1) },
  { kind: "change of sign", make: (random) => crossing(random, -1) },
];

/** Standard normal (G. E. P. Box and M. E. Muller, Ann. Math. Stat. 29, 610 (1958)). */
const normal = (random: Random): number =>
  Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());

/** Rung of the ensemble that the floor is measured on. */
const ENSEMBLE_RUNG = 4;

/** Rounding that walks at random as the steps get finer, and its floor as an ensemble would measure it. */
function withRounding(random: Random, count: number, figure: (k: number) => number): LadderPoint[] {
  const sigma = 10 ** between(random, -15, -8);
  const ensemble = Array.from({ length: ENSEMBLE_SIZE }, () => sigma * normal(random));
  const floor = roundingHalfWidth(ensemble)!;
  const growth = (k: number): number => Math.max(1, 2 ** ((k - ENSEMBLE_RUNG) / 2));
  return Array.from({ length: count }, (_, k) => ({
    value: figure(k) + sigma * growth(k) * normal(random),
    floor: floor * growth(k),
  }));
}

/** Made-up ladders with rounding noise, as many of each shape as asked for. */
export function madeUpLadders(seed: number, each: number): Case[] {
  const random = seeded(seed);
  const cases: Case[] = [];
  for (const { kind, make } of shapes) {
    for (let i = 0; i < each; i++) {
      const { terms, order, symmetric } = make(random);
      const truth = between(random, -1, 1);
      const points = withRounding(random, 9, (k) => truth + errorAt(terms, k));
      cases.push(pick(random, { label: `${kind} ${i}`, kind, points, truth, traits: { order, symmetric } }));
    }
  }
  for (let i = 0; i < each; i++) cases.push(pick(random, scattered(random, i)));
  return cases;
}

/** One of the lengths at which the ladder might have ended. */
function pick(random: Random, whole: Case): Case {
  const lengths = cutShort(whole, 5);
  return lengths[Math.floor(random() * lengths.length)]!;
}

/**
 * The difference of two runs whose errors of order p all but cancel. The phase of the partial step at a
 * passage is another one on every rung and in either run, so that what is left is scattered.
 */
function scattered(random: Random, i: number): Case {
  const order = whole(random, 1, 6);
  const truth = between(random, -1, 1);
  const [left, scatter] = [coefficient(random), coefficient(random)];
  const points = withRounding(random, 9, (k) => {
    const phases = random() - random();
    return truth + 2 ** (-order * k) * (left + scatter * phases);
  });
  return {
    label: `phase scatter ${i}`,
    kind: "phase scatter",
    points,
    truth,
    traits: { order, symmetric: false },
  };
}
