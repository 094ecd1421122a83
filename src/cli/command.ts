import type { Argv, Options } from "yargs";

/** What a command's own file holds; it imports what is heavy when it runs. */
export interface Command {
  readonly options: Readonly<Record<string, Options>>;
  /** Adds arguments, examples and what the command does. */
  readonly attach: (program: Argv) => Argv;
}

interface Listed {
  readonly name: string;
  /** Its arguments as help shows them. */
  readonly takes: string;
  readonly does: string;
  readonly load: () => Promise<Command>;
}

export const commands: readonly Listed[] = [
  {
    name: "audit",
    takes: "CLAIM...",
    does: "Audit claims (files or globs): verdict, grade, report",
    load: async () => (await import("./audit.js")).audit,
  },
  {
    name: "calibrate",
    takes: "",
    does: "Audit the auditor: claims with known truth",
    load: async () => (await import("./calibrate.js")).calibrate,
  },
  {
    name: "catalog",
    takes: "[WHAT]",
    does: "Show equations, methods, quantities, units",
    load: async () => (await import("./catalog.js")).catalog,
  },
  {
    name: "schema",
    takes: "",
    does: "Print the JSON Schema of claim files",
    load: async () => (await import("./schema.js")).schema,
  },
];
