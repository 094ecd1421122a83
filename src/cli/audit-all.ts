import { type Auditor, createAuditor } from "../audit/audit.js";
import { undetermined, unreadable } from "../audit/undetermined.js";
import type { Claim } from "../claim/claim.js";
import type { ReadOutcome } from "../claim/read.js";
import { clean } from "../report/text.js";
import type { ClaimResult } from "../result/result.js";
import { tellFailure } from "./failure.js";
import { inOrder } from "./in-order.js";
import type { Progress } from "./progress.js";

/**
 * Audits claims on one pool of workers and yields their results in the order given.
 *
 * @param meanwhile called once, when the workers have work and this thread has none
 */
export async function* auditAll(
  outcomes: readonly ReadOutcome[],
  workers: number,
  progress: Progress,
  meanwhile: () => void,
): AsyncGenerator<ClaimResult, void, undefined> {
  const readable = outcomes.filter((outcome) => outcome.ok);
  const auditor = readable.length === 0 ? null : await createAuditor({ workers });
  const behind = outcomes.map(() => 0);
  let done = 0;
  let begun = false;
  const tell = (): void => {
    const part = behind.reduce((sum, next) => sum + next, 0) / readable.length;
    const what =
      readable.length === 1 ? clean(readable[0]!.claim.file) : `${done} of ${readable.length} claims done`;
    progress.show(part, what);
  };
  try {
    // One more than there are workers, so that none idles while a result is put together.
    yield* inOrder(outcomes, workers + 1, async (outcome, i) => {
      if (!outcome.ok) return unreadable(outcome);
      const result = await auditOne(auditor!, outcome.claim, progress, (part) => {
        behind[i] = part;
        tell();
        if (!begun) setImmediate(meanwhile);
        begun = true;
      });
      behind[i] = 1;
      done++;
      tell();
      return result;
    });
  } finally {
    progress.clear();
    await auditor?.close();
  }
}

/** A defect of ours that one claim brings out does not cost the others their audit. */
async function auditOne(
  auditor: Auditor,
  claim: Claim,
  progress: Progress,
  onProgress: (part: number) => void,
): Promise<ClaimResult> {
  try {
    return await auditor.audit(claim, { onProgress });
  } catch (error) {
    progress.clear();
    tellFailure(error);
    const message = error instanceof Error ? error.message : String(error);
    return undetermined(claim.file, `The audit failed by a defect of Cupel: ${message}`, claim, claim);
  }
}
