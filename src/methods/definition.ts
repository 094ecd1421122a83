/**
 * A method as data: coefficients, formal order, family, source. A family knows how to emit a step loop.
 *
 * A coefficient is text in the formula grammar without names, so that it stays exact: "1/6",
 * "1/2 - sqrt(15)/10", or a decimal where its publication gives no more.
 *
 * To add one: copy a file of `src/methods/catalog`, fill every field, add one line to `catalog/index.ts`.
 */
export type Coefficient = string;

interface MethodCommon {
  /** Catalog name, in kebab case. */
  readonly name: string;
  readonly title: string;
  /** Formal order of the state error. */
  readonly order: number;
  /** Where the coefficients are published: author, title or journal, place. */
  readonly source: string;
  /** Equal to its own adjoint: its error expands in even powers of the step. */
  readonly symmetric: boolean;
  readonly symplectic: boolean;
  /** Where the order of a figure differs from `order`, or anything else that a reader should know. */
  readonly note?: string;
}

/** k_i = f(y + h Σ_j<i a_ij k_j), y' = y + h Σ b_i k_i. Row i of `a` holds i entries (row 0 is empty). */
export interface ExplicitRungeKutta extends MethodCommon {
  readonly family: "explicit-runge-kutta";
  readonly a: readonly (readonly Coefficient[])[];
  readonly b: readonly Coefficient[];
}

/** k_i = f(y + h Σ_j a_ij k_j) over all j: `a` is square. */
export interface ImplicitRungeKutta extends MethodCommon {
  readonly family: "implicit-runge-kutta";
  readonly a: readonly (readonly Coefficient[])[];
  readonly b: readonly Coefficient[];
}

/** Kicks v += c h a(x) and drifts x += c h v, in the order in which they are carried out. */
export interface Splitting extends MethodCommon {
  readonly family: "splitting";
  readonly stages: readonly ({ readonly kick: Coefficient } | { readonly drift: Coefficient })[];
}

export type MethodDefinition = ExplicitRungeKutta | ImplicitRungeKutta | Splitting;
export type Family = MethodDefinition["family"];
