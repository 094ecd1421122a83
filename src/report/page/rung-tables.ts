import type { ClaimResult, Ladder, Rung } from "../../result/result.js";
import { figure, size } from "../../result/words.js";
import { typeset } from "./typeset.js";
import { STATUS_WORDS } from "./words.js";

export interface RungTable {
  readonly method: string;
  readonly role: string;
  readonly says: string;
  readonly limit: string;
  /** Orders and rounding in a line. */
  readonly orders: string;
  readonly isSolution: boolean;
  readonly hasNull: boolean;
  readonly rows: readonly RungRow[];
}

interface RungRow {
  readonly steps: string;
  readonly figure: string;
  readonly apart: string;
  readonly null: string;
  readonly standardError: string;
  readonly stateDifference: string;
  readonly evaluations: string;
  readonly seconds: string;
  readonly isAuthors: boolean;
  /** How it ended where it did not end well; whether it is the author's step; whether it is in the window. */
  readonly note: string;
}

/** Every ladder with every rung, the solution's first. */
export function rungTables({ ladders, claimed, best }: ClaimResult): readonly RungTable[] {
  if (claimed === null) return [];
  const own = (ladder: Ladder): number => (ladder.role === "solution" ? 0 : 1);
  return ladders
    .toSorted((a, b) => own(a) - own(b))
    .map((ladder) => ({
      method: ladder.method,
      role: ladder.role === "solution" ? "the author's method" : "witness",
      says: typeset(ladder.says),
      limit: limitOf(ladder),
      orders: ordersOf(ladder, claimed.unit),
      isSolution: ladder.role === "solution",
      hasNull: ladder.rungs.some((rung) => rung.null !== null),
      rows: ladder.rungs.map((rung, k) =>
        rowOf(rung, {
          fine: Math.max(ladder.floor ?? 0, rung.standardError ?? 0, claimed.halfWidth / 1000),
          best: best.value,
          inWindow: ladder.window !== null && k >= ladder.window[0] && k <= ladder.window[1],
        }),
      ),
    }));
}

function ordersOf(
  { formalOrder, stateOrder, figureOrder, figureOrderInterval: interval, floor }: Ladder,
  unit: string,
): string {
  const range = interval === null ? "" : ` (95 %: ${interval[0].toFixed(2)} to ${interval[1].toFixed(2)})`;
  const parts = [
    `Formal order ${formalOrder}`,
    stateOrder === null ? "no state order measured" : `state order ${stateOrder.toFixed(2)}`,
    figureOrder === null ? "no figure order measured" : `figure order ${figureOrder.toFixed(2)}${range}`,
    floor === null ? "rounding not measured" : `rounding worth ${size(floor)} ${unit} at the finest rung`,
  ];
  return typeset(`${parts.join("; ")}.`);
}

const limitOf = ({ extrapolated }: Ladder): string =>
  extrapolated === null
    ? "no limit"
    : typeset(
        `limit ${figure(extrapolated.value, extrapolated.halfWidth)} ± ${size(extrapolated.halfWidth)}`,
      );

interface RowContext {
  readonly fine: number;
  readonly best: number | null;
  readonly inWindow: boolean;
}

function rowOf(rung: Rung, { fine, best, inWindow }: RowContext): RungRow {
  const small = (value: number | null): string => (value === null ? "" : typeset(size(value)));
  return {
    steps: stepsPerOrbit(rung.stepsPerOrbit),
    figure: rung.figure === null ? "" : typeset(figure(rung.figure, fine)),
    apart: rung.figure === null || best === null ? "" : small(rung.figure - best),
    null: small(rung.null),
    standardError: small(rung.standardError),
    stateDifference: small(rung.stateDifference),
    evaluations: String(rung.evaluations),
    seconds: rung.seconds < 0.001 ? "< 0.001" : rung.seconds.toFixed(3),
    isAuthors: rung.isAuthors,
    note: [
      ...(rung.isAuthors ? ["author's"] : []),
      ...(rung.status === "ok" ? [] : [STATUS_WORDS[rung.status]]),
      ...(inWindow ? ["window"] : []),
    ].join(", "),
  };
}

/** Steps an orbit to four digits. */
export const stepsPerOrbit = (steps: number): string => String(Number(steps.toPrecision(4)));
