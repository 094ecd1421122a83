import type { ClaimResult } from "../../result/result.js";
import { clean } from "../text.js";
import { template } from "./templates.js";
import { VERDICT_TITLES } from "./words.js";

/** The page that leads to the pages of several claims. */
export async function renderIndex(
  entries: readonly { readonly result: ClaimResult; readonly href: string }[],
): Promise<string> {
  const render = await template("index");
  const counts = Object.entries(VERDICT_TITLES).flatMap(([kind, title]) => {
    const count = entries.filter(({ result }) => result.verdict === kind).length;
    return count === 0 ? [] : [`${count} ${title.toLowerCase()}`];
  });
  return render({
    counts: counts.join(", "),
    entries: entries.map(({ result, href }) => ({
      href: encodeURI(href),
      title: clean(result.title),
      file: clean(result.file),
      verdict: VERDICT_TITLES[result.verdict],
      kind: result.verdict,
      grade: result.grade ?? "none",
      claimed: result.claimed === null ? "" : clean(result.claimed.text),
      reason: clean(result.reason),
    })),
  });
}
