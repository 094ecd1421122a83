import { execFile } from "node:child_process";
import { mkdirSync } from "node:fs";
import { join } from "node:path";
import { promisify } from "node:util";
import { expect, it } from "vitest";
import { claim, filesIn, workshop } from "./cupel.js";

const run = promisify(execFile);
const { path, write } = workshop();

it("works from a packed tarball installed elsewhere", { timeout: 300_000 }, async () => {
  // Without its scripts, which would build again what the test command has built.
  const { stdout: packed } = await run("npm", [
    "pack",
    "--ignore-scripts",
    "--json",
    "--pack-destination",
    path,
  ]);
  const [{ filename, files }] = JSON.parse(packed) as [{ filename: string; files: { path: string }[] }];
  const contents = files.map((file) => file.path);
  expect(contents).toContain("dist/cli/main.js");
  expect(contents).toContain("templates/claim.hbs");
  expect(contents.filter((file) => /^(src|test|\.)|\.ts$/.test(file) && !file.endsWith(".d.ts"))).toEqual([]);

  const cwd = join(path, "elsewhere");
  mkdirSync(cwd);
  write("elsewhere/package.json", '{ "private": true }');
  write("elsewhere/claim.yaml", claim());
  await run("npm", ["install", "--prefer-offline", "--no-audit", "--no-fund", join(path, filename)], { cwd });
  const { stdout } = await run("npx", ["--no-install", "cupel", "audit", "claim.yaml"], { cwd });
  expect(stdout).toMatch(/^RESOLVED/);
  expect(filesIn(join(cwd, "cupel-report"))).toEqual(["claim.html"]);
});
