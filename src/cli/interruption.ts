import { constants } from "node:os";
import { EXIT } from "./exit.js";
import { say } from "./output.js";

const SIGNALS = ["SIGINT", "SIGTERM", "SIGHUP"] as const;

/**
 * Does work that a signal may end: the process then leaves at once, workers included.
 *
 * @param cleanUp done however the work ends; synchronous, so that nothing comes between it and the end
 */
export async function interruptible(cleanUp: () => void, work: () => Promise<void>): Promise<void> {
  const stop = (signal: (typeof SIGNALS)[number]): void => {
    cleanUp();
    say("cupel: interrupted");
    process.exit(EXIT.signal + constants.signals[signal]);
  };
  for (const signal of SIGNALS) process.once(signal, stop);
  process.once("exit", cleanUp);
  try {
    await work();
  } finally {
    cleanUp();
    process.off("exit", cleanUp);
    for (const signal of SIGNALS) process.off(signal, stop);
  }
}
