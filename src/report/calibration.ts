import { type Calibration, type Coverage, type Share, verdicts } from "../result/calibration.js";
import type { Verdict } from "../result/result.js";
import { size } from "../result/words.js";
import { wrap } from "./text.js";

const WIDTH = 80;

/** A calibration as text of 80 columns: what held, the table of verdicts, every miss. */
export function calibrationText(calibration: Calibration): string {
  const { best, ladders, misses } = calibration;
  const lines = [
    `${calibration.claims} claims of invented systems with known truth, seed ${calibration.seed}, in ${size(calibration.seconds)} s.`,
    "",
    `resolved for a figure that is not      ${calibration.wrongResolved}`,
    `verdicts right                         ${share(calibration.verdicts)}`,
    `  where the rules leave but one       ${share(calibration.clearVerdicts)}`,
    `digits right, give or take one         ${share(calibration.digits)}`,
    "",
    "half-widths, 95 %            reach truth              times the error, median",
    covered("best value, reference", best.reference),
    covered("best value, extrapolation", best.extrapolation),
    covered("error of the solution", calibration.error),
    covered("witnesses' ladders together", calibration.fromLadders),
    covered("one ladder, asymptotic", ladders.asymptotic),
    covered("one ladder, any", ladders.all),
    "",
    ...table(calibration),
  ];
  for (const { name, what, right, verdict, reason } of misses) {
    const told = `${verdict}, where ${right.join(" or ")} is right. ${reason}`;
    lines.push("", `${name}: ${what.join(", ")}`, ...wrap(told, WIDTH - 2).map((line) => `  ${line}`));
  }
  return `${lines.join("\n")}\n`;
}

const percent = ({ held, of }: Share): string => (of === 0 ? "-" : `${((100 * held) / of).toFixed(2)} %`);
const share = (given: Share): string => `${percent(given).padStart(8)}   ${given.held} of ${given.of}`;

function covered(what: string, given: Coverage): string {
  const times = (ratio: number | null): string => (ratio === null ? "" : size(ratio));
  const above = given.tightnessAboveRounding;
  const ratio = times(given.tightness) + (above === null ? "" : `; ${times(above)} above rounding`);
  return `${what.padEnd(29)}${share(given).padEnd(25)}${ratio}`.trimEnd();
}

const HEADS: Readonly<Record<Verdict, string>> = {
  resolved: "resolved",
  "partly-resolved": "partly",
  "not-resolved": "not",
  contradicted: "contradicted",
  undetermined: "undetermined",
};

/** Right verdicts down, given ones across. */
function table({ confusion }: Calibration): string[] {
  const row = (label: string, cells: readonly string[]): string =>
    label.padEnd(18) + cells.map((cell, i) => cell.padStart(HEADS[verdicts[i]!].length + 2)).join("");
  return [
    row(
      "right, and given",
      verdicts.map((name) => HEADS[name]),
    ),
    ...verdicts.map((right) =>
      row(
        right,
        verdicts.map((given) => String(confusion[right][given] || "·")),
      ),
    ),
  ];
}
