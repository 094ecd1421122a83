import type { ClaimResult } from "../../result/result.js";
import { plural } from "../../result/words.js";
import { clean } from "../text.js";
import { quoteOf } from "./quote.js";
import { template } from "./templates.js";
import { typeset } from "./typeset.js";
import { VERDICT_TITLES } from "./words.js";

/** The page that leads to the pages of several claims, in the order given. */
export async function renderIndex(
  entries: readonly { readonly result: ClaimResult; readonly href: string }[],
): Promise<string> {
  const render = await template("index");
  const counts = Object.entries(VERDICT_TITLES).flatMap(([kind, title]) => {
    const count = entries.filter(({ result }) => result.verdict === kind).length;
    return count === 0 ? [] : [`${count} ${title.toLowerCase()}`];
  });
  return render({
    heading: plural(entries.length, "claim"),
    counts: counts.join(", "),
    entries: entries.map(({ result, href }) => ({
      // A name with a colon in it is still a file beside this one.
      href: `./${href.split("/").map(encodeURIComponent).join("/")}`,
      title: clean(result.title),
      file: result.file === result.title ? "" : clean(result.file),
      verdict: VERDICT_TITLES[result.verdict],
      grade: result.grade ?? "",
      quote: quoteOf(result),
      reason: result.setup === null ? clean(result.reason) : typeset(clean(result.reason)),
    })),
  });
}
