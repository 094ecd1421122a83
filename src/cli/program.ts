import { CallError } from "./call-error.js";
import { commands } from "./command.js";
import { EXIT, leaveWith } from "./exit.js";
import { say, writeOut } from "./output.js";
import { overview } from "./overview.js";

/** Reads the call and carries out its command. */
export async function run(args: readonly string[]): Promise<void> {
  const [first, ...rest] = args;
  if (first === undefined) {
    say(overview());
    leaveWith(EXIT.inputWrong);
  } else if (first === "--help" || first === "-h" || first === "help") {
    await writeOut(overview());
  } else if (first === "--version") {
    const { version } = await import("./version.js");
    await writeOut(`${version()}\n`);
  } else {
    const command = commands.find(({ name }) => name === first);
    if (command === undefined) throw new CallError(await unknownCommand(first));
    const { carryOut } = await import("./parse.js");
    await carryOut(command, rest);
  }
}

async function unknownCommand(given: string): Promise<string> {
  const { echo } = await import("../claim/problem.js");
  const { oneOf } = await import("../claim/nearest.js");
  if (given.startsWith("-")) return `found ${echo(given)} before the command; wanted the command first`;
  const names = commands.map(({ name }) => name);
  return `found the unknown command ${echo(given)}; wanted ${oneOf(given, names)}`;
}
