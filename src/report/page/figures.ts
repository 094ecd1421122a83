import type { ClaimResult } from "../../result/result.js";
import { size } from "../../result/words.js";
import { asWritten, bestShown, blanks, margin as marginOf, shown } from "../format.js";
import { typeset } from "./typeset.js";

/** One line of the table of figures. */
export interface FigureRow {
  readonly name: string;
  readonly value: string;
  /** Left blank behind the value, to set the points of the column in line. */
  readonly blank: string;
  /** Half-width, empty where there is none. */
  readonly margin: string;
  readonly note: string;
}

const NONE = "none";
const NO_SOLUTION = "the claim gives no solution";

/** The claimed and recomputed figures, all in the claim's unit. */
export function figureRows({
  claimed,
  asSolved,
  crossReading,
  best,
  setup,
}: ClaimResult): readonly FigureRow[] {
  if (claimed === null) return [];
  const fine = Math.max(best.halfWidth ?? 0, claimed.halfWidth / 1000);
  const number = (value: number | null): string => (value === null ? NONE : typeset(shown(value, fine)));
  const margin = (halfWidth: number | null): string =>
    halfWidth === null ? "" : `± ${typeset(size(halfWidth))}`;
  const subtracted = claimed.baseline === "subtracted";
  const row = (name: string, value: string, half: number | null, note: string) => ({
    name,
    value,
    margin: margin(half),
    note,
  });
  const rows = [
    {
      name: "claimed",
      value: typeset(asWritten(claimed)),
      margin: `± ${typeset(marginOf(claimed))}`,
      note: subtracted ? "a null run taken off, as the claim says" : "as it came out, no null run taken off",
    },
    row(
      "as solved",
      number(asSolved.value),
      null,
      setup?.method
        ? `${setup.method.name} at the author's step${subtracted ? ", less its null run" : ""}`
        : NO_SOLUTION,
    ),
    row(
      "null run",
      number(asSolved.null),
      null,
      setup?.method ? "the same method and step, the effect switched off" : NO_SOLUTION,
    ),
    ...(crossReading === null
      ? []
      : [
          row(
            "by the vector",
            typeset(shown(crossReading.value, crossReading.halfWidth / 100)),
            crossReading.halfWidth,
            "a second reading of the run: drift of the eccentricity vector, end less start",
          ),
        ]),
    row(
      "best value",
      best.value === null ? NONE : typeset(bestShown(best.value, best.halfWidth, claimed)),
      best.halfWidth,
      typeset(best.says),
    ),
    ...(best.from !== "reference" || best.extrapolated === null
      ? []
      : [
          row(
            "by the ladders",
            typeset(bestShown(best.extrapolated.value, best.extrapolated.halfWidth, claimed)),
            best.extrapolated.halfWidth,
            "where the witnesses' ladders lead, without the reference",
          ),
        ]),
    row(
      "numerical error",
      asSolved.error === null ? NONE : typeset(size(asSolved.error)),
      asSolved.halfWidth,
      setup?.method ? "as solved less the best value" : NO_SOLUTION,
    ),
  ];
  const behind = blanks(rows.map(({ value }) => value));
  return rows.map((one, k) => ({ ...one, blank: behind[k]! }));
}
