import { type Code, compare, type Expression, plus, times } from "./code.js";
import { openFrame } from "./frame.js";
import type { CompiledSystem } from "./system.js";

/**
 * The modified midpoint rule as code of a function of `$step` and `#steps`: from the state in `io`, over that
 * many steps (two or more, an even number), to the state in `io`. z1 = y + h f(y), z(i+1) = z(i-1) + 2 h f(z(i)):
 * its error expands in even powers of h (W. B. Gragg, SIAM J. Numer. Anal. 2 (1965) 384; Hairer, Nørsett and
 * Wanner, Solving Ordinary Differential Equations I (1993), II.9).
 */
export function writeMidpoint(system: CompiledSystem): Code {
  const { code, rates, states, accelerate } = openFrame(system);
  const slopes = (into: Code, prefix: string, at: (state: string) => string): Expression[] => [
    ...rates.map(at),
    ...accelerate(into, prefix, at),
  ];
  const later = (state: string): string => `z_${state}`;
  const latest = (state: string): string => `y_${state}`;
  code.variable("#taken", 1);
  const first = slopes(code, "c", (state) => state);
  states.forEach((state, i) => {
    code.variable(later(state), plus(state, times("h", first[i]!)));
  });
  code.define("h2", plus("h", "h"));
  code.loop((loop) => {
    loop.when(compare("#taken", "==", "#steps"), (done) => {
      states.forEach((state, i) => {
        done.store(i, later(state));
      });
      done.return("#taken");
    });
    const now = slopes(loop, "s", later);
    states.forEach((state, i) => {
      loop.define(latest(state), plus(state, times("h2", now[i]!)));
    });
    for (const state of states) {
      loop.set(state, later(state));
      loop.set(later(state), latest(state));
    }
    loop.set("#taken", plus("#taken", 1));
  });
  return code;
}
