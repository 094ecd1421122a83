import type { ClaimResult } from "../../result/result.js";
import { size } from "../../result/words.js";
import { figureRows } from "./figures.js";
import { quotedDigits } from "./quoted-digits.js";
import { rungTables, stepsPerOrbit } from "./rung-tables.js";
import { setupRows, sourceRows } from "./setup-rows.js";
import { fill } from "./templates.js";
import { typeset } from "./typeset.js";
import { OUTCOMES, spaced, VERDICTS } from "./verdict-words.js";

/**
 * The report of one claim: a whole HTML page that needs no network and no script. The same result gives the
 * same page.
 */
export async function renderPage(result: ClaimResult): Promise<string> {
  const { verdict, grade, claimed, provenance } = result;
  return fill("page", {
    title: result.title,
    file: result.file === result.title ? "" : result.file,
    verdict,
    verdictWord: VERDICTS[verdict],
    reason: typeset(result.reason),
    grade: grade ?? "",
    gradeRule: typeset(result.gradeRule),
    digits: quotedDigits(result),
    claimed: claimed && { ...claimed, quantity: spaced(claimed.quantity) },
    figures: figureRows(result),
    checks: checkRows(result),
    remedy: remedyOf(result),
    ladders: rungTables(result),
    setup: setupRows(result),
    display: result.setup?.equations.display ?? "",
    sources: sourceRows(result),
    provenance: { ...provenance, file: result.file, seconds: provenance.seconds.toFixed(2) },
  });
}

function checkRows({ checks }: ClaimResult): object[] {
  const small = (value: number | null): string => (value === null ? "" : typeset(size(value)));
  return checks.map(({ name, outcome, figure, limit, unit, says }) => ({
    name: spaced(name),
    outcome,
    outcomeWord: OUTCOMES[outcome],
    figure: small(figure),
    limit: small(limit),
    unit: figure === null && limit === null ? "" : unit,
    says: typeset(says),
  }));
}

function remedyOf({ remedy, setup }: ClaimResult): object | null {
  if (remedy === null) return null;
  return {
    says: typeset(remedy.says),
    restated: remedy.restated ?? "",
    options: remedy.options.map(({ method, step, stepsPerOrbit: count, relativeCost, basis }) => ({
      method,
      isAuthors: method === setup?.method?.name,
      step,
      steps: stepsPerOrbit(count),
      cost: typeset(size(relativeCost)),
      basis: basis === "measured" ? "measured on a rung" : "extended along the fitted law",
    })),
  };
}
