import type { CommandModule } from "yargs";
import { writeOut } from "./output.js";

export const schema: CommandModule = {
  command: "schema",
  describe: "Print the JSON Schema of claim files, for editors",
  builder: (yargs) =>
    yargs.example("cupel schema > claim.schema.json", "Keep it where your editor looks for schemas"),
  handler: async () => {
    const { claimJsonSchema } = await import("../claim/schema.js");
    await writeOut(`${JSON.stringify(claimJsonSchema(), null, 2)}\n`);
  },
};
