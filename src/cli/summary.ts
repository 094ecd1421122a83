import { renderOverview, renderTerminal } from "../report/terminal.js";
import type { ClaimResult } from "../result/result.js";
import { mayColour } from "./output.js";

export interface SummaryStyle {
  /** One line a claim and nothing else. */
  readonly quiet: boolean;
  readonly colour: "auto" | "always" | "never";
}

const WIDEST = 80;
const NARROWEST = 40;

/**
 * The results in text: one claim in full; of several, whose pages hold the rest, a line each. Without pages
 * several are told in full too.
 *
 * @param page the page to open, null where none was written
 */
export function summarize(
  results: readonly ClaimResult[],
  page: string | null,
  { quiet, colour }: SummaryStyle,
): string {
  const { stdout } = process;
  const columns = stdout.isTTY ? Math.max(NARROWEST, stdout.columns || WIDEST) : WIDEST;
  const look = {
    width: Math.min(WIDEST, columns),
    colour: colour === "auto" ? mayColour(stdout) : colour === "always",
  };
  const lines = renderOverview(results, look);
  if (quiet) return lines;
  if (results.length === 1) return renderTerminal(results[0]!, page === null ? look : { ...look, page });
  if (page !== null) return `${lines}\nreport  ${page}\n`;
  const rule = `\n${"─".repeat(look.width)}\n\n`;
  return [...results.map((result) => renderTerminal(result, look)), lines].join(rule);
}
