import type { Coefficient, ExplicitRungeKutta } from "../methods/definition.js";
import type { Random } from "./random.js";

/** A slip that shows: a hundredth of the step in one stage, or more. */
const SMALLEST = 0.01;
const LARGEST = 0.2;

/** The method with one coefficient written down wrong. */
export function mistyped(method: ExplicitRungeKutta, random: Random): ExplicitRungeKutta {
  const slip = (random.chance(0.5) ? 1 : -1) * random.between(SMALLEST, LARGEST);
  const wrong = (coefficient: Coefficient): Coefficient => `(${coefficient}) + (${slip.toFixed(4)})`;
  const inWeights = method.b.length === 1 || random.chance(0.5);
  const row = inWeights ? 0 : 1 + Math.floor(random.uniform() * (method.b.length - 1));
  const length = inWeights ? method.b.length : method.a[row]!.length;
  const place = Math.floor(random.uniform() * length);
  const change = (entries: readonly Coefficient[]): Coefficient[] =>
    entries.map((entry, i) => (i === place ? wrong(entry) : entry));
  return inWeights
    ? { ...method, b: change(method.b) }
    : { ...method, a: method.a.map((entries, i) => (i === row ? change(entries) : entries)) };
}
