import { median } from "simple-statistics";
import { type Calibration, type Coverage, type Miss, type Share, verdicts } from "../result/calibration.js";
import type { ClaimResult, Verdict } from "../result/result.js";
import type { Case } from "./case.js";
import { isWrongResolved, rightDigits, rightVerdicts } from "./oracle.js";

/** What an audit made of a case. */
export interface Scored {
  readonly name: string;
  readonly case: Case;
  readonly result: ClaimResult;
  readonly right: readonly Verdict[];
  readonly verdictIsRight: boolean;
  readonly isWrongResolved: boolean;
  /** Null where there was nothing to cover. */
  readonly bestCovers: boolean | null;
  readonly errorCovers: boolean | null;
  readonly digitsAreRight: boolean | null;
}

/** Holds the result of an audit against what is known of its claim. */
export function score(name: string, given: Case, result: ClaimResult): Scored {
  const { known, truthHalfWidth } = given;
  const right = rightVerdicts(known);
  const { best, asSolved, verdict, digits } = result;
  const off = best.value === null ? null : Math.abs(best.value - known.truth);
  const trueError = figureOf(known) === null ? null : figureOf(known)! - known.truth;
  const possible = rightDigits(known);
  return {
    name,
    case: given,
    result,
    right: [...right],
    verdictIsRight: right.has(verdict),
    isWrongResolved: verdict === "resolved" && isWrongResolved(known),
    bestCovers: off === null ? null : off <= best.halfWidth! + slack(known.truth, truthHalfWidth),
    errorCovers:
      asSolved.error === null || trueError === null
        ? null
        : Math.abs(asSolved.error - trueError) <= asSolved.halfWidth! + slack(trueError, truthHalfWidth),
    digitsAreRight:
      digits === null || possible.length === 0
        ? null
        : digits >= Math.min(...possible) - 1 && digits <= Math.max(...possible) + 1,
  };
}

const figureOf = ({ runs }: Case["known"]): number | null => runs[0] ?? null;

/** What the truth, written as a double, leaves open. */
const slack = (value: number, halfWidth: number): number => halfWidth + Number.EPSILON * Math.abs(value);

/** Adds scores up. */
export function summarise(seed: number, scored: readonly Scored[], seconds: number): Calibration {
  const share = (answers: readonly (boolean | null)[]): Share => {
    const given = answers.filter((answer) => answer !== null);
    return { of: given.length, held: given.filter(Boolean).length };
  };
  const confusion = Object.fromEntries(
    verdicts.map((right) => [
      right,
      Object.fromEntries(
        verdicts.map((given) => [
          given,
          scored.filter(({ right: all, verdictIsRight, result }) => {
            const expected = verdictIsRight ? result.verdict : all[0];
            return expected === right && result.verdict === given;
          }).length,
        ]),
      ),
    ]),
  ) as unknown as Calibration["confusion"];
  const bestFrom = (from: "reference" | "extrapolation"): Coverage =>
    coverage(
      scored.flatMap(({ result: { best }, case: { known, truthHalfWidth } }) =>
        best.from === from ? [{ value: best.value!, halfWidth: best.halfWidth!, known, truthHalfWidth }] : [],
      ),
    );
  const ladders = scored.flatMap(({ result, case: { known, truthHalfWidth } }) =>
    result.ladders.flatMap(({ extrapolated, shape, role, floor }) =>
      // The limit of a mistyped method is none of the equations'.
      extrapolated === null || (role === "solution" && known.isMistyped)
        ? []
        : [{ ...extrapolated, shape, known, truthHalfWidth, floor }],
    ),
  );
  return {
    seed,
    claims: scored.length,
    wrongResolved: scored.filter((one) => one.isWrongResolved).length,
    verdicts: share(scored.map((one) => one.verdictIsRight)),
    clearVerdicts: share(scored.filter(({ right }) => right.length === 1).map((one) => one.verdictIsRight)),
    best: { reference: bestFrom("reference"), extrapolation: bestFrom("extrapolation") },
    fromLadders: coverage(
      scored.flatMap(({ result: { best }, case: { known, truthHalfWidth } }) =>
        best.extrapolated === null ? [] : [{ ...best.extrapolated, known, truthHalfWidth }],
      ),
    ),
    ladders: {
      asymptotic: coverage(ladders.filter(({ shape }) => shape === "asymptotic")),
      all: coverage(ladders),
    },
    error: {
      ...coverage(
        scored.flatMap(({ result: { asSolved }, case: { known, truthHalfWidth } }) =>
          asSolved.error === null || figureOf(known) === null
            ? []
            : [
                {
                  value: asSolved.error,
                  halfWidth: asSolved.halfWidth!,
                  known: { truth: figureOf(known)! - known.truth },
                  truthHalfWidth,
                },
              ],
        ),
      ),
    },
    digits: share(scored.map((one) => one.digitsAreRight)),
    confusion,
    misses: scored.flatMap(missOf),
    seconds,
  };
}

interface Interval {
  readonly value: number;
  readonly halfWidth: number;
  readonly known: { readonly truth: number };
  readonly truthHalfWidth: number;
  readonly floor?: number | null;
}

function coverage(intervals: readonly Interval[]): Coverage {
  const errors = intervals.map(({ value, known: { truth } }) => Math.abs(value - truth));
  const open = intervals.map(({ known: { truth }, truthHalfWidth }) => slack(truth, truthHalfWidth));
  const held = intervals.filter(({ halfWidth }, i) => errors[i]! <= halfWidth + open[i]!).length;
  // An error that the truth's own half-width may have made says nothing of tightness.
  const tightness = (above: (interval: Interval, i: number) => number): number | null => {
    const ratios = intervals.flatMap((interval, i) =>
      errors[i]! > above(interval, i) ? [interval.halfWidth / errors[i]!] : [],
    );
    return ratios.length === 0 ? null : median(ratios);
  };
  return {
    of: intervals.length,
    held,
    tightness: tightness((_, i) => 10 * open[i]!),
    tightnessAboveRounding: tightness(({ floor }, i) => Math.max(10 * open[i]!, floor ?? Infinity)),
  };
}

function missOf(one: Scored): Miss[] {
  const what = [
    ...(one.isWrongResolved ? ["wrong resolved"] : []),
    ...(one.verdictIsRight ? [] : ["verdict"]),
    ...(one.bestCovers === false ? ["best value"] : []),
    ...(one.errorCovers === false ? ["error"] : []),
    ...(one.digitsAreRight === false ? ["digits"] : []),
  ];
  if (what.length === 0) return [];
  const { name, right, result, case: given } = one;
  return [
    {
      name,
      what,
      right,
      verdict: result.verdict,
      reason: result.reason,
      claim: given.text,
      method: given.draw.isMistyped ? given.draw.method : given.draw.method.name,
    },
  ];
}
