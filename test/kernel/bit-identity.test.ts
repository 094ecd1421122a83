import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { equationsCatalog, findEquations } from "../../src/equations/catalog/index.js";
import { appliesTo } from "../../src/kernel/applies-to.js";
import { compileStepLoop, stepLoopInC } from "../../src/kernel/compile.js";
import { findMethod, methodsCatalog } from "../../src/methods/catalog/index.js";
import type { MethodDefinition } from "../../src/methods/definition.js";
import { hasGcc, runC } from "./gcc.js";
import { type Start, startOf } from "./starts.js";

const STEPS = 3000;
const PER_ORBIT = 100;

/** Bits of what a loop leaves in io after `STEPS` steps, passages and all. */
function bitsOf({ system, state, parameters, period }: Start, method: MethodDefinition): string {
  const loop = compileStepLoop(system, method);
  const io = new Float64Array(loop.ioLength);
  io.set(state);
  for (let left = STEPS; left > 0; ) {
    left -= loop.advance(io, Float64Array.from(parameters), period / PER_ORBIT, left);
  }
  return [...new BigUint64Array(io.buffer)].map((bits) => bits.toString(16)).join(" ");
}

/** Doubles as C reads them: a whole number would be an integer there. */
const inC = (values: readonly number[]): string =>
  values.map((value) => (value === Infinity ? "INFINITY" : value.toExponential())).join(", ");

/** The same start with the effect switched off, as a null run has it; none where nothing can vanish. */
function nullStarts(start: Start): Start[] {
  const { parameters } = start.system.definition;
  const vanishing = start.system.parameters.map((name) => parameters[name]!.vanishesAt);
  if (vanishing.every((value) => value === undefined)) return [];
  return [{ ...start, parameters: vanishing.map((value, i) => value ?? start.parameters[i]!) }];
}

/** A C main that does the same with function number i from each start of number i. */
function program(pairs: readonly { starts: readonly Start[]; code: string }[]): string {
  const call = ({ system, state, parameters, period }: Start, i: number): string => {
    const length = 2 * system.states.length + 3;
    const io = [...state, ...new Array(length - state.length).fill(0)];
    return `{ double io[] = {${inC(io)}}, p[] = {${inC(parameters)}};
      for (int left = ${STEPS}; left > 0;) left -= f${i}(io, p, ${inC([period / PER_ORBIT])}, left);
      show(io, ${length}); }`;
  };
  const calls = pairs.flatMap(({ starts }, i) => starts.map((start) => call(start, i)));
  return `#include <math.h>
#include <stdio.h>
#include <string.h>
${pairs.map(({ code }) => code).join("\n")}
static void show(const double *io, int n) {
  for (int i = 0; i < n; i++) {
    unsigned long long bits;
    memcpy(&bits, &io[i], 8);
    printf(i ? " %llx" : "%llx", bits);
  }
  printf("\\n");
}
int main(void) { ${calls.join("\n")} return 0; }`;
}

const gcc = hasGcc();
if (!gcc) console.info("gcc is not here: the generated loops are not compared with C");

describe.runIf(gcc)("generated loops and C at -O2", () => {
  const pairs = equationsCatalog.flatMap((equations) =>
    (equations.form === "angle" ? [false] : [true, false]).flatMap((planar) => {
      const start = startOf(equations, planar);
      return methodsCatalog
        .filter((method) => appliesTo(method, start.system).ok)
        .map((method) => ({
          name: `${equations.name}, ${planar ? "planar, " : ""}${method.name}`,
          starts: [start, ...nullStarts(start)],
          method,
        }));
    }),
  );

  it("leave the same bits for every pair of equations and method, and in its null run", () => {
    const coded = pairs.map(({ starts, method }, i) => ({
      starts,
      code: stepLoopInC(starts[0]!.system, method, `f${i}`),
    }));
    const own = pairs.flatMap(({ name, starts, method }) =>
      starts.map((start) => ({ name, bits: bitsOf(start, method) })),
    );
    const lines = runC(program(coded)).trim().split("\n");
    expect(lines).toHaveLength(own.length);
    expect(own.filter(({ bits }, i) => bits !== lines[i]).map(({ name }) => name)).toEqual([]);
    expect(pairs.length).toBeGreaterThan(60);
    expect(own.length).toBeGreaterThan(100);
  });

  // Written by hand, as one would without a generator: see the file.
  it.each([
    ["post-newtonian-1", "rk4", "rk4_post_newtonian"],
    ["newtonian", "leapfrog", "leapfrog_newtonian"],
  ])("leave the same bits as plain hand-written C: %s, %s", (equations, name, twin) => {
    const method = findMethod(name)!;
    // A test particle: the twin has no mass ratio.
    const start = startOf(findEquations(equations)!, true, ["GM", "c"]);
    const code = readFileSync(new URL("../bench/twin.c", import.meta.url), "utf8");
    const source = program([{ starts: [start], code: `${code}\n#define f0 ${twin}` }]);
    expect(runC(source).trim()).toBe(bitsOf(start, method));
  });
});
