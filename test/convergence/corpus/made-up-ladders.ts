import type { LadderPoint } from "../../../src/convergence/differences.js";
import { type Case, cutShort } from "./case.js";

/** A linear congruential generator (W. H. Press et al., Numerical Recipes (1992), §7.1, ranqd1): uniform in [0, 1). */
export function seeded(seed: number): () => number {
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
  {
    // The lower order takes over somewhere on the ladder.
    kind: "change of order",
    make: (random) => {
      const order = whole(random, 1, 6);
      const higher = order + whole(random, 1, 4);
      const crossing = between(random, 2, 7);
      const high = coefficient(random);
      const low = Math.sign(coefficient(random)) * Math.abs(high) * 2 ** (-(higher - order) * crossing);
      return {
        order,
        symmetric: false,
        terms: [
          [order, low],
          [higher, high],
        ],
      };
    },
  },
];

/** A floor that is what a small ensemble would have measured: right within a factor of about two. */
function withRounding(random: Random, count: number, figure: (k: number) => number): LadderPoint[] {
  const sigma = 10 ** between(random, -15, -8);
  const measured = 1.96 * sigma * 2 ** between(random, -0.5, 1);
  const gauss = (): number => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
  return Array.from({ length: count }, (_, k) => ({ value: figure(k) + sigma * gauss(), floor: measured }));
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
 * The difference of two runs whose common error all but cancels: what is left is scattered, since the phase
 * of the partial step at a passage is another one on every rung.
 */
function scattered(random: Random, i: number): Case {
  const order = whole(random, 1, 6);
  const truth = between(random, -1, 1);
  const [size, share] = [coefficient(random), 10 ** between(random, -3, -0.3)];
  const points = withRounding(
    random,
    9,
    (k) =>
      truth + size * 2 ** (-order * k) * (1 + share * (2 * random() - 1)) - share * size * 2 ** (-order * k),
  );
  const traits = { order, symmetric: false };
  return { label: `phase scatter ${i}`, kind: "phase scatter", points, truth, traits };
}
