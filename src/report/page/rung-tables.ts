import type { ClaimResult, Ladder, Rung } from "../../result/result.js";
import { size } from "../../result/words.js";
import { apart, blanks, grouped, shown, stepsPerOrbit } from "../format.js";
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
  /** Left blank behind the figure, to set the points of the column in line. */
  readonly blank: string;
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
  return ladders.toSorted((a, b) => own(a) - own(b)).map((ladder) => tableOf(ladder, claimed, best.value));
}

function tableOf(
  ladder: Ladder,
  claimed: NonNullable<ClaimResult["claimed"]>,
  best: number | null,
): RungTable {
  const rows = ladder.rungs.map((rung, k) =>
    rowOf(rung, {
      fine: Math.max(ladder.floor ?? 0, rung.standardError ?? 0, claimed.halfWidth / 1000),
      best,
      inWindow: ladder.window !== null && k >= ladder.window[0] && k <= ladder.window[1],
    }),
  );
  const behind = blanks(rows.map((row) => row.figure));
  return {
    method: ladder.method,
    role: ladder.role === "solution" ? "the author's method" : "witness",
    says: typeset(ladder.says),
    limit: limitOf(ladder),
    orders: ordersOf(ladder, claimed.unit),
    isSolution: ladder.role === "solution",
    hasNull: ladder.rungs.some((rung) => rung.null !== null),
    rows: rows.map((row, k) => ({ ...row, blank: behind[k]! })),
  };
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
    : typeset(`limit ${shown(extrapolated.value, extrapolated.halfWidth)} ± ${size(extrapolated.halfWidth)}`);

interface RowContext {
  readonly fine: number;
  readonly best: number | null;
  readonly inWindow: boolean;
}

function rowOf(rung: Rung, { fine, best, inWindow }: RowContext): Omit<RungRow, "blank"> {
  const small = (value: number | null): string => (value === null ? "" : typeset(size(value)));
  return {
    steps: stepsPerOrbit(rung.stepsPerOrbit),
    figure: rung.figure === null ? "" : typeset(shown(rung.figure, fine)),
    apart: typeset(apart(rung.figure, best)),
    null: small(rung.null),
    standardError: small(rung.standardError),
    stateDifference: small(rung.stateDifference),
    evaluations: grouped(rung.evaluations, "\u202f"),
    seconds: rung.seconds < 0.001 ? "< 0.001" : rung.seconds.toFixed(3),
    isAuthors: rung.isAuthors,
    note: [
      ...(rung.isAuthors ? ["author's"] : []),
      ...(rung.status === "ok" ? [] : [STATUS_WORDS[rung.status]]),
      ...(inWindow ? ["window"] : []),
    ].join(", "),
  };
}
