import { describe, expect, it } from "vitest";
import { differentiate } from "../../src/formula/differentiate.js";
import { functionNames, Graph } from "../../src/formula/graph.js";
import { parseFormula } from "../../src/formula/parse.js";
import { evaluate, inOrder } from "../../src/formula/walk.js";
import { decimalValue, Exact } from "./in-decimal.js";

const at: Readonly<Record<string, string>> = { x: "0.37", y: "-1.45", z: "0.81", GM: "2.5" };
const step = new Exact("1e-20");

/** Central difference in arithmetic of 60 digits: its own error is of order 1e-40. */
function centralDifference(text: string, symbol: string): number {
  const node = parseFormula(new Graph(), text);
  const shifted = (by: InstanceType<typeof Exact>) =>
    decimalValue(node, (name) => new Exact(at[name]!).plus(name === symbol ? by : 0));
  return shifted(step).minus(shifted(step.neg())).div(step.times(2)).toNumber();
}

const formulas = [
  "x + y - 3*x*y",
  "x / y",
  "(x^2 + 1) / (y - x)",
  "-x^3",
  "x^-2",
  "(x + z)^(3/2)",
  "x^(-1/2)",
  "(x + 2)^1.7",
  "(x + 2)^z",
  "2^x",
  "x^40",
  "-GM / sqrt(x^2 + y^2 + z^2)",
  "exp(-x^2 * sin(y)) / (1 + z)",
  "atan(y / x)",
  "1 - 2*(1 - 3*(z / sqrt(x^2 + y^2 + z^2))^2) / 7",
  ...functionNames.map((name) => `y * ${name}(x * z) + x`),
];

describe("derivatives", () => {
  it.each(formulas)("of %s agree with central differences by decimal.js", (text) => {
    const graph = new Graph();
    const node = parseFormula(graph, text);
    for (const symbol of Object.keys(at)) {
      const derivative = evaluate(differentiate(graph, node, symbol), (name) => Number(at[name]));
      const difference = centralDifference(text, symbol);
      // Rounding of some tens of operations in double.
      expect(Math.abs(derivative - difference)).toBeLessThanOrEqual(
        2e-14 * Math.max(1, Math.abs(difference)),
      );
    }
  });

  it.each([
    ["x^40", "40*x^39"],
    ["sin(x)", "cos(x)"],
    ["a*x + b", "a"],
    ["exp(x)", "exp(x)"],
    ["y", "0"],
    ["x - x", "0"],
  ])("of %s is %s", (text, derivative) => {
    const graph = new Graph();
    expect(differentiate(graph, parseFormula(graph, text), "x")).toBe(parseFormula(graph, derivative));
  });

  it("of Newton's potential is -GM x / r^3", () => {
    const graph = new Graph();
    const force = differentiate(graph, parseFormula(graph, "GM / sqrt(x^2 + y^2 + z^2)"), "x");
    const [x, y, z, GM] = [0.37, -1.45, 0.81, 2.5];
    const value = evaluate(force, (name) => Number(at[name]));
    expect(value).toBeCloseTo((-GM * x) / Math.hypot(x, y, z) ** 3, 14);
  });

  it("share what they have in common with the formula", () => {
    const graph = new Graph();
    const potential = parseFormula(graph, "-GM / sqrt(x^2 + y^2 + z^2)");
    const gradient = ["x", "y", "z"].map((name) => differentiate(graph, potential, name));
    const nodes = new Set([potential, ...gradient].flatMap((node) => inOrder(node)));
    expect([...nodes].filter(({ op }) => op === "sqrt")).toHaveLength(1);
    expect([...nodes].filter(({ op }) => op === "divide").length).toBeLessThanOrEqual(2);
  });

  it("are had of sums of thousands of terms", () => {
    const graph = new Graph();
    const sum = parseFormula(graph, `x${"*x".repeat(4_000)}`);
    expect(evaluate(differentiate(graph, sum, "x"), () => 1)).toBe(4_001);
  });
});
