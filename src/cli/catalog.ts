import type { Command } from "./command.js";
import { writeOut } from "./output.js";

export const catalog: Command = {
  options: {},
  attach: (program) =>
    program
      .example("cupel catalog methods", "Every method, with its order and source")
      .example("cupel catalog oblate", "One entry in full")
      .command(
        "$0 [what]",
        false,
        (yargs) =>
          yargs.positional("what", {
            type: "string",
            describe: "equations, methods, quantities, units, or the name of one entry",
          }),
        async ({ what }) => {
          const { catalogText } = await import("./catalog-text.js");
          await writeOut(catalogText(what));
        },
      ),
};
