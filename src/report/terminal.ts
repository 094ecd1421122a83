import { styleText } from "node:util";
import type { BudgetPart, Check, ClaimResult, Ladder, Outcome, Rung, Verdict } from "../result/result.js";
import { BUDGET_WORDS, size, steps } from "../result/words.js";
import { apart, asWritten, bestShown, blanks, margin, shown, stepsPerOrbit } from "./format.js";
import { clean, columns, cut, padEnd, padStart, wrap } from "./text.js";

export interface TerminalOptions {
  /** Columns that no line exceeds; at least 40. */
  readonly width: number;
  readonly colour: boolean;
  /** Where the page is, if there is one. */
  readonly page?: string;
}

type Style = Parameters<typeof styleText>[0];
type Paint = (style: Style, text: string) => string;

const VERDICT_WORDS: Readonly<Record<Verdict, string>> = {
  resolved: "RESOLVED",
  "partly-resolved": "PARTLY RESOLVED",
  "not-resolved": "NOT RESOLVED",
  contradicted: "CONTRADICTED",
  undetermined: "UNDETERMINED",
};

/** Colour says again what the word says. */
const VERDICT_STYLES: Readonly<Record<Verdict, Style>> = {
  resolved: ["bold", "green"],
  "partly-resolved": ["bold", "yellow"],
  "not-resolved": ["bold", "red"],
  contradicted: ["bold", "red"],
  undetermined: ["bold"],
};

const OUTCOME_WORDS: Readonly<Record<Outcome, string>> = {
  pass: "passes",
  caution: "caution",
  fail: "fails",
  "not-checked": "unchecked",
};

const OUTCOME_STYLES: Readonly<Record<Outcome, Style>> = {
  pass: "green",
  caution: "yellow",
  fail: "red",
  "not-checked": "dim",
};

/** The result of one claim: the conclusion, then why, then the numbers. */
export function renderTerminal(result: ClaimResult, options: TerminalOptions): string {
  const { width } = options;
  const paint: Paint = options.colour
    ? (style, text) => styleText(style, text, { validateStream: false })
    : (_, text) => text;
  const sections = [
    heading(result, width, paint),
    wrap(clean(result.reason), width),
    figures(result, width),
    budget(result, width),
    checks(result.checks, width, paint),
    ladder(result, width, paint),
    remedy(result, width),
    footer(result, options),
  ];
  return `${sections
    .filter((lines) => lines.length > 0)
    .map((lines) => lines.join("\n"))
    .join("\n\n")}\n`;
}

/** `k of n quoted digits stand`, or nothing where that cannot be said. */
export function digitsInWords({ digits, claimed, verdict }: ClaimResult): string {
  if (digits === null || claimed === null || Math.abs(claimed.value) <= claimed.halfWidth) return "";
  if (verdict === "undetermined") return "";
  const stand = Math.min(digits, claimed.digits);
  return `${stand} of ${claimed.digits} quoted digits stand${stand === 1 ? "s" : ""}`;
}

function heading(result: ClaimResult, width: number, paint: Paint): string[] {
  const word = VERDICT_WORDS[result.verdict];
  const grade = result.grade === null ? "" : `grade ${result.grade}`;
  const rest = [grade, digitsInWords(result)].filter(Boolean);
  const isOneLine = [word, ...rest].join("   ").length <= width;
  const painted = paint(VERDICT_STYLES[result.verdict], word);
  return [
    ...(isOneLine ? [[painted, ...rest].join("   ")] : [painted, ...rest]),
    cut(clean(result.title), width),
    ...(result.title === result.file ? [] : [paint("dim", cut(clean(result.file), width))]),
  ];
}

function figures(
  { claimed, asSolved, crossReading, best, reference, setup }: ClaimResult,
  width: number,
): string[] {
  if (claimed === null) return [];
  const fine = Math.max(best.halfWidth ?? 0, claimed.halfWidth / 1000);
  const number = (value: number | null): string => (value === null ? "none" : shown(value, fine));
  const half = (value: number | null): string => (value === null ? "" : `± ${size(value)}`);
  const baseline = claimed.baseline === "subtracted" ? "less its null run" : "baseline included";
  const rows = [
    ["claimed", asWritten(claimed), `± ${margin(claimed)}`, `${clean(claimed.unit)}, ${baseline}`],
    ["as solved", number(asSolved.value), "", howSolved(setup)],
    [
      "null run",
      number(asSolved.null),
      "",
      setup?.method == null ? "no solution given" : "the effect switched off",
    ],
    ...(crossReading === null
      ? []
      : [
          [
            "by the vector",
            shown(crossReading.value, crossReading.halfWidth / 100),
            half(crossReading.halfWidth),
            "eccentricity vector, end less start",
          ],
        ]),
    [
      "best value",
      best.value === null ? "none" : bestShown(best.value, best.halfWidth, claimed),
      half(best.halfWidth),
      best.from === null ? "" : best.from === "reference" ? agreement(reference) : "by extrapolation",
    ],
    ...(best.from === "reference" && best.extrapolated !== null
      ? [
          [
            "by the ladders",
            bestShown(best.extrapolated.value, best.extrapolated.halfWidth, claimed),
            half(best.extrapolated.halfWidth),
            "the witnesses' limits alone",
          ],
        ]
      : []),
    [
      "error",
      asSolved.error === null ? "none" : size(asSolved.error),
      half(asSolved.halfWidth),
      "as solved less best",
    ],
  ];
  return table(inLine(rows, [1]), ["left", "right", "left", "left"], width);
}

/** How the reference was had, short enough for a line of figures. */
const agreement = (reference: ClaimResult["reference"]): string =>
  reference?.apart == null ? "by reference" : `reference, two methods ${size(reference.apart)} apart`;

/** The parts of the uncertainty, the dominant one named. */
function budget({ budget: parts, claimed }: ClaimResult, width: number): string[] {
  if (parts === null || claimed === null || parts.dominant === null) return [];
  const rest = (Object.keys(BUDGET_WORDS) as BudgetPart[])
    .filter((part) => part !== parts.dominant && parts[part] !== null)
    .map((part) => `${BUDGET_WORDS[part]} ${size(parts[part]!)}`);
  const most = `${BUDGET_WORDS[parts.dominant]} ${size(parts[parts.dominant]!)} ${clean(claimed.unit)}`;
  return wrap(`Budget: most is ${most}; ${rest.join(", ")}.`, width);
}

function howSolved(setup: ClaimResult["setup"]): string {
  if (setup?.method == null) return "no solution given";
  const { method, arithmetic, step, stepsPerOrbit: perOrbit } = setup;
  const isPerOrbit = step !== null && /orbit/.test(step);
  const count = perOrbit === null || isPerOrbit ? [] : [steps(perOrbit)];
  // A line has no room for the step as well; the checks name it.
  if (arithmetic === "single") return `${method.name} in single precision`;
  return [method.name, ...(step === null ? [] : [clean(step)]), ...count].join(", ");
}

function checks(list: readonly Check[], width: number, paint: Paint): string[] {
  const name = Math.max(...list.map((check) => check.name.length));
  const indent = 10 + name + 2;
  return list.flatMap(({ outcome, name: called, says }) => {
    const [first = "", ...rest] = wrap(clean(says), width - indent);
    const word = paint(OUTCOME_STYLES[outcome], padEnd(OUTCOME_WORDS[outcome], 10));
    return [`${word}${padEnd(called, name + 2)}${first}`, ...rest.map((line) => " ".repeat(indent) + line)];
  });
}

function ladder({ ladders, best, claimed }: ClaimResult, width: number, paint: Paint): string[] {
  const own = ladders.find(({ role }) => role === "solution") ?? ladders[0];
  if (own === undefined || claimed === null) return [];
  const rows = own.rungs.map((rung): string[] => [
    `${rung.isAuthors ? "> " : "  "}${stepsPerOrbit(rung.stepsPerOrbit)}`,
    rung.figure === null ? rung.status : shown(rung.figure, claimed.halfWidth / 100),
    apart(rung.figure, best.value),
    rung.null === null ? "" : size(rung.null),
    inWindow(own, rung) ? "window" : "",
  ]);
  return [
    ...wrap(`Ladder of ${clean(own.method)}. ${clean(own.says)}`, width),
    ...table(
      [["  steps/orbit", "figure", "less best", "null run", ""], ...inLine(rows, [1, 2, 3])],
      ["right", "right", "right", "right", "left"],
      width,
    ).map((line, i) => (i === 0 ? paint("dim", line) : line)),
  ];
}

function inWindow({ window, rungs }: Ladder, rung: Rung): boolean {
  const k = rungs.indexOf(rung);
  return window !== null && k >= window[0] && k <= window[1];
}

function remedy({ remedy: found }: ClaimResult, width: number): string[] {
  if (found === null) return [];
  const rows = found.options
    .slice(0, 4)
    .map(({ method, step, relativeCost, basis }) => [
      `  ${clean(method)}`,
      clean(step),
      `${size(relativeCost)} times the evaluations`,
      basis,
    ]);
  return [...wrap(clean(found.says), width), ...table(rows, ["left", "left", "left", "left"], width)];
}

function footer({ gradeRule, grade }: ClaimResult, { page, width }: TerminalOptions): string[] {
  return [
    ...(grade === null ? [] : wrap(`Grade ${grade}: ${clean(gradeRule)}`, width)),
    ...wrap(
      "This judges numerics only; it is no clearance for flight, navigation or conjunction work.",
      width,
    ),
    // A path is not broken: cut or in two it could not be opened. It has the line to itself where it is long.
    ...(page === undefined ? [] : where(clean(page), width)),
  ];
}

function where(page: string, width: number): string[] {
  const line = `report  ${page}`;
  return columns(line) <= width ? [line] : ["report", page];
}

/** Rows in which the numbers of some columns have their points in line. */
function inLine(rows: readonly (readonly string[])[], numeric: readonly number[]): string[][] {
  const set = rows.map((row) => [...row]);
  for (const i of numeric) {
    const behind = blanks(rows.map((row) => row[i] ?? ""));
    set.forEach((row, k) => {
      row[i] = `${row[i] ?? ""}${" ".repeat(behind[k]!.length)}`;
    });
  }
  return set;
}

/** Aligned columns, cut at the width. */
function table(
  rows: readonly (readonly string[])[],
  align: readonly ("left" | "right")[],
  width: number,
): string[] {
  const widths = align.map((_, i) => Math.max(0, ...rows.map((row) => columns(row[i] ?? ""))));
  return rows.map((row) =>
    cut(
      row
        .map((cell, i) => (align[i] === "right" ? padStart(cell, widths[i]!) : padEnd(cell, widths[i]!)))
        .join("  ")
        .trimEnd(),
      width,
    ),
  );
}

/** Several claims, one line each. */
export function renderOverview(results: readonly ClaimResult[], options: TerminalOptions): string {
  const paint: Paint = options.colour
    ? (style, text) => styleText(style, text, { validateStream: false })
    : (_, text) => text;
  return results
    .map((result) => {
      const word = paint(VERDICT_STYLES[result.verdict], padEnd(VERDICT_WORDS[result.verdict], 17));
      const grade = padEnd(result.grade ?? "-", 3);
      return `${word}${grade}${cut(clean(result.file), options.width - 20)}\n`;
    })
    .join("");
}
