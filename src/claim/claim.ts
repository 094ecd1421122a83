import type { DoubleDouble } from "../arithmetic/double-double.js";
import type { EquationsDefinition } from "../equations/definition.js";
import type { MethodDefinition } from "../methods/definition.js";

/** A claim as read and checked: catalog names looked up, every dimensional number in SI (m, s, rad). */
export interface Claim {
  /** As given on the command line, with forward slashes. */
  readonly file: string;
  /** Of the file's bytes. */
  readonly sha256: string;
  readonly title: string;
  readonly claimed: Claimed;
  readonly scenario: Scenario;
  /** Null for a claim that has only the text. */
  readonly solution: Solution | null;
  readonly audit: AuditSettings;
}

export interface Claimed {
  readonly quantity: "apsidal-advance";
  /** The value as written, unit included. */
  readonly text: string;
  /** In the quoted unit. */
  readonly value: number;
  /** The margin the author stands behind, in the quoted unit; more than 0. */
  readonly halfWidth: number;
  /** Significant digits quoted. */
  readonly digits: number;
  readonly unit: QuotedUnit;
  readonly baseline: "included" | "subtracted";
}

export interface QuotedUnit {
  /** As written, such as `arcsec/century`. */
  readonly text: string;
  /** The angle part alone, such as `arcsec`, and its size in rad. */
  readonly angle: string;
  readonly radians: number;
  /** Per radial period, or per so many seconds. */
  readonly per: "orbit" | number;
}

export interface Scenario {
  readonly equations: EquationsDefinition;
  /** By claim name; only what the claim gave. */
  readonly parameters: Readonly<Record<string, number>>;
  readonly start: Start;
  readonly precise: PreciseScenario;
  readonly span: Span;
}

/** What the claim gives of its scenario, to 31 digits: numbers and units as written, not as doubles round them. */
export interface PreciseScenario {
  /** By claim name. */
  readonly parameters: Readonly<Record<string, DoubleDouble>>;
  /** By the names of `Start`: elements, or the equations' own variables. */
  readonly start: Readonly<Record<string, DoubleDouble>>;
}

export type Start =
  | {
      readonly kind: "elements";
      /** Osculating Newtonian, or exact turning points where `turningPoints`; m. */
      readonly periapsis: number;
      readonly apoapsis: number;
      /** rad; 0 when left out. */
      readonly inclination: number;
      readonly node: number;
      readonly argumentOfPeriapsis: number;
      readonly trueAnomaly: number;
      readonly turningPoints: boolean;
    }
  | { readonly kind: "state"; readonly values: Readonly<Record<string, number>> };

export type Span = { readonly text: string } & (
  | { readonly kind: "orbits"; readonly count: number }
  /** Seconds. */
  | { readonly kind: "time"; readonly length: number }
  /** Radians. */
  | { readonly kind: "angle"; readonly length: number }
);

export interface Solution {
  readonly method: MethodDefinition;
  /** Of the author's program. */
  readonly arithmetic: "double" | "single";
  readonly step: { readonly text: string } & (
    | { readonly kind: "per-orbit"; readonly count: number }
    /** s (or rad in angle form); `unit` as written and its size, to write a step back as the author would. */
    | { readonly kind: "length"; readonly length: number; readonly unit: string; readonly unitSize: number }
  );
}

export interface AuditSettings {
  /** Null: the program chooses. */
  readonly witnesses: readonly MethodDefinition[] | null;
  /** Rungs asked for; at least 4, 8 by default. */
  readonly rungs: number;
}
