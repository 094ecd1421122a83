import type { ClaimResult, ResultFile } from "../result/result.js";

/**
 * The result file as JSON.
 *
 * @throws a defect: a figure that is not a number where the format asks for a number or null
 */
export function toJson(claims: readonly ClaimResult[]): string {
  const file: ResultFile = { format: "cupel/result-1", claims };
  const text = JSON.stringify(
    file,
    (key, value: unknown) => {
      if (typeof value === "number" && !Number.isFinite(value)) {
        throw new TypeError(`the result holds ${value} at '${key}'`);
      }
      return value;
    },
    2,
  );
  return `${text}\n`;
}
