import type { PreciseScenario, Start } from "./claim.js";
import type { PartialClaim } from "./schema.js";

/** The start as it is written, without what was wrong with its shape. */
export type PartialStart = NonNullable<NonNullable<PartialClaim["scenario"]>["start"]>;
export const START = ["scenario", "start"];

/** A start as read: in doubles, and to 31 digits under the same names. */
export interface ReadStart {
  readonly start: Start;
  readonly precise: PreciseScenario["start"];
}
