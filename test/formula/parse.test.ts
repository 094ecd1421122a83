import fc from "fast-check";
import Fraction from "fraction.js";
import { describe, expect, it } from "vitest";
import { functionNames, Graph, type Node } from "../../src/formula/graph.js";
import { FormulaError, parseFormula } from "../../src/formula/parse.js";
import { evaluate } from "../../src/formula/walk.js";

/** The value of a text, by the names a = 2, b = 3, c = 5. */
function value(text: string): number {
  const known: Readonly<Record<string, number>> = { a: 2, b: 3, c: 5 };
  return evaluate(parseFormula(new Graph(), text), (name) => known[name] ?? Number.NaN);
}

function refusal(text: string, meaning?: (name: string) => Node | null): FormulaError {
  try {
    parseFormula(new Graph(), text, meaning);
  } catch (error) {
    if (error instanceof FormulaError) return error;
    throw error;
  }
  throw new Error(`read without complaint: ${text}`);
}

describe("precedence, as in print", () => {
  it.each([
    ["a + b * c", 17],
    ["(a + b) * c", 25],
    ["a - b - c", -6],
    ["a - (b - c)", 4],
    ["c / a / a", 1.25],
    ["c / a * a", 5],
    ["a * b^2", 18],
    ["-a^2", -4],
    ["(-a)^2", 4],
    ["a^b^2", 512],
    ["(a^b)^2", 64],
    ["a^-1", 0.5],
    ["a^-b^2", 2 ** -9],
    ["a--b", 5],
    ["a - -b", 5],
    ["- - a", 2],
    ["+a", 2],
    ["a * -b", -6],
    ["c / -a * b", -7.5],
    ["1.5e2 + .5 + 2.", 152.5],
    ["1E-2", 0.01],
    ["sqrt(a + a)^b", 8],
    ["-sqrt(a + a)^2", -4],
    ["  a\n*\tb ", 6],
  ])("%s = %d", (text, expected) => {
    expect(value(text)).toBe(expected);
  });

  // Each function's value at a point from memory of the exact ones: sin(π/6) = 1/2 and so on.
  it.each([
    ["sqrt(4)", 2],
    ["sin(0.5235987755982988)", 0.5],
    ["cos(1.0471975511965976)", 0.5],
    ["tan(0.7853981633974483)", 1],
    ["asin(0.5)", Math.PI / 6],
    ["acos(0.5)", Math.PI / 3],
    ["atan(1)", Math.PI / 4],
    ["exp(1)", Math.E],
    ["log(2.718281828459045)", 1],
    ["abs(-3)", 3],
  ])("%s = %d", (text, expected) => {
    expect(value(text)).toBeCloseTo(expected, 14);
  });
});

type Tree = bigint | readonly [operator: string, left: Tree, right: Tree];

const tree = fc.letrec<{ tree: Tree }>((tie) => ({
  tree: fc.oneof(
    { maxDepth: 4 },
    fc.bigInt({ min: 0n, max: 99n }),
    fc.tuple(fc.constantFrom("+", "-", "*", "/"), tie("tree"), tie("tree")),
    fc.tuple(fc.constant("^"), tie("tree"), fc.bigInt({ min: 0n, max: 3n }) as unknown as fc.Arbitrary<Tree>),
  ),
})).tree;

const strength = (of: Tree): number =>
  typeof of === "bigint" ? 4 : { "+": 1, "-": 1, "*": 2, "/": 2, "^": 3 }[of[0]]!;

/** With a parenthesis only where the rules of precedence ask for one. */
function sparing(of: Tree): string {
  if (typeof of === "bigint") return String(of);
  const [operator, left, right] = of;
  const rightward = operator === "^";
  const bracketed = (inner: Tree, needed: boolean): string =>
    needed ? `(${sparing(inner)})` : sparing(inner);
  const own = strength(of);
  return `${bracketed(left, strength(left) < own + (rightward ? 1 : 0))} ${operator} ${bracketed(right, strength(right) < own + (rightward ? 0 : 1))}`;
}

function exactly(of: Tree): Fraction {
  if (typeof of === "bigint") return new Fraction(of);
  const [left, right] = [exactly(of[1]), exactly(of[2])];
  switch (of[0]) {
    case "+":
      return left.add(right);
    case "-":
      return left.sub(right);
    case "*":
      return left.mul(right);
    case "/":
      return left.div(right);
    default:
      return left.pow(right)!;
  }
}

it("folds numbers exactly, whatever the nesting, as fraction.js computes them", () => {
  let read = 0;
  fc.assert(
    fc.property(tree, (of) => {
      let exact: Fraction;
      try {
        exact = exactly(of);
      } catch {
        return; // A division by zero.
      }
      if ((exact.n * exact.d).toString(2).length > 1000) return;
      const node = parseFormula(new Graph(), sparing(of));
      // Where a part of it is too long to be kept exact, the whole is not folded.
      if (node.value === null) return;
      read++;
      expect(node.value.equals(exact)).toBe(true);
    }),
    { numRuns: 2000 },
  );
  expect(read).toBeGreaterThan(1000);
});

describe("what cannot be read", () => {
  it.each([
    ["", 0, "the end"],
    ["a +", 3, "the end"],
    ["a b", 2, "'b'"],
    ["2 a", 2, "'a'"],
    ["2(a)", 1, "'('"],
    ["(a", 2, "the end"],
    ["a)", 1, "')'"],
    ["a ** b", 3, "'*'"],
    ["a % b", 2, "'%'"],
    ["a, b", 1, "','"],
    ["sin a", 4, "'a'"],
    ["sin", 3, "the end"],
    ["()", 1, "')'"],
    ["foo(a)", 0, "'foo('"],
    ["1..2", 2, "'.'"],
    ["1e", 1, "'e'"],
    [".", 0, "'.'"],
    ["0x10", 1, "'x'"],
    ["a = 1", 2, "'='"],
    ["a[0]", 1, "'['"],
    ["a.b", 1, "'.'"],
    ["'a'", 0, "'''"],
    ["a ^^ b", 3, "'^'"],
    ["µ", 0, "'µ'"],
    ["a + \u{1F600}", 4, "'\u{1F600}'"],
    ["1e400", 0, "'1e400'"],
    ["2 * 1e-400", 4, "'1e-400'"],
    ["1e999999999", 0, "'1e999999999'"],
  ])("%j is refused at offset %i, which names what stands there", (text, offset, found) => {
    const { offset: at, found: what, wanted } = refusal(text);
    expect(at).toBe(offset);
    expect(what).toBe(found);
    expect(wanted.length).toBeGreaterThan(2);
  });

  it("is a name that nobody defined, whatever a plain object would answer to it", () => {
    const only = (name: string): Node | null => (name === "x" ? new Graph().symbol("x") : null);
    for (const name of ["y", "__proto__", "constructor", "toString", "hasOwnProperty", "valueOf"]) {
      expect(refusal(`1 + ${name}`, only)).toMatchObject({ offset: 4, found: `'${name}'` });
    }
    for (const name of ["__proto__", "constructor", "eval", "Function", "require", "process"]) {
      expect(refusal(`${name}(1)`)).toMatchObject({ offset: 0, found: `'${name}('` });
    }
  });

  it("is too long, too deep, or too many", () => {
    expect(refusal("1".repeat(10_001)).wanted).toMatch(/10000/);
    expect(refusal("1".repeat(101)).wanted).toMatch(/100 characters/);
    for (const nested of ["(", "sin(", "2^", "2^(", "-("]) {
      const { wanted, offset } = refusal(nested.repeat(300));
      expect(wanted).toMatch(/200 levels/);
      expect(offset).toBeGreaterThanOrEqual(200);
    }
    const graph = new Graph();
    const fill = (): void => {
      for (let i = 0; i < 30; i++) {
        parseFormula(graph, Array.from({ length: 1000 }, (_, j) => `y${i}_${j}`).join("+"));
      }
    };
    expect(fill).toThrow(/20000 operations/);
  });

  it("echoes no more of a long word than a line holds", () => {
    expect(refusal(`1 + ${"x".repeat(5000)}`, () => null).message.length).toBeLessThan(120);
  });

  it("is always refused by name, and in no time", () => {
    const pieces = fc.constantFrom(
      ...["(", ")", "+", "-", "*", "/", "^", ",", ".", " ", "1", "0", "2.5", "1e9", "1e300", "1e-300", "x"],
      ...["__proto__", "0/0", "1/0", "0^0", "0^-1", "^32", "^0.5", "\u0000", "\ud800", "é"],
      ...functionNames.map((name) => `${name}(`),
    );
    const began = performance.now();
    fc.assert(
      fc.property(
        fc.oneof(
          fc.string({ unit: "binary" }),
          fc.array(pieces).map((of) => of.join("")),
        ),
        (text) => {
          try {
            evaluate(parseFormula(new Graph(), text), () => 1.5);
          } catch (error) {
            expect(error).toBeInstanceOf(FormulaError);
            const { offset } = error as FormulaError;
            expect(offset).toBeGreaterThanOrEqual(0);
            expect(offset).toBeLessThanOrEqual(text.length);
          }
        },
      ),
      { numRuns: 5000 },
    );
    expect(performance.now() - began).toBeLessThan(20_000);
  });
});

describe("equal expressions", () => {
  it("are one node, and zeros, ones and double signs disappear", () => {
    const graph = new Graph();
    const read = (text: string): Node => parseFormula(graph, text);
    expect(read("a*b + c")).toBe(read("(a * b) + c"));
    for (const text of ["x + 0", "0 + x", "x - 0", "1*x", "x*1", "x/1", "--x", "x^1", "x + 0*y", "x*y^0"]) {
      expect(read(text), text).toBe(read("x"));
    }
    for (const text of ["0*x", "x*0", "x - x", "0/x", "0.0", "0e5", "1/3 - 2/6"]) {
      expect(read(text), text).toBe(graph.zero);
    }
    expect(read("0.1 + 0.2")).toBe(read("3/10"));
    expect(read("x^-2")).toBe(read("1/(x*x)"));
    expect(read("x^1.5")).toBe(read("x*sqrt(x)"));
  });

  it("leave a division by zero to the arithmetic of doubles", () => {
    expect(value("1/0")).toBe(Number.POSITIVE_INFINITY);
    expect(value("0^-1")).toBe(Number.POSITIVE_INFINITY);
    expect(value("0/0")).toBeNaN();
  });
});
