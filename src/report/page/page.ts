import type { ClaimResult } from "../../result/result.js";
import { size } from "../../result/words.js";
import { stepsPerOrbit } from "../format.js";
import { clean } from "../text.js";
import { figureRows } from "./figures.js";
import { plotsOf } from "./plot-sections.js";
import { quoteOf } from "./quote.js";
import { rungTables } from "./rung-tables.js";
import { setupRows, sourceRows } from "./setup-rows.js";
import { template } from "./templates.js";
import { typeset } from "./typeset.js";
import { OUTCOME_TITLES, spaced, VERDICT_TITLES } from "./words.js";

/**
 * One claim as one HTML file: no network, nothing to load, complete without scripts. The same result gives the
 * same page.
 */
export async function renderPage(result: ClaimResult): Promise<string> {
  const [plots, render] = await Promise.all([plotsOf(result), template("claim")]);
  const { verdict, grade, gradeRule, claimed, setup, provenance } = result;
  return render({
    title: clean(result.title),
    file: clean(result.file),
    isUntitled: result.title === result.file,
    verdict: VERDICT_TITLES[verdict],
    // What is wrong with a claim that could not be read is told in the claim's own characters.
    reason: setup === null ? clean(result.reason) : typeset(clean(result.reason)),
    grade: grade ?? "",
    gradeRule: typeset(gradeRule),
    quote: quoteOf(result),
    quoted: claimed === null ? "" : quantityOf(claimed),
    unit: clean(claimed?.unit ?? ""),
    figures: figureRows(result),
    plots,
    effect: effectOf(result),
    remedy: remedyOf(result),
    checks: checkRows(result),
    ladders: rungTables(result),
    display: setup === null ? "" : clean(setup.equations.display),
    setup: setupRows(result),
    sources: sourceRows(result),
    provenance: {
      version: provenance.version,
      node: provenance.node,
      sha256: provenance.claimSha256,
      command: clean(provenance.command),
      seconds: provenance.seconds.toFixed(2),
    },
  });
}

const quantityOf = ({ quantity, baseline }: NonNullable<ClaimResult["claimed"]>): string =>
  `${spaced(quantity)} as claimed${baseline === "subtracted" ? ", a null run taken off" : ""}`;

/** On a problem without an effect the null run is the run itself. */
function effectOf({ ladders, passages }: ClaimResult): object {
  const own = ladders.find(({ role }) => role === "solution");
  const isTold = own?.rungs.some((rung) => rung.null !== null && rung.null !== rung.value) ?? false;
  return isTold || (own === undefined && passages?.null != null)
    ? { heading: "With the effect switched off", link: "Null run" }
    : { heading: "The figure against the step", link: "Steps" };
}

function checkRows({ checks }: ClaimResult): object[] {
  const small = (value: number | null): string => (value === null ? "" : typeset(size(value)));
  return checks.map(({ name, outcome, figure, limit, unit, says }) => ({
    name: spaced(name),
    outcome,
    outcomeWord: OUTCOME_TITLES[outcome],
    figure: small(figure),
    limit: limit === null ? "" : `limit ${small(limit)}`,
    unit: figure === null && limit === null ? "" : clean(unit),
    says: typeset(clean(says)),
  }));
}

function remedyOf({ remedy, setup }: ClaimResult): object | null {
  if (remedy === null) return null;
  return {
    says: typeset(clean(remedy.says)),
    costs:
      setup?.method == null
        ? "Cost in evaluations of the equations, the first line's being 1."
        : "Cost in evaluations of the equations, relative to the author's run.",
    options: remedy.options.map(({ method, step, stepsPerOrbit: count, relativeCost, basis }) => ({
      method,
      isAuthors: method === setup?.method?.name,
      step: clean(step),
      steps: /orbit/.test(step) ? "" : `${stepsPerOrbit(count)} steps an orbit`,
      cost: typeset(size(relativeCost)),
      basis: basis === "measured" ? "measured on a rung" : "extended along the fitted law",
    })),
  };
}
