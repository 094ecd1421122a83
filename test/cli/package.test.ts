import { execFile } from "node:child_process";
import { mkdirSync, rmSync } from "node:fs";
import { join } from "node:path";
import { promisify } from "node:util";
import { beforeAll, describe, expect, it } from "vitest";
import { claim, filesIn, workshop } from "./cupel.js";

const run = promisify(execFile);
const { path, write } = workshop();

/** An installation from the tarball takes its time where the registry is far; ms. */
const LONG = 300_000;

describe("a packed tarball installed elsewhere", () => {
  const cwd = join(path, "elsewhere");
  let contents: string[];

  beforeAll(async () => {
    // Without its scripts, which would build again what the test command has built.
    const pack = ["pack", "--ignore-scripts", "--json", "--pack-destination", path];
    const [{ filename, files }] = JSON.parse((await run("npm", pack)).stdout) as [
      { filename: string; files: { path: string }[] },
    ];
    contents = files.map((file) => file.path);
    mkdirSync(cwd);
    write("elsewhere/package.json", '{ "private": true }');
    write("elsewhere/claim.yaml", claim());
    const install = ["install", "--prefer-offline", "--no-audit", "--no-fund", join(path, filename)];
    await run("npm", install, { cwd });
  }, LONG);

  it("holds the program, its templates and no sources", () => {
    expect(contents).toContain("dist/cli/main.js");
    expect(contents).toContain("templates/claim.hbs");
    expect(contents.filter((file) => /^(src|test|\.)|\.ts$/.test(file) && !file.endsWith(".d.ts"))).toEqual(
      [],
    );
  });

  it("audits a claim", async () => {
    const { stdout } = await run("npx", ["--no-install", "cupel", "audit", "claim.yaml"], { cwd });
    expect(stdout).toMatch(/^RESOLVED/);
    expect(filesIn(join(cwd, "cupel-report"))).toEqual(["claim.html"]);
  });

  it("tells of a defect in a line with the way to report it, keeps what was found, and leaves with 3", async () => {
    rmSync(join(cwd, "node_modules/cupel/templates"), { recursive: true });
    const call = (env: Record<string, string>) =>
      run("npx", ["--no-install", "cupel", "audit", "claim.yaml", "--out", "pages"], {
        cwd,
        env: { ...process.env, ...env },
      }).then(
        () => expect.unreachable(),
        (error: { code: number; stdout: string; stderr: string }) => error,
      );
    const plain = await call({});
    expect(plain.code).toBe(3);
    expect(plain.stderr).toMatch(/^cupel: internal failure: .*\.hbs.*\n.*Please report it/);
    expect(plain.stderr).not.toMatch(/^ {4}at /m);
    expect(plain.stdout).toMatch(/^RESOLVED/);
    expect(filesIn(cwd)).not.toContain("pages");
    expect((await call({ CUPEL_DEBUG: "1" })).stderr).toMatch(/^ {4}at /m);
  });
});
