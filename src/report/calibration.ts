import { type Calibration, type Coverage, type Share, verdicts } from "../result/calibration.js";
import { size } from "../result/words.js";

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
    "half-widths, 95 %                      reach truth              by its error, median",
    covered("best value, reference", best.reference),
    covered("best value, extrapolation", best.extrapolation),
    covered("error of the author's solution", calibration.error),
    covered("witnesses' ladders together", calibration.fromLadders),
    covered("one ladder, asymptotic", ladders.asymptotic),
    covered("one ladder, any that gives a limit", ladders.all),
    "",
    ...table(calibration),
  ];
  for (const { name, what, right, verdict, reason } of misses) {
    lines.push(
      "",
      `${name}: ${what.join(", ")}`,
      `  ${verdict}, where ${right.join(" or ")} is right. ${reason}`,
    );
  }
  return `${lines.join("\n")}\n`;
}

const percent = ({ held, of }: Share): string => (of === 0 ? "-" : `${((100 * held) / of).toFixed(2)} %`);
const share = (given: Share): string => `${percent(given).padStart(8)}   ${given.held} of ${given.of}`;

function covered(what: string, given: Coverage): string {
  const times = (ratio: number | null): string => (ratio === null ? "" : size(ratio));
  const above = given.tightnessAboveRounding;
  const ratio = times(given.tightness) + (above === null ? "" : `, above rounding ${times(above)}`);
  return `${what.padEnd(39)}${share(given).padEnd(25)}${ratio}`.trimEnd();
}

/** Right verdicts down, given ones across. */
function table({ confusion }: Calibration): string[] {
  const width = 16;
  const head = `${"right \\ given".padEnd(width)}${verdicts.map((name) => name.padStart(width - 1)).join("")}`;
  return [
    head,
    ...verdicts.map(
      (right) =>
        `${right.padEnd(width)}${verdicts.map((given) => String(confusion[right][given] || "·").padStart(width - 1)).join("")}`,
    ),
  ];
}
