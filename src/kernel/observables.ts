import { Code } from "./code.js";
import { writeExpressions } from "./expressions.js";
import type { CompiledSystem } from "./system.js";

/** A conserved quantity as a function of the state, with the parameters put in. */
export interface Observable {
  readonly name: string;
  /** Components at a state; one of a scalar. */
  readonly value: (state: ArrayLike<number>) => readonly number[];
  readonly truncatedAt: string | null;
}

/** @param parameters in the order of the system's */
export function conservedObservables(system: CompiledSystem, parameters: readonly number[]): Observable[] {
  const bind = (symbol: string): string => {
    const state = system.states.indexOf(symbol);
    return state >= 0 ? `state[${state}]` : `parameters[${system.symbols.indexOf(symbol)}]`;
  };
  return system.conserved.map(({ name, components, truncatedAt }) => {
    const code = new Code();
    const names = writeExpressions(code, components, "q", bind);
    code.line(`return [${names.join(", ")}];`);
    const compute = new Function("state", "parameters", code.print("javascript"));
    return { name, truncatedAt, value: (state) => compute(state, parameters) as number[] };
  });
}
