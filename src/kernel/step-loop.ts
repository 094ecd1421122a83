import type { MethodDefinition } from "../methods/definition.js";

/**
 * What the stepping of one (equations, method) pair looks like to the rest of the program.
 * The functions behind it are generated: straight-line code, all state in locals.
 *
 * `io` is a Float64Array of `ioLength`, with n = `dimension`:
 *   [0, n)      the state: coordinates, then rates; read at the call, written at the return
 *   [n, 2n)     out: the state before the last step taken; where an implicit step failed, the state itself
 *   [2n]        the radial rate at the state (see below); read and written
 *   [2n + 1]    out: right-hand-side evaluations of this call
 *   [2n + 2]    out: 0, or 1 when an implicit step did not converge to rounding
 *
 * The radial rate is x·v in time form and -u' in angle form: negative while the orbit comes in.
 */
export interface StepLoop {
  readonly method: MethodDefinition;
  readonly dimension: number;
  readonly ioLength: number;
  /** Evaluations of the right-hand side a step, as the loop carries it out (implicit: of one sweep). */
  readonly evaluationsPerStep: number;
  /**
   * Takes at most `steps` steps of `step` (s, or rad). Stops after the first step over which the radial
   * rate turned from negative to zero or more, or an implicit step that did not converge.
   * `parameters` in the order of `CompiledSystem.parameters`. Returns the number of steps taken.
   */
  advance(io: Float64Array, parameters: Float64Array, step: number, steps: number): number;
}
