import { findMethod } from "../methods/catalog/index.js";
import type { MethodDefinition } from "../methods/definition.js";

/**
 * Witnesses when the claim names none, best first: the two high-order ones of different families carry the
 * value, the rest show that every road leads there.
 */
const PREFERRED = [
  "dormand-prince-8",
  "gauss-legendre-6",
  "yoshida-8",
  "dormand-prince-5",
  "rk4",
  "forest-ruth-4",
  "implicit-midpoint",
  "leapfrog",
  "heun",
  "midpoint",
];
/** With the author's own that makes eight methods. */
const WITNESSES = 7;

/** @param applies whether a method can step these equations */
export function defaultWitnesses(
  authors: MethodDefinition | null,
  applies: (method: MethodDefinition) => boolean,
): MethodDefinition[] {
  return PREFERRED.filter((name) => name !== authors?.name)
    .map((name) => findMethod(name))
    .filter((method) => method !== undefined)
    .filter(applies)
    .slice(0, WITNESSES);
}
