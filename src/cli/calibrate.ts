import { availableParallelism } from "node:os";
import { CallError } from "./call-error.js";
import type { Command } from "./command.js";
import { threads, wholeNumber, workersOption } from "./threads.js";

const LARGEST_SEED = 2 ** 31 - 1;
const MOST_CLAIMS = 1_000_000;

const options = {
  seed: {
    type: "string",
    requiresArg: true,
    default: "1",
    describe: "The same seed gives the same claims",
  },
  claims: { type: "string", requiresArg: true, default: "1000", describe: "How many" },
  json: {
    type: "string",
    requiresArg: true,
    describe: "Write the figures as JSON to this file; - is standard output, in place of the text",
  },
  workers: workersOption,
} as const;

export const calibrate: Command = {
  options,
  attach: (program) =>
    program
      .example("cupel calibrate", "A thousand claims with known truth, and how their audits did")
      .example("cupel calibrate --seed 7 --claims 200", "Two hundred others")
      .command(
        "$0",
        false,
        (yargs) => yargs.options(options),
        async ({ seed, claims, json, workers }) => {
          if (json === "") throw new CallError("--json: found nothing; wanted a file, or -");
          const { carryOutCalibration } = await import("./carry-out-calibration.js");
          await carryOutCalibration({
            seed: wholeNumber("--seed", seed, 0, LARGEST_SEED),
            claims: wholeNumber("--claims", claims, 1, MOST_CLAIMS),
            workers: workers === undefined ? availableParallelism() : threads(workers),
            json: json ?? null,
          });
        },
      ),
};
