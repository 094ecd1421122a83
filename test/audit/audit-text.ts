import { createAuditor } from "../../src/audit/audit.js";
import { formatProblem } from "../../src/claim/problem.js";
import { parseClaim } from "../../src/claim/read.js";
import type { ClaimResult } from "../../src/result/result.js";

/** Audits a claim given as text, in the calling thread. */
export async function auditText(text: string): Promise<ClaimResult> {
  const read = parseClaim(new TextEncoder().encode(text), "claim.yaml");
  if (!read.ok) throw new Error(read.problems.map(formatProblem).join("\n"));
  const auditor = await createAuditor({ workers: 0 });
  try {
    return await auditor.audit(read.claim);
  } finally {
    await auditor.close();
  }
}

/** The orbit of Mercury at first post-Newtonian order. */
export const mercury = (value: string, method: string, baseline: string, steps = 256): string => `
cupel: claim/1
title: Mercury
claimed: { quantity: apsidal-advance, value: ${value} arcsec/century, baseline: ${baseline} }
scenario:
  equations: post-newtonian-1
  parameters: { GM: 1.32712440018e20 m^3/s^2, c: 299792458 m/s }
  start: { semi-major-axis: 0.38709893 au, eccentricity: 0.20563 }
  span: 20 orbits
solution: { method: ${method}, steps-per-orbit: ${steps} }
`;

export const keplerLeapfrog = (steps: number): string => `
cupel: claim/1
title: Leapfrog on a Kepler orbit
claimed: { quantity: apsidal-advance, value: 0.00(1) arcsec/orbit }
scenario:
  equations: newtonian
  parameters: { GM: 1.32712440018e20 m^3/s^2 }
  start: { semi-major-axis: 1 au, eccentricity: 0.3 }
  span: 100 orbits
solution: { method: leapfrog, steps-per-orbit: ${steps} }
audit: { witnesses: [dormand-prince-8, gauss-legendre-6], rungs: 8 }
`;
