import type { ClaimResult, ResultFile } from "../result/result.js";

/**
 * The result file as JSON: every number in full, keys in the order of the format, null where there is nothing.
 *
 * @throws TypeError a defect: a value that JSON would drop or turn into null, with its path
 */
export function toJson(claims: readonly ClaimResult[]): string {
  const file: ResultFile = { format: "cupel/result-1", claims };
  hold(file, "");
  return `${JSON.stringify(file, null, 2)}\n`;
}

/** JSON has no NaN and no infinity and would make them null; an undefined field it would leave out. */
function hold(value: unknown, path: string): void {
  if (value === null || typeof value === "string" || typeof value === "boolean") return;
  if (typeof value === "number" && Number.isFinite(value)) return;
  if (typeof value !== "object") {
    throw new TypeError(`the result holds ${String(value)} at ${path === "" ? "its root" : path}`);
  }
  for (const [key, part] of Object.entries(value)) {
    hold(part, Array.isArray(value) ? `${path}[${key}]` : path === "" ? key : `${path}.${key}`);
  }
}
