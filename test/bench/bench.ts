import { execFileSync } from "node:child_process";
import { readFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { findEquations } from "../../src/equations/catalog/index.js";
import { compileStepLoop, stepLoopInC } from "../../src/kernel/compile.js";
import { compilePairLoop } from "../../src/kernel/pair-loop.js";
import { runPassages } from "../../src/measure/passages.js";
import { startOfDoubles } from "../../src/measure/precise-start.js";
import { findMethod } from "../../src/methods/catalog/index.js";
import { compileC, hasGcc, runC } from "../kernel/gcc.js";
import { type Start, startOf } from "../kernel/starts.js";

/*
 * Speed beside C in the same run: warm step loops, a whole ladder, and whole commands from the shell.
 * Many short runs, the two languages in turn, and of each the fastest: what disturbs a run only ever adds
 * to it. Nothing here is asserted.
 */

const STEPS = 20_000;
const PER_ORBIT = 512;
/** Turns of either language, and runs in a turn. */
const TURNS = 5;
const RUNS = 80;

const TIMER = `#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <time.h>
static double now(void) { struct timespec t; clock_gettime(CLOCK_MONOTONIC, &t); return t.tv_sec + 1e-9 * t.tv_nsec; }
`;

const inC = (values: readonly number[]): string => values.map((value) => value.toExponential()).join(", ");
const median = (values: readonly number[]): number => values.toSorted((a, b) => a - b)[values.length >> 1]!;
const root = fileURLToPath(new URL("../../../", import.meta.url));

interface Contest {
  readonly name: string;
  readonly start: Start;
  readonly method: string;
  /** A function of the hand-written file; else C printed from the same statements. */
  readonly twin: string | null;
}

const postNewtonian = startOf(findEquations("post-newtonian-1")!, true, ["GM", "c"]);
const newtonian = startOf(findEquations("newtonian")!, true, ["GM"]);
const contests: readonly Contest[] = [
  { name: "post-newtonian-1", start: postNewtonian, method: "rk4", twin: "rk4_post_newtonian" },
  { name: "post-newtonian-1", start: postNewtonian, method: "dormand-prince-5", twin: null },
  { name: "post-newtonian-1", start: postNewtonian, method: "dormand-prince-8", twin: null },
  { name: "post-newtonian-1", start: postNewtonian, method: "gauss-legendre-6", twin: null },
  { name: "newtonian", start: newtonian, method: "leapfrog", twin: "leapfrog_newtonian" },
  { name: "newtonian", start: newtonian, method: "yoshida-8", twin: null },
];

/** Nanoseconds a step of the compiled loop. */
function alone({ start, method }: Contest): () => number {
  const loop = compileStepLoop(start.system, findMethod(method)!);
  const parameters = Float64Array.from(start.parameters);
  const step = start.period / PER_ORBIT;
  return () => {
    const io = new Float64Array(loop.ioLength);
    io.set(start.state);
    const began = performance.now();
    for (let left = STEPS; left > 0; ) left -= loop.advance(io, parameters, step, left);
    return ((performance.now() - began) * 1e6) / STEPS;
  };
}

/** Nanoseconds a step and run of two runs side by side, with the effect and without; null where that cannot be. */
function sideBySide({ start, method }: Contest): (() => number) | null {
  const pair = compilePairLoop(start.system, findMethod(method)!);
  if (pair === null) return null;
  const parameters = [
    start.parameters,
    start.parameters.map((x, i) => (i === 1 ? Number.POSITIVE_INFINITY : x)),
  ];
  const both = parameters.map((values) => Float64Array.from(values)) as [Float64Array, Float64Array];
  const step = start.period / PER_ORBIT;
  return () => {
    const io = [new Float64Array(pair.ioLength), new Float64Array(pair.ioLength)] as const;
    for (const one of io) one.set(start.state);
    const began = performance.now();
    for (let left = STEPS; left > 0; ) left -= pair.advance(io, both, step, left);
    return ((performance.now() - began) * 1e6) / STEPS / 2;
  };
}

/** The same in C, as a program that prints its time. */
function inCProgram({ start, method, twin }: Contest): string {
  const { system, state, parameters, period } = start;
  const code =
    twin === null
      ? stepLoopInC(system, findMethod(method)!, "twin")
      : `${readFileSync(join(root, "test/bench/twin.c"), "utf8")}\n#define twin ${twin}`;
  const io = [...state, ...new Array(system.states.length + 3).fill(0)];
  return `${TIMER}${code}
int main(void) {
  for (int run = 0; run < ${RUNS}; run++) {
    double io[] = {${inC(io)}}, p[] = {${inC(parameters)}};
    double began = now();
    for (int left = ${STEPS}; left > 0;) left -= twin(io, p, ${inC([period / PER_ORBIT])}, left);
    double took = now() - began;
    if (io[0] != 0) printf("%.3f\\n", took * 1e9 / ${STEPS});
  }
  return 0;
}`;
}

function stepLoops(gcc: boolean): void {
  console.log("\nWarm step loop, nanoseconds a step and run, and parts of C's time (planar; gcc -O2)\n");
  console.log("equations         method                  C     alone  ratio  side by side  ratio");
  for (const contest of contests) {
    const runs = [alone(contest), sideBySide(contest)];
    const program = gcc ? compileC(inCProgram(contest)) : null;
    for (const run of runs) for (let warm = 0; warm < RUNS; warm++) run?.();
    const times: number[][] = runs.map(() => []);
    const theirs: number[] = [];
    for (let turn = 0; turn < TURNS; turn++) {
      runs.forEach((run, i) => {
        for (let k = 0; run !== null && k < RUNS; k++) times[i]!.push(run());
      });
      if (program !== null) theirs.push(...program.run().trim().split("\n").map(Number));
    }
    program?.remove();
    const c = gcc ? Math.min(...theirs) : null;
    const column = (values: readonly number[], width: number): string => {
      const least = Math.min(...values);
      if (!Number.isFinite(least)) return "-".padStart(width) + "-".padStart(7);
      return least.toFixed(1).padStart(width) + (c === null ? "-" : (least / c).toFixed(2)).padStart(7);
    };
    const beside = `${c === null ? "no gcc" : c.toFixed(1)}`.padStart(7);
    const name = contest.name.padEnd(18) + contest.method.padEnd(18);
    const twin = contest.twin === null ? "" : "  C by hand";
    console.log(name + beside + column(times[0]!, 10) + column(times[1]!, 14) + twin);
  }
}

const LADDER = ["midpoint", "heun", "rk4", "dormand-prince-5", "dormand-prince-8"];
const RUNGS = [32, 64, 128, 256, 512, 1024, 2048, 4096];
const ORBITS = 50;

/** The ladder with its passages found and refined, as an audit runs it, beside bare C stepping. */
function ladder(gcc: boolean): void {
  const { system, state, parameters, period } = postNewtonian;
  const loops = LADDER.map((name) => compileStepLoop(system, findMethod(name)!));
  const scenario = {
    state,
    parameters,
    nullParameters: null,
    precise: startOfDoubles({ state: [], parameters, nullParameters: null }),
    startsAtPeriapsis: true,
    period,
    semiMajorAxis: 5.8e10,
    eccentricity: 0.3,
    span: { kind: "orbits", count: ORBITS },
    apsidalAngle: "longitude",
  } as const;
  const all = (): number => {
    const began = performance.now();
    for (const loop of loops) for (const n of RUNGS) runPassages(loop, scenario, parameters, period / n);
    return performance.now() - began;
  };
  const first = all();
  const warm = Math.min(...Array.from({ length: 15 }, all));
  const functions = LADDER.map((name, i) => stepLoopInC(system, findMethod(name)!, `twin${i}`)).join("\n");
  const program = `${TIMER}${functions}
typedef int (*Loop)(double *, const double *, double, int);
int main(void) {
  Loop loops[] = {${LADDER.map((_, i) => `twin${i}`).join(", ")}};
  int rungs[] = {${RUNGS.join(", ")}};
  for (int run = 0; run < 15; run++) {
    double began = now(), sum = 0;
    for (int m = 0; m < ${LADDER.length}; m++)
      for (int r = 0; r < ${RUNGS.length}; r++) {
        double io[11] = {${inC(state)}}, p[] = {${inC(parameters)}};
        int most = ${ORBITS} * rungs[r] * 4, taken = 0;
        for (int k = 0; k < ${ORBITS} && taken < most; k++) taken += loops[m](io, p, ${inC([period])} / rungs[r], most - taken);
        sum += io[0];
      }
    if (sum != 0) printf("%.3f\\n", (now() - began) * 1e3);
  }
  return 0;
}`;
  const c = gcc ? Math.min(...runC(program).trim().split("\n").map(Number)) : null;
  console.log(
    `\nLadder of ${LADDER.length} methods, ${RUNGS.length} rungs (32 to 4096 steps an orbit), ${ORBITS} orbits, milliseconds\n`,
  );
  console.log(
    `cold ${first.toFixed(0)}, warm ${warm.toFixed(0)}; C ${c === null ? "no gcc" : `${c.toFixed(0)}; ratio ${(warm / c).toFixed(2)}`}`,
  );
}

function commands(): void {
  console.log("\nWhole commands from the shell, seconds (median of 5)\n");
  const main = join(root, "dist/cli/main.js");
  const out = join(tmpdir(), `cupel-bench-${process.pid}`);
  const calls: readonly (readonly string[])[] = [
    ["--help"],
    ["audit", "fixtures/claims/demo.yaml", "--out", out],
    ["audit", "fixtures/claims/demo.yaml", "--no-report"],
  ];
  for (const call of calls) {
    const times = Array.from({ length: 5 }, () => {
      const began = performance.now();
      execFileSync(process.execPath, [main, ...call], { cwd: root, stdio: "ignore" });
      return (performance.now() - began) / 1000;
    });
    console.log(
      `cupel ${call
        .filter((word) => word !== out)
        .join(" ")
        .padEnd(44)} ${median(times).toFixed(2)}`,
    );
  }
}

const gcc = hasGcc();
if (!gcc) console.log("gcc is not here: no C to compare with");
stepLoops(gcc);
ladder(gcc);
commands();
