import {
  add,
  type DoubleDouble,
  fromDouble,
  multiply,
  negate,
  toDouble,
} from "../arithmetic/double-double.js";
import { evaluate } from "../formula/walk.js";
import type { CompiledSystem } from "../kernel/system.js";
import type { PreciseState } from "./stepper.js";

/** The radial rate of a state, x·v or -u', and how fast it changes. */
export interface RadialMotion {
  rate(state: PreciseState): DoubleDouble;
  /** To the digits of a double: v² + x·a, or -u''. */
  rateOfRate(state: PreciseState): number;
}

export function radialMotion(system: CompiledSystem, parameters: readonly DoubleDouble[]): RadialMotion {
  const half = system.coordinates.length;
  const inAngle = system.definition.form === "angle";
  const values = new Map(system.symbols.map((symbol, i) => [symbol, parameters[i]!.high]));
  return {
    rate(state) {
      if (inAngle) return negate(state[1]!);
      let sum = fromDouble(0);
      for (let i = 0; i < half; i++) sum = add(sum, multiply(state[i]!, state[half + i]!));
      return sum;
    },
    rateOfRate(state) {
      const doubles = new Map(system.states.map((name, i) => [name, toDouble(state[i]!)]));
      const lookUp = (name: string): number => doubles.get(name) ?? values.get(name)!;
      const accelerations = system.accelerations.map((node) => evaluate(node, lookUp));
      if (inAngle) return -accelerations[0]!;
      return accelerations.reduce((sum, a, i) => {
        const [x, v] = [toDouble(state[i]!), toDouble(state[half + i]!)];
        return sum + v * v + x * a;
      }, 0);
    },
  };
}

/** Sizes of position and velocity, to which errors are relative; of u and u' together in angle form. */
export function scales(system: CompiledSystem, state: PreciseState): readonly [number, number] {
  const half = system.coordinates.length;
  const doubles = state.map(toDouble);
  const position = Math.hypot(...doubles.slice(0, half));
  const velocity = Math.hypot(...doubles.slice(half));
  if (system.definition.form !== "angle") return [position, velocity];
  const both = Math.hypot(position, velocity);
  return [both, both];
}
