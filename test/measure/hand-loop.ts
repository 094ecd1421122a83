import type { StepLoop } from "../../src/kernel/step-loop.js";
import type { MethodDefinition } from "../../src/methods/definition.js";

/**
 * Step loops written out by hand to the contract of `StepLoop`, to measure with something that shares
 * nothing with the generated ones.
 */
export type Acceleration = (
  x: Float64Array,
  v: Float64Array,
  out: Float64Array,
  parameters: Float64Array,
) => void;

type Take = (x: Float64Array, v: Float64Array, h: number, a: (out: Float64Array) => void) => number;

const named = (name: string, order: number): MethodDefinition => ({
  name,
  title: name,
  order,
  source: "by hand, for the tests",
  symmetric: false,
  symplectic: false,
  family: "explicit-runge-kutta",
  a: [],
  b: [],
});

/** Kick-drift-kick. */
const leapfrog: Take = (x, v, h, a) => {
  const k = new Float64Array(x.length);
  a(k);
  for (let i = 0; i < x.length; i++) v[i]! += (h / 2) * k[i]!;
  for (let i = 0; i < x.length; i++) x[i]! += h * v[i]!;
  a(k);
  for (let i = 0; i < x.length; i++) v[i]! += (h / 2) * k[i]!;
  return 2;
};

/** Any explicit tableau on (x, v). */
const rungeKutta =
  (rows: readonly (readonly number[])[], weights: readonly number[]): Take =>
  (x, v, h, a) => {
    const n = x.length;
    const [x0, v0] = [x.slice(), v.slice()];
    const kx: Float64Array[] = [];
    const kv: Float64Array[] = [];
    const set = (row: readonly number[]): void => {
      for (let i = 0; i < n; i++) {
        x[i] = x0[i]! + h * row.reduce((sum, w, j) => sum + w * kx[j]![i]!, 0);
        v[i] = v0[i]! + h * row.reduce((sum, w, j) => sum + w * kv[j]![i]!, 0);
      }
    };
    for (const row of rows) {
      set(row);
      const k = new Float64Array(n);
      a(k);
      kx.push(v.slice());
      kv.push(k);
    }
    set(weights);
    return rows.length;
  };

const takes = {
  leapfrog,
  rk4: rungeKutta([[], [1 / 2], [0, 1 / 2], [0, 0, 1]], [1 / 6, 1 / 3, 1 / 3, 1 / 6]),
  euler: rungeKutta([[]], [1]),
} as const;
const orders = { leapfrog: 2, rk4: 4, euler: 1 } as const;

/** @param dimension coordinates and rates together; 2 is the angle form (u, u') */
export function handLoop(
  method: keyof typeof takes,
  dimension: number,
  acceleration: Acceleration,
): StepLoop {
  const half = dimension / 2;
  const take = takes[method];
  const x = new Float64Array(half);
  const v = new Float64Array(half);
  return {
    method: named(method, orders[method]),
    dimension,
    ioLength: 2 * dimension + 3,
    evaluationsPerStep: method === "rk4" ? 4 : method === "euler" ? 1 : 2,
    advance(io, parameters, step, steps) {
      let evaluations = 0;
      let rate = io[2 * dimension]!;
      let done = 0;
      x.set(io.subarray(0, half));
      v.set(io.subarray(half, dimension));
      while (done < steps) {
        io.set(x, dimension);
        io.set(v, dimension + half);
        evaluations += take(x, v, step, (out) => acceleration(x, v, out, parameters));
        done++;
        const before = rate;
        rate =
          dimension === 2 ? -v[0]! : x.reduce((sum, xi, i) => (i === 0 ? xi * v[i]! : sum + xi * v[i]!), 0);
        if (before < 0 && rate >= 0) break;
      }
      io.set(x, 0);
      io.set(v, half);
      io[2 * dimension] = rate;
      io[2 * dimension + 1] = evaluations;
      io[2 * dimension + 2] = 0;
      return done;
    },
  };
}

/** Kepler's problem; parameters: GM. */
export const kepler: Acceleration = (x, _v, out, [GM]) => {
  const r2 = x.reduce((sum, xi) => sum + xi * xi, 0);
  for (let i = 0; i < x.length; i++) out[i] = (-GM! * x[i]!) / (r2 * Math.sqrt(r2));
};

/** First post-Newtonian order, test particle, harmonic coordinates; parameters: GM, c. */
export const postNewtonian: Acceleration = (x, v, out, [GM, c]) => {
  const r = Math.sqrt(x.reduce((sum, xi) => sum + xi * xi, 0));
  const v2 = v.reduce((sum, vi) => sum + vi * vi, 0);
  const xv = x.reduce((sum, xi, i) => sum + xi * v[i]!, 0);
  for (let i = 0; i < x.length; i++) {
    out[i] =
      (-GM! * x[i]!) / r ** 3 + (GM! / (c! * c! * r ** 3)) * (((4 * GM!) / r - v2) * x[i]! + 4 * xv * v[i]!);
  }
};
