import { describe, expect, it } from "vitest";
import { type DoubleDouble, fromDouble, subtract, toDouble } from "../../src/arithmetic/double-double.js";
import { equationsCatalog, findEquations } from "../../src/equations/catalog/index.js";
import type { EquationsDefinition } from "../../src/equations/definition.js";
import { appliesTo } from "../../src/kernel/applies-to.js";
import { compileStepLoop, stepLoopInC } from "../../src/kernel/compile.js";
import { compilePreciseLoop, type PreciseFunction } from "../../src/kernel/precise-loop.js";
import { roundToSingle } from "../../src/kernel/single.js";
import { compileSystem } from "../../src/kernel/system.js";
import { findMethod, methodsCatalog } from "../../src/methods/catalog/index.js";
import { Decimal, type Exact, errorInU2, ofDouble } from "../arithmetic/exact.js";
import { generator } from "../arithmetic/numbers.js";
import { hasGcc, runC } from "./gcc.js";
import { startOf } from "./starts.js";

/** Newton's attraction in units of order one, from periapsis at e = 0.3. */
const unit = compileSystem(findEquations("newtonian")!, { parameters: ["GM"], planar: true });
const START = [0.7, 0, 0, 1.3627702877384937];

/** The state after whole steps in double-double, passages or not. */
function precisely(
  loop: PreciseFunction,
  state: readonly number[],
  parameters: readonly number[],
  step: number,
  steps: number,
): DoubleDouble[] {
  const io = new Float64Array(2 * loop.ioLength);
  io.set(state);
  for (let left = steps; left > 0; ) {
    left -= loop.run(io, parameters.map(fromDouble), fromDouble(step), left);
  }
  return state.map((_, i) => ({ high: io[i]!, low: io[loop.ioLength + i]! }));
}

describe("a step in double-double is that of decimal.js", () => {
  const pull = ([x, y]: readonly Exact[]): Exact[] => {
    const r = x!.pow(2).plus(y!.pow(2)).sqrt();
    return [x!, y!].map((q) => q.div(r.pow(3)).neg());
  };
  const along = (s: readonly Exact[], k: readonly Exact[], h: Exact): Exact[] =>
    s.map((value, i) => value.plus(k[i]!.times(h)));
  const slope = (s: readonly Exact[]): Exact[] => [s[2]!, s[3]!, ...pull(s)];
  const h = ofDouble(0.01);
  const half = h.div(2);
  // W. Kutta (1901); C. Störmer's and L. Verlet's kick, drift, kick; the implicit midpoint rule by iteration.
  const steps: Readonly<Record<string, (s: Exact[]) => Exact[]>> = {
    rk4(s) {
      const a = slope(s);
      const b = slope(along(s, a, half));
      const c = slope(along(s, b, half));
      const d = slope(along(s, c, h));
      return s.map((value, i) =>
        value.plus(h.div(6).times(a[i]!.plus(b[i]!.times(2)).plus(c[i]!.times(2)).plus(d[i]!))),
      );
    },
    leapfrog([x, y, u, v]) {
      const [a, b] = pull([x!, y!]);
      const [p, q] = [u!.plus(a!.times(half)), v!.plus(b!.times(half))];
      const [X, Y] = [x!.plus(p.times(h)), y!.plus(q.times(h))];
      const [c, d] = pull([X, Y]);
      return [X, Y, p.plus(c!.times(half)), q.plus(d!.times(half))];
    },
    "implicit-midpoint"(s) {
      let to = s;
      for (let k = 0; k < 60; k++) {
        to = along(s, slope(s.map((value, i) => value.plus(to[i]!).div(2))), h);
      }
      return to;
    },
  };
  it.each(Object.entries(steps))("%s", (name, step) => {
    let truth = START.map(ofDouble);
    for (let k = 0; k < 8; k++) truth = step(truth);
    const found = precisely(compilePreciseLoop(unit, findMethod(name)!), START, [1], 0.01, 8);
    // Some hundred operations, each of a few u².
    found.forEach((value, i) => {
      expect(errorInU2(value, truth[i]!)).toBeLessThan(1000);
    });
  });
});

// E. Hairer, S. P. Nørsett and G. Wanner, Solving Ordinary Differential Equations I, II.3: the error at a fixed time
// goes as the order of the method, below the last bit of a double as above it.
describe("the order of a method in double-double", () => {
  const pairs = methodsCatalog.flatMap((method) =>
    equationsCatalog.flatMap((equations) => {
      const start = startOf(equations, true);
      return appliesTo(method, start.system).ok
        ? [[method.name, equations.name, method, start] as const]
        : [];
    }),
  );
  it.each(pairs)("is that of %s on %s", (_, name, method, { system, state, parameters, period }) => {
    const loop = compilePreciseLoop(system, method);
    const span = 0.3 * period;
    const runs = [256, 512, 1024].map((steps) => precisely(loop, state, parameters, span / steps, steps));
    const apart = (k: number): number =>
      Math.hypot(
        ...state.map((value, i) => {
          const scale = Math.abs(state[i < state.length / 2 ? 0 : state.length - 1]!) || Math.abs(value) || 1;
          return toDouble(subtract(runs[k + 1]![i]!, runs[k]![i]!)) / scale;
        }),
      );
    const order = Math.log2(apart(0) / apart(1));
    expect(order).toBeGreaterThan(method.order - 0.15);
    // Linear equations are kinder: on them a method may gain an order.
    expect(order).toBeLessThan(method.order + (name === "newtonian-angle" ? 1.15 : 0.15));
  });
});

describe("functions in a double-double loop", () => {
  const functions: readonly (readonly [string, (x: Exact) => Exact])[] = [
    ["sin(x)", (x) => x.sin()],
    ["cos(x)", (x) => x.cos()],
    ["tan(x)", (x) => x.tan()],
    ["exp(x)", (x) => x.exp()],
    ["log(x)", (x) => x.ln()],
    ["atan(x)", (x) => x.atan()],
    ["asin(x / 2)", (x) => x.div(2).asin()],
    ["acos(x / 2)", (x) => x.div(2).acos()],
    ["abs(-x)", (x) => x.abs()],
    ["x^(13/10)", (x) => x.pow("1.3")],
    ["x^(7/2) - x^-3", (x) => x.pow("3.5").minus(x.pow(-3))],
    ["2^x", (x) => new Decimal(2).pow(x)],
  ];
  it.each(functions)("%s", (formula, truth) => {
    const definition: EquationsDefinition = {
      name: "made-up",
      title: "",
      display: "",
      form: "time",
      source: "",
      parameters: {},
      coordinates: { x: { rate: "v", unit: "1" }, y: { rate: "w", unit: "1" } },
      acceleration: { x: formula, y: "0*x" },
      conserved: {},
    };
    const system = compileSystem(definition, { parameters: [], planar: false });
    const loop = compilePreciseLoop(system, findMethod("euler")!);
    const found = precisely(loop, [0.8125, 1, 0, 0], [], 1, 1);
    expect(errorInU2(found[2]!, truth(new Decimal("0.8125")))).toBeLessThan(64);
  });
});

describe("single precision", () => {
  it("rounds a sum, product, quotient and root of singles as the processor does", () => {
    const random = generator(5);
    const single = (): number => Math.fround((random() - 0.5) * 2 ** Math.floor(random() * 40 - 20));
    let ties = 0;
    for (let i = 0; i < 20_000; i++) {
      const [a, b] = [single(), single()];
      for (const value of [a + b, a - b, a * b, a / b, Math.sqrt(Math.abs(a))]) {
        // At an exact tie either neighbour is nearest: there alone the two may differ.
        const isTie = Math.abs(roundToSingle(value) - value) === Math.abs(Math.fround(value) - value);
        if (roundToSingle(value) !== Math.fround(value)) {
          expect(isTie).toBe(true);
          ties++;
        }
      }
    }
    expect(ties).toBeLessThan(100);
  });

  it.runIf(hasGcc())("steps as a C program in float does", () => {
    const method = findMethod("rk4")!;
    const loop = compileStepLoop(unit, method, "single");
    const io = new Float64Array(loop.ioLength);
    io.set(START.map(Math.fround));
    const h = 1 / 64;
    for (let left = 300; left > 0; ) left -= loop.advance(io, Float64Array.from([1]), h, left);
    const source = `#include <math.h>
#include <stdio.h>
#define double float
#define sqrt sqrtf
${stepLoopInC(unit, method, "f")}
#undef double
int main(void) {
  float io[16] = {${START.join(", ")}}, p[] = {1};
  for (int left = 300; left > 0;) left -= f(io, p, ${h}, left);
  for (int i = 0; i < 4; i++) printf("%.17g ", (double)io[i]);
  return 0;
}`;
    const inC = runC(source, ["-fsingle-precision-constant"]).trim().split(" ").map(Number);
    expect(Array.from(io.subarray(0, 4))).toEqual(inC);
  });
});

describe("compensated summation", () => {
  // W. Kahan, Commun. ACM 8 (1965) 40. The run in double-double is what the same method gives without rounding.
  it.each(["rk4", "leapfrog", "dormand-prince-5"])(
    "of %s comes nearer to the run without rounding",
    (name) => {
      const method = findMethod(name)!;
      const h = 1 / 4096;
      const steps = 40_000;
      const truth = precisely(compilePreciseLoop(unit, method), START, [1], h, steps).map(toDouble);
      const errorOf = (arithmetic: "double" | "compensated"): number => {
        const loop = compileStepLoop(unit, method, arithmetic);
        const io = new Float64Array(loop.ioLength);
        io.set(START);
        for (let left = steps; left > 0; ) left -= loop.advance(io, Float64Array.from([1]), h, left);
        return Math.hypot(...truth.map((value, i) => io[i]! - value));
      };
      expect(errorOf("compensated")).toBeLessThan(errorOf("double") / 4);
    },
  );

  it.runIf(hasGcc())("leaves the same bits as C", () => {
    for (const name of ["rk4", "yoshida-8", "gauss-legendre-6"]) {
      const method = findMethod(name)!;
      const loop = compileStepLoop(unit, method, "compensated");
      const io = new Float64Array(loop.ioLength);
      io.set(START);
      for (let left = 500; left > 0; ) left -= loop.advance(io, Float64Array.from([1]), 0.01, left);
      const source = `#include <math.h>
#include <stdio.h>
${stepLoopInC(unit, method, "f", "compensated")}
int main(void) {
  double io[16] = {${START.join(", ")}}, p[] = {1};
  for (int left = 500; left > 0;) left -= f(io, p, 0.01, left);
  for (int i = 0; i < 4; i++) printf("%.17g ", io[i]);
  return 0;
}`;
      expect(Array.from(io.subarray(0, 4)), name).toEqual(runC(source).trim().split(" ").map(Number));
    }
  });
});
