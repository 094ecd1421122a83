import type { Estimate } from "../convergence/extrapolation.js";
import { referenceSource } from "../reference/orbit.js";
import type { ClaimResult } from "../result/result.js";
import type { Investigation } from "./investigate.js";

/** What a claim is held against: the reference where there is one, else what the witnesses' ladders lead to. */
export interface Best {
  readonly value: number;
  readonly halfWidth: number;
  readonly from: "reference" | "extrapolation";
  /** Two independent methods agree on it. */
  readonly sound: boolean;
}

export function bestOf({ reference, extrapolated }: Investigation): Best | null {
  if ("value" in reference) {
    return { value: reference.value, halfWidth: reference.halfWidth, from: "reference", sound: true };
  }
  if (extrapolated === null) return null;
  const { value, halfWidth, sound } = extrapolated;
  return { value, halfWidth, from: "extrapolation", sound };
}

export const intervalOf = ({ value, halfWidth }: Estimate): Estimate => ({ value, halfWidth });

export function referenceOf({ reference }: Investigation, unit: string): ClaimResult["reference"] {
  if ("none" in reference) {
    return {
      value: null,
      halfWidth: null,
      apart: null,
      methods: [],
      source: null,
      evaluations: null,
      says: `There is no reference: ${reference.none}.`,
    };
  }
  const { value, halfWidth, apart, methods, evaluations } = reference;
  return {
    value,
    halfWidth,
    apart,
    methods,
    source: referenceSource,
    evaluations,
    says: `The scenario solved again in double-double arithmetic, some 31 digits, by ${methods.join(" and by ")}; they agree to ${apart.toPrecision(2)} ${unit}.`,
  };
}
