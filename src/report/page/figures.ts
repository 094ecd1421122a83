import type { ClaimResult } from "../../result/result.js";
import { bestInWords, figure, size } from "../../result/words.js";
import { typeset } from "./typeset.js";

/** One line of the table of figures. */
export interface FigureRow {
  readonly name: string;
  readonly value: string;
  /** Half-width, empty where there is none. */
  readonly margin: string;
  readonly note: string;
}

const NONE = "none";
const NO_SOLUTION = "the claim gives no solution";

/** With the noughts at its end, where it is written without an exponent. */
function asWritten({ text, value }: NonNullable<ClaimResult["claimed"]>): string {
  const written = /^[-+\u2212]?[\d.]+(?=[\s(±+°]|$)/u.exec(text.trim())?.[0];
  return written !== undefined && Number(written.replace("\u2212", "-")) === value ? written : String(value);
}

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
  const number = (value: number | null): string => {
    if (value === null) return NONE;
    // What is below every digit of interest still is not nothing.
    return typeset(Math.abs(value) <= fine ? size(value) : figure(value, fine));
  };
  const margin = (halfWidth: number | null): string =>
    halfWidth === null ? "" : `± ${typeset(size(halfWidth))}`;
  const subtracted = claimed.baseline === "subtracted";
  const row = (name: string, value: string, half: number | null, note: string): FigureRow => ({
    name,
    value,
    margin: margin(half),
    note,
  });
  return [
    {
      name: "claimed",
      value: typeset(asWritten(claimed)),
      // As the author gave it, without digits of ours.
      margin: `± ${typeset(String(Number(claimed.halfWidth.toPrecision(3))))}`,
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
            typeset(figure(crossReading.value, crossReading.halfWidth / 100)),
            crossReading.halfWidth,
            "a second reading of the run: drift of the eccentricity vector, end less start",
          ),
        ]),
    row(
      "best value",
      best.value === null
        ? NONE
        : typeset(bestInWords({ value: best.value, halfWidth: best.halfWidth ?? 0 }, claimed)),
      best.halfWidth,
      typeset(best.says),
    ),
    row(
      "numerical error",
      asSolved.error === null ? NONE : typeset(size(asSolved.error)),
      asSolved.halfWidth,
      setup?.method ? "as solved less the best value" : NO_SOLUTION,
    ),
  ];
}
