import { toDouble } from "../arithmetic/double-double.js";
import type { Coefficient, ImplicitRungeKutta } from "../methods/definition.js";
import { next, type StepBody, type StepContext } from "./body.js";
import { Code, compare, type Expression, plus, times, weightedSum } from "./code.js";
import { constant, preciseConstant } from "./constants.js";

/**
 * Stages of q'' = a(q, q') by fixed-point iteration on the stage accelerations K alone. With the stage rates
 * put in, q_i = q + h c_i v + h² Σ (A²)_ij K_j and v_i = v + h Σ a_ij K_j are the method's own stages.
 * Sweeps go on until nothing changes, or changes stop shrinking at the level of rounding (Hairer, Lubich and
 * Wanner, Geometric Numerical Integration, VIII.6). A step that gets there in no more than `style.sweeps`
 * converged; one that does not sets the flag.
 *
 * The first guess is the polynomial through the last step's K, taken on; at a call's first step the
 * acceleration at its start.
 */
export function implicitRungeKutta(method: ImplicitRungeKutta, context: StepContext): StepBody {
  const { coordinates, rates, style } = context;
  const a = method.a.map((row) => row.map(constant));
  const b = method.b.map(constant);
  const sums = method.a.map((row) => row.map((entry) => `(${entry})`).join(" + "));
  const c = sums.map(constant);
  const squared = method.a.map((row) => product(row, method.a));
  const last = product(method.b, method.a);
  const onward = extrapolation(sums.map((sum) => toDouble(preciseConstant(sum))));
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
  step.when(compare("#taken", ">=", 1), (then) => {
    for (const stage of stages) {
      for (const i of axes) then.define(`g${stage}_${i}`, weightedSum(onward[stage]!, row(i)));
    }
    for (const stage of stages) {
      for (const i of axes) then.set(K(i, stage), `g${stage}_${i}`);
    }
  });
  step.variable("last", Number.POSITIVE_INFINITY);
  step.variable("sweeps", 0);
  step.loop((sweep) => {
    sweep.set("sweeps", plus("sweeps", 1));
    for (const stage of stages) {
      coordinates.forEach((q, i) => {
        const drift = plus(times(c[stage]!, rates[i]!), times("h", weightedSum(squared[stage]!, row(i))));
        sweep.define(`${q}_${stage}`, plus(q, times("h", drift)));
      });
      if (context.velocityDependent) {
        rates.forEach((v, i) => {
          sweep.define(`${v}_${stage}`, plus(v, times("h", weightedSum(a[stage]!, row(i)))));
        });
      }
    }
    const changes: Expression[] = [];
    for (const stage of stages) {
      const accelerations = context.accelerate(sweep, `s${stage}_`, (state) => `${state}_${stage}`);
      accelerations.forEach((value, i) => {
        sweep.define(`d${stage}_${i}`, absolute({ op: "subtract", args: [value, K(i, stage)] }));
        sweep.set(K(i, stage), value);
        changes.push(`d${stage}_${i}`);
      });
    }
    sweep.define("change", plus(...changes));
    // Of a sweep that still gains, the size is not asked.
    sweep.when(compare("change", ">=", "last"), (then) => {
      const size = plus(...stages.flatMap((stage) => axes.map((i) => absolute(K(i, stage)))));
      then.when(compare("change", "<=", times(style.rounding, size)), (within) => within.leave());
    });
    sweep.when(compare("change", "==", 0), (then) => then.leave());
    const giveUp = {
      either: [compare("sweeps", "==", style.sweeps), compare("change", "!=", "change")],
    } as const;
    sweep.when(giveUp, (then) => {
      then.set("failed", 1);
      then.leave();
    });
    sweep.set("last", "change");
  });
  step.set("evaluations", plus("evaluations", times("sweeps", stages.length)));
  step.when(compare("failed", "==", 1), (then) => then.leave());
  coordinates.forEach((q, i) => {
    const drift = plus(rates[i]!, times("h", weightedSum(last, row(i))));
    context.move(step, next(q), q, q, times("h", drift));
  });
  rates.forEach((v, i) => {
    context.move(step, next(v), v, v, times("h", weightedSum(b, row(i))));
  });
  return { before, evaluationsBefore: 1, step, evaluationsPerStep: stages.length, implicit: true };
}

/** A row of coefficients times the matrix A, computed from the exact texts. */
function product(row: readonly Coefficient[], a: readonly (readonly Coefficient[])[]): Expression[] {
  return a.map((_, j) => constant(row.map((entry, k) => `(${entry}) * (${a[k]![j]})`).join(" + ")));
}

/** Weights of the Lagrange polynomials through the nodes c, taken at 1 + c_i. */
function extrapolation(c: readonly number[]): number[][] {
  return c.map((node) =>
    c.map((own, j) =>
      c.reduce((weight, other, k) => (k === j ? weight : (weight * (1 + node - other)) / (own - other)), 1),
    ),
  );
}

const absolute = (value: Expression): Expression => ({ op: "abs", args: [value] });
