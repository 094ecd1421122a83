import { CallError } from "./call-error.js";

/** More threads than any machine has use for. */
const MOST_WORKERS = 256;

export const workersOption = {
  type: "string",
  requiresArg: true,
  describe: "Threads to work on; as many as cores when left out",
} as const;

/** @throws CallError */
export function threads(text: string): number {
  return wholeNumber("--workers", text, 1, MOST_WORKERS);
}

/** @throws CallError */
export function wholeNumber(option: string, text: string, least: number, most: number): number {
  const value = /^\d{1,10}$/.test(text) ? Number(text) : Number.NaN;
  if (!(value >= least && value <= most)) {
    throw new CallError(`${option}: found '${text}'; wanted a whole number from ${least} to ${most}`);
  }
  return value;
}
