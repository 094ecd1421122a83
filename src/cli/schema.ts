import type { Command } from "./command.js";
import { writeOut } from "./output.js";

export const schema: Command = {
  options: {},
  attach: (program) =>
    program
      .example("cupel schema > claim.schema.json", "Keep it where your editor finds it")
      .command("$0", false, {}, async () => {
        const { claimJsonSchema } = await import("../claim/schema.js");
        await writeOut(`${JSON.stringify(claimJsonSchema(), null, 2)}\n`);
      }),
};
