import { findMethod } from "../methods/catalog/index.js";
import type { MethodDefinition } from "../methods/definition.js";
import type { AuditSettings } from "./claim.js";
import type { Reporter } from "./reporter.js";
import type { PartialClaim } from "./schema.js";

const DEFAULT_RUNGS = 8;

/** How to audit: witnesses are independent methods, each once. */
export function readAuditSettings({ audit, solution }: PartialClaim, report: Reporter): AuditSettings {
  const names = audit?.witnesses ?? null;
  names?.forEach((name, i) => {
    const path = ["audit", "witnesses", i];
    if (name === solution?.method) {
      report.at(path, { found: `the author's own method, ${name}`, wanted: "an independent method" });
    } else if (names.indexOf(name) < i) {
      report.at(path, { found: `${name} for the second time`, wanted: "each witness once" });
    }
  });
  const witnesses = names
    ?.map(findMethod)
    .filter((method): method is MethodDefinition => method !== undefined);
  return { witnesses: witnesses ?? null, rungs: audit?.rungs ?? DEFAULT_RUNGS };
}
