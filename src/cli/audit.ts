import { CallError } from "./call-error.js";
import type { Command } from "./command.js";
import { threads, workersOption } from "./threads.js";

const options = {
  out: {
    type: "string",
    requiresArg: true,
    default: "cupel-report",
    describe: "Folder for the pages",
  },
  "no-report": { type: "boolean", describe: "Write no pages" },
  json: {
    type: "string",
    requiresArg: true,
    describe: "Write the result as JSON to this file; - is standard output, in place of the summary",
  },
  workers: workersOption,
  quiet: { type: "boolean", describe: "One line a claim, and no progress" },
  colour: {
    type: "string",
    requiresArg: true,
    choices: ["auto", "always", "never"],
    default: "auto",
    describe: "Colour in the summary; auto: on a terminal, unless NO_COLOR is set",
  },
} as const;

export const audit: Command = {
  options,
  attach: (program) =>
    program
      .example("cupel audit claim.yaml", "One claim; its page goes to cupel-report/")
      .example("cupel audit 'claims/**/*.yaml'", "Many claims, with an index page")
      .example("cupel audit claim.yaml --json -", "The result as JSON on standard output")
      .command(
        "$0 [claims..]",
        false,
        (yargs) =>
          yargs
            .positional("claims", {
              type: "string",
              array: true,
              describe: "Claim files, or globs in quotes",
            })
            .options(options),
        async ({ claims: named = [], _: afterDashes, workers, out, json, quiet, colour, ...given }) => {
          const claims = [...named, ...afterDashes.map(String)];
          if (claims.length === 0) {
            throw new CallError("found no claim to audit; wanted files or globs");
          }
          if (out === "") throw new CallError("--out: found nothing; wanted a folder");
          if (json === "") throw new CallError("--json: found nothing; wanted a file, or -");
          const count = workers === undefined ? null : threads(workers);
          const { carryOut } = await import("./carry-out.js");
          await carryOut({
            claims,
            workers: count,
            out: given["no-report"] ? null : out,
            json: json ?? null,
            quiet: quiet === true,
            colour,
          });
        },
      ),
};
