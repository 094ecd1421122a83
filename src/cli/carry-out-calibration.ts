import { calibrate } from "../calibrate/calibrate.js";
import { calibrationText } from "../report/calibration.js";
import { tryWriting, writeTo } from "./destination.js";
import { writeOut } from "./output.js";
import { Progress } from "./progress.js";

interface Wanted {
  readonly seed: number;
  readonly claims: number;
  readonly workers: number;
  /** A file, `-` for standard output, or none. */
  readonly json: string | null;
}

/** Calibrates and writes what came out, whole or not at all. */
export async function carryOutCalibration({ json, ...wanted }: Wanted): Promise<void> {
  if (json !== null && json !== "-") await tryWriting(json);
  const progress = new Progress(process.stderr, true);
  const calibration = await calibrate({
    ...wanted,
    onProgress: (part) => progress.show(part, `${wanted.claims} claims`),
  }).finally(() => progress.clear());
  const text = `${JSON.stringify({ format: "cupel/calibration-1", ...calibration }, null, 2)}\n`;
  if (json !== null && json !== "-") await writeTo(json, text);
  await writeOut(json === "-" ? text : calibrationText(calibration));
}
