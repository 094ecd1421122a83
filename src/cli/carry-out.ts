import { availableParallelism } from "node:os";
import { dirname, join } from "node:path";
import { type Auditor, createAuditor } from "../audit/audit.js";
import { unreadable } from "../audit/undetermined.js";
import { formatProblem } from "../claim/problem.js";
import { type ReadOutcome, readClaim } from "../claim/read.js";
import { toJson } from "../report/json.js";
import { renderOverview, renderTerminal } from "../report/terminal.js";
import { makeFolder, pageNames, removeUnfinished, WriteError, writeWhole } from "../report/write.js";
import type { ClaimResult } from "../result/result.js";
import { CallError } from "./call-error.js";
import { claimFiles } from "./claim-files.js";
import { EXIT, leaveWith } from "./exit.js";
import { mayColour, say, writeOut } from "./output.js";
import { Progress } from "./progress.js";

export interface AuditOptions {
  readonly claims: readonly string[];
  readonly out: string;
  readonly report: boolean;
  readonly json: string | undefined;
  readonly workers: number | undefined;
  readonly quiet: boolean;
}

const WIDTH = 80;

/** Reads the claims, audits them, writes summary, pages and data. */
export async function carryOut(options: AuditOptions): Promise<void> {
  try {
    await auditClaims(options);
  } catch (error) {
    if (error instanceof WriteError) throw new CallError(error.message);
    throw error;
  }
}

async function auditClaims(options: AuditOptions): Promise<void> {
  const workers = options.workers ?? availableParallelism();
  if (!Number.isInteger(workers) || workers < 1) {
    throw new CallError(`--workers ${options.workers}: wanted a whole number, 1 or more`);
  }
  const files = await claimFiles(options.claims);
  // What cannot be written is known before the long work is done.
  if (options.report) await makeFolder(options.out);
  if (options.json !== undefined && options.json !== "-") await tryWriting(options.json);

  const outcomes = await Promise.all(files.map(readClaim));
  for (const outcome of outcomes) {
    if (outcome.ok) continue;
    for (const problem of outcome.problems) say(formatProblem(problem));
    leaveWith(EXIT.inputWrong);
  }

  const interruption = new AbortController();
  const interrupt = (): void => {
    interruption.abort();
    removeUnfinished();
    say("\ncupel: interrupted; what was under way is not written");
    process.exit(EXIT.interrupted);
  };
  process.once("SIGINT", interrupt);
  process.once("SIGTERM", interrupt);
  const results = await auditAll(outcomes, workers, options, interruption.signal);
  process.off("SIGINT", interrupt);
  process.off("SIGTERM", interrupt);

  if (options.json === "-") await writeOut(toJson(results));
  else if (options.json !== undefined) await writeWhole(options.json, toJson(results));
}

async function auditAll(
  outcomes: readonly ReadOutcome[],
  workers: number,
  options: AuditOptions,
  signal: AbortSignal,
): Promise<ClaimResult[]> {
  const readable = outcomes.filter((outcome) => outcome.ok).length;
  const auditor = readable === 0 ? null : await createAuditor({ workers });
  const progress = new Progress(process.stderr, !options.quiet);
  const behind = outcomes.map(() => 0);
  const names = pageNames(outcomes.map((outcome) => (outcome.ok ? outcome.claim.file : outcome.file)));
  try {
    const results = await Promise.all(
      outcomes.map(async (outcome, i) => {
        const result = await auditOne(outcome, auditor, signal, (part) => {
          behind[i] = part;
          const total = behind.reduce((sum, next) => sum + next, 0) / Math.max(1, readable);
          progress.show(
            total,
            readable === 1 ? (outcome.ok ? outcome.claim.file : "") : `${readable} claims`,
          );
        });
        if (options.report) await writePage(result, join(options.out, names[i]!));
        return result;
      }),
    );
    progress.clear();
    if (options.report && results.length > 1) await writeIndex(results, names, options.out);
    if (options.json !== "-") await summarize(results, names, options);
    return results;
  } finally {
    progress.clear();
    await auditor?.close();
  }
}

async function auditOne(
  outcome: ReadOutcome,
  auditor: Auditor | null,
  signal: AbortSignal,
  onProgress: (part: number) => void,
): Promise<ClaimResult> {
  if (!outcome.ok) return unreadable(outcome);
  return auditor!.audit(outcome.claim, { signal, onProgress });
}

async function writePage(result: ClaimResult, path: string): Promise<void> {
  const { renderPage } = await import("../report/page/page.js");
  await writeWhole(path, await renderPage(result));
}

async function writeIndex(
  results: readonly ClaimResult[],
  names: readonly string[],
  out: string,
): Promise<void> {
  const { renderIndex } = await import("../report/page/index-page.js");
  const entries = results.map((result, i) => ({ result, href: names[i]! }));
  await writeWhole(join(out, "index.html"), await renderIndex(entries));
}

async function summarize(
  results: readonly ClaimResult[],
  names: readonly string[],
  { quiet, report, out }: AuditOptions,
): Promise<void> {
  const look = { width: WIDTH, colour: mayColour(process.stdout) };
  if (quiet) return writeOut(renderOverview(results, look));
  const pages = results.map((result, i) =>
    renderTerminal(result, { ...look, ...(report && { page: join(out, names[i]!) }) }),
  );
  const rule = `\n${"─".repeat(WIDTH)}\n\n`;
  const several = results.length > 1 ? `${rule}${renderOverview(results, look)}` : "";
  const index = several !== "" && report ? `\nindex  ${join(out, "index.html")}\n` : "";
  await writeOut(pages.join(rule) + several + index);
}

/** Fails now rather than after the work, where a file cannot be written. */
async function tryWriting(path: string): Promise<void> {
  await makeFolder(dirname(path));
  const { access, constants, stat } = await import("node:fs/promises");
  const about = await stat(path).catch(() => null);
  if (about?.isDirectory()) throw new CallError(`--json ${path}: that is a folder; wanted a file`);
  await access(dirname(path), constants.W_OK).catch(() => {
    throw new CallError(`--json ${path}: no permission to write there`);
  });
}
