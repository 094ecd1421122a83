import { commands } from "./command.js";

const EXAMPLES = [
  "cupel audit claim.yaml",
  "cupel audit 'claims/**/*.yaml' --out build/report --json build/result.json",
  "cupel catalog post-newtonian-1",
  "cupel schema > claim.schema.json",
];

/** What `cupel --help` prints. It needs no library, so that it is there at once. */
export function overview(): string {
  const calls = commands.map(({ name, takes }) => `cupel ${name} ${takes}`.trimEnd());
  const width = Math.max(...calls.map((call) => call.length));
  return `Audits figures read off orbit integrations: which of the quoted digits belong
to the equations, and which to the step, the method or the arithmetic.

Commands:
${commands.map(({ does }, i) => `  ${calls[i]!.padEnd(width)}  ${does}`).join("\n")}

Options:
  --help     This text; after a command, its own options and examples
  --version  The version

Examples:
${EXAMPLES.map((example) => `  ${example}`).join("\n")}

Exit codes: 0 done, 2 the input or the call is wrong, 3 an internal failure.
Cupel judges numerics only. It is no clearance for flight, navigation or
conjunction work.
`;
}
