import yargs, { type Argv } from "yargs";
import { CallError } from "./call-error.js";
import { EXIT, leaveWith } from "./exit.js";
import { say } from "./output.js";
import { schema } from "./schema.js";
import { version } from "./version.js";

/** Reads the call and carries out its command. Commands import what is heavy when they run. */
export async function run(args: readonly string[]): Promise<void> {
  const program = describe(args);
  if (args.length === 0) {
    say(await program.getHelp());
    leaveWith(EXIT.inputWrong);
    return;
  }
  await program.parseAsync();
}

function describe(args: readonly string[]): Argv {
  return yargs(args)
    .scriptName("cupel")
    .parserConfiguration({
      "boolean-negation": false,
      "camel-case-expansion": false,
      "duplicate-arguments-array": false,
      "parse-positional-numbers": false,
    })
    .detectLocale(false)
    .exitProcess(false)
    .usage("Finds out which digits of a figure read off an orbit integration stand.\n\ncupel COMMAND")
    .command(schema)
    .strict()
    .demandCommand(1, "no command given; see 'cupel --help'")
    .version(version())
    .help()
    .wrap(80)
    .fail((message, error) => {
      throw error ?? new CallError(message);
    });
}
