/**
 * A system of equations as data. A catalog entry and a user's own block have this one form and take the
 * same path: formulas are text in the grammar of `src/formula`, parsed to a graph, never evaluated as code.
 *
 * From a definition the program derives the derivatives, the acceleration of a potential and its energy,
 * the planar reduction, the turning of the radius, and which methods apply.
 *
 * To add one: copy a file of `src/equations/catalog`, fill every field, add one line to `catalog/index.ts`.
 */
export interface EquationsDefinition {
  /** Catalog name, in kebab case. */
  readonly name: string;
  /** One line for people. */
  readonly title: string;
  /** The equations as a person writes them, for `cupel catalog` and the report. */
  readonly display: string;
  /** Independent variable: time (s), or the polar angle (rad) with u = 1/r as first coordinate. */
  readonly form: "time" | "angle";
  /** Where the equations are published: author, title or journal, place. */
  readonly source: string;
  /** Keyed by the name that a claim uses (`GM`, `mass-ratio`). */
  readonly parameters: Readonly<Record<string, ParameterDefinition>>;
  /**
   * Coordinates in order. Time form: x, y, z (m) with rates vx, vy, vz (m/s).
   * Angle form: u (1/m), the inverse radius, with rate w = du/dphi (1/m).
   */
  readonly coordinates: Readonly<Record<string, { readonly rate: string; readonly unit: string }>>;
  /** Intermediate names, in order; each may use those before it. */
  readonly let?: Readonly<Record<string, string>>;
  /** Acceleration of each coordinate; or a potential per unit mass (m^2/s^2), whose negative gradient it is. */
  readonly acceleration?: Readonly<Record<string, string>>;
  readonly potential?: string;
  /**
   * What the equations conserve, by name. A potential adds `energy` by itself.
   * A vector is an array of components; its drift is that of the vector relative to its own magnitude.
   */
  readonly conserved: Readonly<Record<string, ConservedDefinition>>;
}

export interface ParameterDefinition {
  /** The identifier in the formulas. */
  readonly symbol: string;
  /** SI unit, such as `m^3/s^2`; `1` for a pure number. */
  readonly unit: string;
  /** What it is, in a few words. */
  readonly meaning: string;
  /** Value when the claim leaves it out; without a default the claim must give it. */
  readonly default?: number;
  /** Value in the null run, where it is part of the effect: 0, or infinity for the speed of light. */
  readonly vanishesAt?: number;
  /** Set from the start and not by the claim: GM/h² of an angle-form orbit, 1/(rp (1 + e)). */
  readonly fromStart?: "inverse-semi-latus-rectum";
  /** What a claim may give: `positive`, `non-negative`, `any` or an inclusive interval. */
  readonly range: "positive" | "non-negative" | "any" | readonly [number, number];
}

export interface ConservedDefinition {
  readonly formula: string | readonly string[];
  readonly unit: string;
  /** Conserved only up to a small order (post-Newtonian): the relative size that its variation may reach. */
  readonly truncatedAt?: string;
}
