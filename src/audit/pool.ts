import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";
import type { AnyJob, Done } from "./job.js";

/** Where jobs are done. */
export interface JobPool {
  run<J extends AnyJob>(job: J, signal?: AbortSignal): Promise<Done<J>>;
  close(): Promise<void>;
}

/**
 * A pool of worker threads; with `workers` 0, or where the built worker file is missing, the calling thread
 * does the work.
 */
export async function createPool(workers: number): Promise<JobPool> {
  const filename = fileURLToPath(new URL("./worker.js", import.meta.url));
  if (workers === 0 || !existsSync(filename)) return inThisThread();
  const { Tinypool } = await import("tinypool");
  const pool = new Tinypool({ filename, minThreads: workers, maxThreads: workers });
  return {
    run: (job, signal) => pool.run(job, signal === undefined ? {} : { signal }),
    close: () => pool.destroy(),
  };
}

function inThisThread(): JobPool {
  return {
    run: async (job, signal) => {
      signal?.throwIfAborted();
      const { default: runJob } = await import("./run-job.js");
      return runJob(job);
    },
    close: async () => {},
  };
}
