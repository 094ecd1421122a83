import type { DoubleDouble } from "../arithmetic/double-double.js";
import type { RungStatus } from "../result/result.js";

/** A scenario made ready to step: SI numbers only. */
export interface PreparedScenario {
  /** Coordinates, then rates, in the order of the compiled system. */
  readonly state: readonly number[];
  /** In the order of `CompiledSystem.parameters`. */
  readonly parameters: readonly number[];
  /** The same with the effect switched off; null where nothing can vanish. */
  readonly nullParameters: readonly number[] | null;
  /** The three above to 31 digits, for the reference. */
  readonly precise: {
    readonly state: readonly DoubleDouble[];
    readonly parameters: readonly DoubleDouble[];
    readonly nullParameters: readonly DoubleDouble[] | null;
  };
  /** A start at periapsis is passage 0. */
  readonly startsAtPeriapsis: boolean;
  /** Osculating Newtonian period of the start, s; 2π in angle form. */
  readonly period: number;
  /** Osculating Newtonian semi-major axis and eccentricity of the start; m. */
  readonly semiMajorAxis: number;
  readonly eccentricity: number;
  /** Until the N-th passage, or for a length of the independent variable (s, rad). */
  readonly span:
    | { readonly kind: "orbits"; readonly count: number }
    | { readonly kind: "length"; readonly length: number };
  /** How the apsidal angle is measured: longitude in the xy plane, from the node, or the polar angle itself. */
  readonly apsidalAngle: "longitude" | "from-node" | "polar";
}

/** The passages of one run. A run that goes wrong is a value, never an exception. */
export interface Run {
  readonly status: RungStatus;
  /** Passage numbers, counted from the start. */
  readonly numbers: readonly number[];
  /** Independent variable at each passage, from the start (s, rad). */
  readonly times: readonly number[];
  /** Apsidal angle at each passage, unwrapped, whole turns included, rad. */
  readonly angles: readonly number[];
  /** The same less the first and less one whole turn a passage, rad: small, and so with all their digits. */
  readonly advances: readonly number[];
  /** Distance at each passage, m. */
  readonly distances: readonly number[];
  readonly steps: number;
  readonly evaluations: number;
  readonly seconds: number;
}
