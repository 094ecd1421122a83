import type { Decimal } from "decimal.js";
import Fraction from "fraction.js";
import { Exact } from "./exact.js";
import type { Tree } from "./trees.js";

/** Numbers that order conditions can be worked out in. */
export interface Arithmetic<T> {
  readonly from: (numerator: number, denominator: number) => T;
  readonly add: (a: T, b: T) => T;
  readonly multiply: (a: T, b: T) => T;
}

export const decimals: Arithmetic<Decimal> = {
  from: (numerator, denominator) => new Exact(numerator).div(denominator),
  add: (a, b) => a.plus(b),
  multiply: (a, b) => a.times(b),
};

export const fractions: Arithmetic<Fraction> = {
  from: (numerator, denominator) => new Fraction(numerator, denominator),
  add: (a, b) => a.add(b),
  multiply: (a, b) => a.mul(b),
};

/**
 * Σ b_i Φ_i(t) - 1/γ(t) for each tree: zero where the order condition holds (E. Hairer, S. P. Nørsett and
 * G. Wanner, Solving Ordinary Differential Equations I, theorem II.2.13).
 *
 * @param a rows as long as they are; what is left out is zero
 */
export function residuals<T>(
  { from, add, multiply }: Arithmetic<T>,
  a: readonly (readonly T[])[],
  b: readonly T[],
  trees: readonly Tree[],
): T[] {
  const [zero, one] = [from(0, 1), from(1, 1)];
  const known = new Map<string, readonly T[]>();
  const weights = (of: Tree): readonly T[] => {
    let result = known.get(of.key);
    if (result === undefined) {
      const inner = of.branches.map((branch) => {
        const stages = weights(branch);
        return a.map((row) => row.reduce((sum, entry, j) => add(sum, multiply(entry, stages[j]!)), zero));
      });
      result = b.map((_, i) => inner.reduce((product, branch) => multiply(product, branch[i]!), one));
      known.set(of.key, result);
    }
    return result;
  };
  return trees.map((of) => {
    const phi = weights(of);
    const sum = b.reduce((total, weight, i) => add(total, multiply(weight, phi[i]!)), zero);
    return add(sum, from(-1, of.density));
  });
}
