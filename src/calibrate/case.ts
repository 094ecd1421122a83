import { toDouble } from "../arithmetic/double-double.js";
import { figureOf } from "../audit/figure.js";
import type { Outcome } from "../audit/job.js";
import type { JobPool } from "../audit/pool.js";
import { type Prepared, prepare } from "../audit/prepare.js";
import type { Claim } from "../claim/claim.js";
import { parseClaim } from "../claim/read.js";
import { lastBitEnsemble } from "../convergence/rounding.js";
import { EPSILON } from "../kernel/arithmetic.js";
import type { Draw } from "./draw.js";
import type { Known } from "./oracle.js";
import { type Quote, quote, quoteDigits } from "./quote.js";
import type { Random } from "./random.js";
import { truthOf } from "./truth.js";

/** A claim with all that is known of it from outside the audit. */
export interface Case {
  readonly draw: Draw;
  readonly claim: Claim;
  readonly known: Known;
  /** Half-width of the truth itself. */
  readonly truthHalfWidth: number;
  /** The claim as its author would have written it. */
  readonly text: string;
}

/** Halvings of the author's step that tell whether its figure converges. */
const HALVINGS = 3;
/** Perturbed runs that tell of rounding, and how many times their farthest may be exceeded. */
const PERTURBED = 3;
const ROUNDING_SHARE = 2;
/** Tens of roundings of a double, rad an orbit over the eccentricity. */
const DOUBLES_LEAVE = 3e-14;
/** Nobody quotes a margin finer than this part of the figure, or finer than this part of a radian an orbit. */
const FINEST_MARGIN = 1e-12;
const FINEST_ANGLE = 1e-15;

/**
 * Makes a claim of what was drawn: runs the author's solution, and quotes its figure.
 *
 * @returns null where the scenario cannot be run, or its truth is not known
 */
export async function makeCase(
  draw: Draw,
  random: Random,
  pool: JobPool,
  name: string,
): Promise<Case | null> {
  // What is quoted follows from the run; a placeholder stands for it until then.
  const placeholder = claimOf(draw, { text: `1 ${draw.unit}`, value: 1, halfWidth: 1 }, name);
  const prepared = prepare(placeholder.claim);
  if ("problem" in prepared) return null;
  const { unit } = placeholder.claim.claimed;
  const truth = truthOf(placeholder.claim, prepared);
  if (truth === null) return null;
  const { runs, ladders, rounding } = await authorsRuns(draw, placeholder.claim, prepared, pool);
  const perRadian = (unit.per === "orbit" ? 1 : unit.per / prepared.scenario.period) / unit.radians;
  const finest = Math.max(FINEST_ANGLE * perRadian, FINEST_MARGIN * Math.abs(toDouble(truth.value)));
  const quoted = quoteFor(draw, toDouble(truth.value), runs[0] ?? null, rounding, finest, random);
  const { claim, text } = claimOf(draw, quoted, name);
  return {
    draw,
    claim,
    text,
    truthHalfWidth: truth.halfWidth,
    known: {
      truth: toDouble(truth.value),
      claimed: { value: claim.claimed.value, halfWidth: claim.claimed.halfWidth },
      runs,
      ladders,
      rounding,
      isMistyped: draw.isMistyped,
      leftOpen: draw.withoutReference ? (DOUBLES_LEAVE / prepared.scenario.eccentricity) * perRadian : 0,
    },
  };
}

function claimOf(draw: Draw, quoted: Quote, name: string): { readonly claim: Claim; readonly text: string } {
  const text = JSON.stringify({
    cupel: "claim/1",
    title: `${name}, an invented system: ${draw.kind}`,
    claimed: { quantity: "apsidal-advance", value: quoted.text, baseline: draw.baseline },
    scenario: draw.scenario,
    solution: {
      method: draw.method.name,
      "steps-per-orbit": draw.stepsPerOrbit,
      arithmetic: draw.arithmetic,
    },
  });
  const read = parseClaim(new TextEncoder().encode(text), name);
  if (!read.ok) throw new TypeError(`a drawn claim cannot be read: ${JSON.stringify(read.problems)}`);
  // A claim file names a method; the slip is in the author's program.
  return { claim: { ...read.claim, solution: { ...read.claim.solution!, method: draw.method } }, text };
}

/** The author's own figure, the same at finer steps, and how far rounding moves it. */
async function authorsRuns(
  { method, arithmetic, baseline }: Draw,
  { claimed: { unit } }: Claim,
  { recipe, scenario, authorsStep }: Prepared,
  pool: JobPool,
): Promise<Pick<Known, "runs" | "ladders" | "rounding">> {
  const effects =
    baseline === "subtracted" && scenario.nullParameters !== null
      ? (["on", "off"] as const)
      : (["on"] as const);
  const evaluations = Number.POSITIVE_INFINITY;
  const members = lastBitEnsemble(scenario.state, EPSILON[arithmetic]).slice(0, PERTURBED);
  const step = authorsStep!;
  const starts = [
    ...Array.from({ length: HALVINGS + 1 }, (_, k) => ({ step: step / 2 ** k })),
    ...members.map((state) => ({ step, state })),
  ];
  const tasks = starts.flatMap((start) =>
    effects.map((effect) => ({ kind: "run" as const, effect, evaluations, ...start })),
  );
  const outcomes = await pool.run({ system: recipe, method, arithmetic, scenario, tasks });
  const read = (outcome: Outcome): number | null =>
    outcome.kind === "run" ? figureOf(outcome.reading, unit) : null;
  const ofEffect = (effect: number): (number | null)[] =>
    starts.map((_, i) => read(outcomes[i * effects.length + effect]!));
  const [on, off] = effects.map((_, effect) => ofEffect(effect)) as [(number | null)[], (number | null)[]?];
  const figures = on.map((value, i) => {
    if (off === undefined) return value;
    const base = off[i] ?? null;
    return value === null || base === null ? null : value - base;
  });
  const moved = (values: readonly (number | null)[]): number => {
    const [at = null] = values;
    const perturbed = values.slice(HALVINGS + 1);
    const distances = perturbed.map((value) => (value === null || at === null ? 0 : Math.abs(value - at)));
    return ROUNDING_SHARE * Math.max(...distances);
  };
  const ladder = (values: readonly (number | null)[]) => values.slice(0, HALVINGS + 1);
  return {
    runs: ladder(figures),
    ladders: [on, off].flatMap((values) =>
      values === undefined ? [] : [{ figures: ladder(values), rounding: moved(values) }],
    ),
    rounding: moved(figures),
  };
}

function quoteFor(
  { kind, unit }: Draw,
  truth: number,
  figure: number | null,
  rounding: number,
  finest: number,
  random: Random,
): Quote {
  // An author whose run gave nothing quotes what the equations should give.
  const value = figure ?? truth;
  const error = Math.max(Math.abs(value - truth) + rounding, finest);
  switch (kind) {
    case "sound":
      return quote(value, error * random.decades(5, 1000), unit);
    case "over-quoted":
      return quote(value, Math.max((error / 3) * random.decades(1e-3, 0.6), finest), unit);
    case "artefact":
      return value === 0 ? quote(0, error, unit) : quoteDigits(value, random.pick([2, 3, 4]), unit);
    case "contradicted": {
      const margin = Math.max(error * random.decades(0.1, 100), finest);
      const shift = (random.chance(0.5) ? 1 : -1) * (margin + error) * random.decades(2.5, 100);
      return quote(value + shift, margin, unit);
    }
  }
}
