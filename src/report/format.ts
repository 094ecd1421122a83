import type { ClaimResult } from "../result/result.js";
import { figure, size } from "../result/words.js";

/** How terminal and page write numbers: the same words in both. */

/**
 * A figure to the digits that its half-width leaves. One that lies within its half-width keeps three digits:
 * it is not known to be anything else than nought, but it is not nought.
 */
export function shown(value: number, halfWidth: number): string {
  return Math.abs(value) <= halfWidth ? size(value) : figure(value, halfWidth);
}

/** The best value to the digits that it has, or as many as it takes to compare it with the claim. */
export const bestShown = (
  value: number,
  halfWidth: number | null,
  claimed: NonNullable<ClaimResult["claimed"]>,
): string => shown(value, Math.max(halfWidth ?? 0, claimed.halfWidth / 20));

/** A distance from the best value to a size in words; null where one of the two is missing. */
export function apart(value: number | null, best: number | null): string {
  return value === null || best === null ? "" : size(value - best);
}

/** The claimed value with the noughts at its end, where the claim writes it without an exponent. */
export function asWritten({ text, value }: NonNullable<ClaimResult["claimed"]>): string {
  const written = /^[-+\u2212]?[\d.]+(?=[\s(±+°]|$)/u.exec(text.trim())?.[0];
  return written !== undefined && Number(written.replace("\u2212", "-")) === value ? written : String(value);
}

/** The margin as the author gave it, without digits of ours. */
export const margin = ({ halfWidth }: NonNullable<ClaimResult["claimed"]>): string =>
  String(Number(halfWidth.toPrecision(3)));

/**
 * What has to stand behind each of a column's numbers, set flush right, for their points to be in line: a point
 * and noughts, to be left blank. Nothing behind what is no plain number.
 */
export function blanks(column: readonly string[]): readonly string[] {
  const fractions = column.map((text) => /^[-−]?\d+(\.\d+)?$/.exec(text)?.[1]?.length ?? 0);
  const longest = Math.max(0, ...fractions);
  return column.map((text, k) => {
    if (!/^[-−]?\d+(\.\d+)?$/.test(text)) return "";
    const missing = longest - fractions[k]!;
    if (missing === 0) return "";
    return fractions[k] === 0 ? `.${"0".repeat(missing - 1)}` : "0".repeat(missing);
  });
}

/** A whole number in groups of three from five digits on, as ISO 80000-1 has it: 328 004. */
export function grouped(count: number, space: string): string {
  const digits = String(count);
  return digits.length < 5 ? digits : digits.replaceAll(/\B(?=(\d{3})+$)/g, space);
}

/** Steps an orbit to four digits. */
export const stepsPerOrbit = (steps: number): string => String(Number(steps.toPrecision(4)));
