import yargs from "yargs";
import { CallError } from "./call-error.js";
import type { commands } from "./command.js";
import { writeOut } from "./output.js";
import { explainParsing } from "./parsing-errors.js";

/** No line of help is longer, whatever the terminal. */
const WIDTH = 80;

/**
 * Parses the arguments of a command and runs it.
 *
 * @throws CallError for arguments that it does not take
 */
export async function carryOut(listed: (typeof commands)[number], args: readonly string[]): Promise<void> {
  const { name, takes, does } = listed;
  const { attach, options } = await listed.load();
  const program = attach(yargs([...args]))
    .scriptName(`cupel ${name}`)
    .parserConfiguration({
      "boolean-negation": false,
      "camel-case-expansion": false,
      "parse-numbers": false,
      "parse-positional-numbers": false,
    })
    .detectLocale(false)
    .exitProcess(false)
    .usage(`${`cupel ${name} ${takes}`.trimEnd()}\n\n${does}.`)
    .strict()
    .version(false)
    .help(false)
    .option("help", { type: "boolean", describe: "Show this text" })
    .wrap(WIDTH)
    .check((given) => {
      const twice = Object.keys(options).find((option) => Array.isArray(given[option]));
      if (twice !== undefined) throw new CallError(`--${twice}: found it twice; wanted it once`);
      return true;
    })
    .fail((message, error) => {
      // Its own errors come both ways: as a message, and as an error of its own class.
      if (error && error.name !== "YError") throw error;
      throw new CallError(explainParsing(message || error.message, args, Object.keys(options)));
    });
  if (args.includes("--help")) return writeOut(`${await program.getHelp()}\n`);
  await program.parseAsync();
}
