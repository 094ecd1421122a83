import { evaluateConstant } from "../formula/constant.js";
import type { Coefficient, ImplicitRungeKutta } from "../methods/definition.js";
import { next, type StepBody, type StepContext } from "./body.js";
import { Code, literal, weightedSum } from "./code.js";

/** Sweeps after which a step that still changes is given up. */
const MOST_SWEEPS = 60;
/** A change no smaller than the last counts as rounding only below this part of the accelerations. */
const ROUNDING = 1e-13;

/**
 * Stages of q'' = a(q, q') by fixed-point iteration on the stage accelerations K alone. With the stage rates
 * put in, q_i = q + h c_i v + h² Σ (A²)_ij K_j and v_i = v + h Σ a_ij K_j are the method's own stages.
 * Sweeps go on until nothing changes, or changes stop shrinking at the level of rounding (Hairer, Lubich and
 * Wanner, Geometric Numerical Integration, VIII.6). A step that gets there in no more than `MOST_SWEEPS`
 * converged; one that does not sets the flag.
 *
 * The first guess is the polynomial through the last step's K, taken on; at a call's first step the
 * acceleration at its start.
 */
export function implicitRungeKutta(method: ImplicitRungeKutta, context: StepContext): StepBody {
  const { coordinates, rates } = context;
  const a = method.a.map((row) => row.map(evaluateConstant));
  const b = method.b.map(evaluateConstant);
  const c = method.a.map((row) => evaluateConstant(row.map((entry) => `(${entry})`).join(" + ")));
  const squared = method.a.map((row) => product(row, method.a));
  const last = product(method.b, method.a);
  const onward = extrapolation(c);
  const stages = b.map((_, stage) => stage);
  const axes = coordinates.map((_, i) => i);
  const K = (i: number, stage: number): string => `K${stage}_${i}`;
  const row = (i: number): string[] => stages.map((stage) => K(i, stage));

  const before = new Code();
  const start = context.accelerate(before, "c", (state) => state);
  for (const stage of stages) {
    for (const i of axes) before.variable(K(i, stage), start[i]!);
  }

  const step = new Code();
  step.line("if (taken > 0) {");
  for (const stage of stages) {
    for (const i of axes) step.define(`g${stage}_${i}`, weightedSum(onward[stage]!, row(i)));
  }
  for (const stage of stages) {
    for (const i of axes) step.set(K(i, stage), `g${stage}_${i}`);
  }
  step.line("}");
  step.variable("last", "@infinity");
  step.counter("sweeps");
  step.line("for (;;) {");
  step.line("sweeps++;");
  step.variable("change", "0");
  for (const stage of stages) {
    coordinates.forEach((q, i) => {
      const drift = `${literal(c[stage]!)} * ${rates[i]}`;
      step.define(`${q}_${stage}`, `${q} + h * (${drift} + h * (${weightedSum(squared[stage]!, row(i))}))`);
    });
    if (context.velocityDependent) {
      rates.forEach((v, i) => {
        step.define(`${v}_${stage}`, `${v} + h * (${weightedSum(a[stage]!, row(i))})`);
      });
    }
  }
  for (const stage of stages) {
    const accelerations = context.accelerate(step, `s${stage}_`, (state) => `${state}_${stage}`);
    accelerations.forEach((name, i) => {
      step.set("change", `change + @abs(${name} - ${K(i, stage)})`);
      step.set(K(i, stage), name);
    });
  }
  // Of a sweep that still gains, the size is not asked.
  const size = stages.flatMap((stage) => axes.map((i) => `@abs(${K(i, stage)})`)).join(" + ");
  step.line(`if (change >= last && change <= ${ROUNDING} * (${size})) break;`);
  step.line("if (change == 0) break;");
  step.line(`if (sweeps == ${MOST_SWEEPS} || change != change) { failed = 1; break; }`);
  step.set("last", "change");
  step.line("}");
  step.line(`evaluations = evaluations + sweeps * ${stages.length};`);
  step.line("if (failed == 1) break;");
  coordinates.forEach((q, i) => {
    step.define(next(q), `${q} + h * (${rates[i]} + h * (${weightedSum(last, row(i))}))`);
  });
  rates.forEach((v, i) => {
    step.define(next(v), `${v} + h * (${weightedSum(b, row(i))})`);
  });
  return { before, evaluationsBefore: 1, step, evaluationsPerStep: stages.length, implicit: true };
}

/** A row of coefficients times the matrix A, computed from the exact texts. */
function product(row: readonly Coefficient[], a: readonly (readonly Coefficient[])[]): number[] {
  return a.map((_, j) => evaluateConstant(row.map((entry, k) => `(${entry}) * (${a[k]![j]})`).join(" + ")));
}

/** Weights of the Lagrange polynomials through the nodes c, taken at 1 + c_i. */
function extrapolation(c: readonly number[]): number[][] {
  return c.map((node) =>
    c.map((own, j) =>
      c.reduce((weight, other, k) => (k === j ? weight : (weight * (1 + node - other)) / (own - other)), 1),
    ),
  );
}
