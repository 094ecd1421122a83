import { oneOf } from "../claim/nearest.js";
import { echo } from "../claim/problem.js";

/**
 * What the parser of arguments found, as every other error says it: the place, what was found, what would be
 * right.
 *
 * @param known names of the options that there are
 */
export function explainParsing(message: string, args: readonly string[], known: readonly string[]): string {
  const unknown = /^Unknown arguments?: (.+)$/.exec(message)?.[1]?.split(", ")[0];
  if (unknown !== undefined) {
    const option = args.find((arg) => arg.startsWith("-") && arg.replace(/^-+/, "").startsWith(unknown));
    if (option === undefined) return `found ${echo(unknown)} too much; wanted no more arguments`;
    const names = known.map((name) => `--${name}`);
    const given = option.replace(/=.*$/, "");
    return `found the unknown option ${echo(given)}; wanted ${names.length === 0 ? "none" : oneOf(given, names)}`;
  }
  const lacking = /^Not enough arguments following: (.+)$/.exec(message)?.[1];
  if (lacking !== undefined) return `--${lacking}: found nothing; wanted a value`;
  const [, name, given, choices] = /Argument: (\S+), Given: "(.*)", Choices: (.+)$/s.exec(message) ?? [];
  if (name !== undefined) {
    return `--${name}: found ${echo(given)}; wanted one of ${choices!.replaceAll('"', "")}`;
  }
  return message.replaceAll(/\s+/g, " ");
}
