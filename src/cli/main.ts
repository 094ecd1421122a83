#!/usr/bin/env node
import { tellFailure } from "./failure.js";
import { tameStreams } from "./output.js";
import { run } from "./program.js";

tameStreams();
process.on("uncaughtException", (error) => {
  tellFailure(error);
  process.exit();
});
await run(process.argv.slice(2)).catch(tellFailure);
