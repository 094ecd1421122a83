import type { PartialClaim } from "./schema.js";

/** The start as it is written, without what was wrong with its shape. */
export type PartialStart = NonNullable<NonNullable<PartialClaim["scenario"]>["start"]>;
export const START = ["scenario", "start"];
