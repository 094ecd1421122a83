import { availableParallelism } from "node:os";
import { formatProblem } from "../claim/problem.js";
import type { ReadOutcome } from "../claim/read.js";
import { toJson } from "../report/json.js";
import { removeUnfinished } from "../report/write.js";
import type { ClaimResult } from "../result/result.js";
import { claimFiles } from "./claim-files.js";
import { tryWriting, writeTo } from "./destination.js";
import { EXIT, leaveWith } from "./exit.js";
import { interruptible } from "./interruption.js";
import { say, writeOut } from "./output.js";
import { Progress } from "./progress.js";
import { ReportFolder } from "./report-folder.js";
import { type SummaryStyle, summarize } from "./summary.js";

export interface AuditOptions extends SummaryStyle {
  /** Files and globs. */
  readonly claims: readonly string[];
  /** Threads; null for as many as there are cores. */
  readonly workers: number | null;
  /** Folder of the pages; null for none. */
  readonly out: string | null;
  /** File of the result, `-` for standard output; null for none. */
  readonly json: string | null;
}

/**
 * Reads claims, audits them, and writes summary, pages and result.
 *
 * @throws CallError
 */
export async function carryOut(options: AuditOptions): Promise<void> {
  const progress = new Progress(process.stderr, !options.quiet);
  let folder: ReportFolder | null = null;
  const cleanUp = (): void => {
    progress.clear();
    removeUnfinished();
    folder?.leave();
  };
  await interruptible(cleanUp, async () => {
    const files = await claimFiles(options.claims);
    // What cannot be written is known before the long work is done.
    if (options.json !== null && options.json !== "-") await tryWriting(options.json, files);
    if (options.out !== null) folder = await ReportFolder.open(options.out, files);
    await auditFiles(files, options, folder, progress);
  });
}

async function auditFiles(
  files: readonly string[],
  options: AuditOptions,
  folder: ReportFolder | null,
  progress: Progress,
): Promise<void> {
  const { readClaim } = await import("../claim/read.js");
  const outcomes: ReadOutcome[] = [];
  for (const file of files) {
    const outcome = await readClaim(file);
    if (!outcome.ok) for (const problem of outcome.problems) say(formatProblem(problem));
    outcomes.push(outcome);
  }
  if (outcomes.some(({ ok }) => !ok)) leaveWith(EXIT.inputWrong);
  if (options.json === null && outcomes.every(({ ok }) => !ok)) return;

  const { auditAll } = await import("./audit-all.js");
  const results: ClaimResult[] = [];
  const workers = options.workers ?? availableParallelism();
  for await (const result of auditAll(outcomes, workers, progress, () => folder?.prepare())) {
    results.push(result);
    if (result.setup === null && outcomes[results.length - 1]!.ok) {
      // A claim that reads well and cannot be run, such as one whose step is longer than its orbit.
      leaveWith(EXIT.inputWrong);
      say(`${result.file}: ${result.reason}`);
    }
    folder?.add(result);
    progress.clear();
  }
  const audited = results.some(({ setup }) => setup !== null);
  let page: string | null = null;
  try {
    if (audited && folder !== null) page = await folder.write();
  } finally {
    // The results are not lost with a page that cannot be written.
    if (audited && options.json !== "-") await writeOut(summarize(results, page, options));
    if (options.json === "-") await writeOut(toJson(results));
    else if (options.json !== null) await writeTo(options.json, toJson(results));
  }
}
