import { Code, type Expression } from "./code.js";
import { writeExpressions } from "./expressions.js";
import type { CompiledSystem } from "./system.js";
import { expression, print } from "./text.js";

/** A conserved quantity as a function of the state, with the parameters put in. */
export interface Observable {
  readonly name: string;
  /** Components at a state; one of a scalar. */
  readonly value: (state: ArrayLike<number>) => readonly number[];
  readonly truncatedAt: string | null;
}

/** @param parameters in the order of the system's */
export function conservedObservables(system: CompiledSystem, parameters: readonly number[]): Observable[] {
  const bind = (symbol: string): Expression => {
    const state = system.states.indexOf(symbol);
    if (state >= 0) return { from: "io", index: state };
    return { from: "parameters", index: system.symbols.indexOf(symbol) };
  };
  return system.conserved.map(({ name, components, truncatedAt }) => {
    const code = new Code();
    const values = writeExpressions(code, components, "q", bind).map((value) =>
      expression(value, "javascript"),
    );
    const compute = new Function(
      "io",
      "parameters",
      `${print(code, "javascript")}\nreturn [${values.join(", ")}];`,
    );
    return { name, truncatedAt, value: (state) => compute(state, parameters) as number[] };
  });
}
