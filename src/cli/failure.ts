import { CallError } from "./call-error.js";
import { EXIT, leaveWith } from "./exit.js";
import { say } from "./output.js";

/** Tells of an error in its channel: a wrong call in a line each, a defect with the way to report it. */
export function tellFailure(error: unknown): void {
  if (error instanceof CallError) {
    for (const line of error.message.split("\n")) say(`cupel: ${line}`);
    leaveWith(EXIT.inputWrong);
    return;
  }
  const message = error instanceof Error ? error.message : String(error);
  say(`cupel: internal failure: ${message.split("\n")[0]}`);
  say("This is a defect of Cupel. Please report it with the command, the claim file");
  say("and what it prints when it is run again with CUPEL_DEBUG=1.");
  if (process.env.CUPEL_DEBUG === "1" && error instanceof Error) say(error.stack ?? "");
  leaveWith(EXIT.internalFailure);
}
