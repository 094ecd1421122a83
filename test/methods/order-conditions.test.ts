import type { Decimal } from "decimal.js";
import type Fraction from "fraction.js";
import { describe, expect, it } from "vitest";
import { Graph } from "../../src/formula/graph.js";
import { parseFormula } from "../../src/formula/parse.js";
import { methodsCatalog } from "../../src/methods/catalog/index.js";
import type { MethodDefinition, Splitting } from "../../src/methods/definition.js";
import { Exact, exact } from "./exact.js";
import { decimals, fractions, residuals } from "./residuals.js";
import { treesUpTo } from "./trees.js";

const trees = treesUpTo(9);
type Tableau = Exclude<MethodDefinition, Splitting>;
const tableaus = methodsCatalog.filter((method): method is Tableau => method.family !== "splitting");
const splittings = methodsCatalog.filter((method): method is Splitting => method.family === "splitting");

it("counts the rooted trees: 1, 1, 2, 4, 9, 20, 48, 115 of orders 1 to 8, 200 in all", () => {
  // E. Hairer, S. P. Nørsett and G. Wanner, Solving Ordinary Differential Equations I, II.2, table 2.2.
  const counts = trees.slice(1, 9).map((of) => of.length);
  expect(counts).toEqual([1, 1, 2, 4, 9, 20, 48, 115]);
  expect(counts.reduce((sum, count) => sum + count)).toBe(200);
});

/** Largest residual over the trees of one order. */
const defect = (a: readonly (readonly Decimal[])[], b: readonly Decimal[], order: number): number =>
  Math.max(...residuals(decimals, a, b, trees[order]!).map((of) => of.abs().toNumber()));

/** Coefficients of dormand-prince-8 are published to 30 digits; the others are exact. */
const CLOSE = (method: MethodDefinition): number => (method.name === "dormand-prince-8" ? 1e-26 : 1e-50);

describe.each(tableaus.map((method) => [method.name, method] as const))("%s", (_, method) => {
  const a = method.a.map((row) => row.map(exact));
  const b = method.b.map(exact);

  it("satisfies the order conditions up to its order", () => {
    for (let order = 1; order <= method.order; order++) {
      expect(defect(a, b, order), `order ${order}`).toBeLessThan(CLOSE(method));
    }
  });

  it("does not satisfy those of the next order", () => {
    expect(defect(a, b, method.order + 1)).toBeGreaterThan(1e-8);
  });

  it("satisfies them in exact fractions where it has no root and no rounded decimal", () => {
    const fraction = (text: string): Fraction | null => parseFormula(new Graph(), text).value;
    const [rows, weights] = [method.a.map((row) => row.map(fraction)), method.b.map(fraction)];
    const texts = [...method.a.flat(), ...method.b].join();
    const isRational = !/sqrt|\d\.\d{20}/.test(texts);
    if (!isRational) return expect(["gauss-legendre-6", "dormand-prince-8"]).toContain(method.name);
    for (let order = 1; order <= method.order; order++) {
      const off = residuals(fractions, rows as Fraction[][], weights as Fraction[], trees[order]!);
      expect(off.map((of) => of.toFraction())).toEqual(off.map(() => "0"));
    }
  });

  it("fails where any one coefficient is off in its twentieth digit", () => {
    const slip = new Exact("1e-20");
    const found = (rows: readonly (readonly Decimal[])[], weights: readonly Decimal[]): boolean =>
      Array.from({ length: method.order }, (_, i) => i + 1).some(
        (order) => defect(rows, weights, order) > CLOSE(method),
      );
    expect(found(a, b)).toBe(false);
    b.forEach((_, i) => {
      expect(found(a, b.with(i, b[i]!.plus(slip))), `b ${i}`).toBe(true);
    });
    a.forEach((row, i) => {
      row.forEach((entry, j) => {
        expect(found(a.with(i, row.with(j, entry.plus(slip))), b), `a ${i} ${j}`).toBe(true);
      });
    });
  });

  it("is symplectic and symmetric where it says so, and only there", () => {
    const square = a.map((row) => b.map((_, j) => row[j] ?? new Exact(0)));
    // E. Hairer, C. Lubich and G. Wanner, Geometric Numerical Integration: VI.4, theorem 4.3; V.2, theorem 2.3.
    const symplectic = Math.max(
      ...b.flatMap((bi, i) =>
        b.map((bj, j) =>
          bi.times(square[i]![j]!).plus(bj.times(square[j]![i]!)).minus(bi.times(bj)).abs().toNumber(),
        ),
      ),
    );
    const s = b.length;
    const symmetric = Math.max(
      ...b.flatMap((_, i) =>
        b.map((bj, j) => square[s - 1 - i]![s - 1 - j]!.plus(square[i]![j]!).minus(bj).abs().toNumber()),
      ),
    );
    expect(symplectic < 1e-50).toBe(method.symplectic);
    expect(symmetric < 1e-50).toBe(method.symmetric);
  });
});

/** An element of the free associative algebra on D and K, cut off at a length: word to coefficient. */
type Words = ReadonlyMap<string, Decimal>;

function times(one: Words, other: Words, longest: number): Words {
  const result = new Map<string, Decimal>();
  for (const [left, p] of one) {
    for (const [right, q] of other) {
      if (left.length + right.length > longest) continue;
      const word = left + right;
      result.set(word, (result.get(word) ?? new Exact(0)).plus(p.times(q)));
    }
  }
  return result;
}

function exponential(letter: "D" | "K", by: Decimal, longest: number): Words {
  const result = new Map<string, Decimal>();
  let term = new Exact(1);
  for (let n = 0; n <= longest; n++) {
    result.set(letter.repeat(n), term);
    term = term.times(by).div(n + 1);
  }
  return result;
}

/**
 * Largest distance of the product of a splitting's exponentials from exp(D + K), over the words of each
 * length: the order conditions of a composition (Geometric Numerical Integration, III.5).
 */
function defects(method: Splitting, longest: number): number[] {
  const whole = method.stages.reduce<Words>(
    (product, stage) =>
      times(
        product,
        "kick" in stage
          ? exponential("K", exact(stage.kick), longest)
          : exponential("D", exact(stage.drift), longest),
        longest,
      ),
    new Map([["", new Exact(1)]]),
  );
  const worst = new Array<number>(longest + 1).fill(0);
  for (let length = 0, factorial = 1; length <= longest; length++, factorial *= length) {
    for (let index = 0; index < 2 ** length; index++) {
      const word = index
        .toString(2)
        .padStart(length, "0")
        .slice(0, length)
        .replaceAll("0", "D")
        .replaceAll("1", "K");
      const off = (whole.get(length === 0 ? "" : word) ?? new Exact(0))
        .minus(new Exact(1).div(factorial))
        .abs()
        .toNumber();
      worst[length] = Math.max(worst[length]!, off);
    }
  }
  return worst;
}

describe.each(splittings.map((method) => [method.name, method] as const))("%s", (_, method) => {
  it("satisfies the order conditions up to its order, and not those of the next", () => {
    const worst = defects(method, method.order + 1);
    // yoshida-8 is refined to 32 digits; the others are exact.
    expect(Math.max(...worst.slice(0, -1))).toBeLessThan(method.name === "yoshida-8" ? 1e-25 : 1e-50);
    expect(worst.at(-1)!).toBeGreaterThan(1e-6);
  });

  it("is symplectic: each kick and each drift is", () => {
    expect(method.symplectic).toBe(true);
  });

  it("is symmetric where it says so, and only there", () => {
    const texts = method.stages.map((stage) =>
      "kick" in stage ? `K${exact(stage.kick)}` : `D${exact(stage.drift)}`,
    );
    const mirrored = texts.every((text, i) => {
      const other = texts[texts.length - 1 - i]!;
      return text[0] === other[0] && Math.abs(Number(text.slice(1)) - Number(other.slice(1))) < 1e-30;
    });
    expect(mirrored).toBe(method.symmetric);
  });
});

it("gives every method a source with a year", () => {
  for (const { name, source } of methodsCatalog) expect(source, name).toMatch(/\b1[789]\d\d|20\d\d/);
});
