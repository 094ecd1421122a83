import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, it } from "vitest";
import { parseClaim } from "../../src/claim/read.js";
import type { ResultFile } from "../../src/result/result.js";
import { CLAIMS, cupel, type Ended, claim as quickClaim, shell, workshop } from "./cupel.js";

const readme = readFileSync("README.md", "utf8");
const { path: cwd, write } = workshop();

const fences = (language: string): string[] =>
  [...readme.matchAll(new RegExp(`^\`\`\`${language}\\n(.*?)^\`\`\``, "gms"))].map(([, text]) => text!);

/** First cells of the table whose head begins so. */
function column(head: string): string[] {
  const [, rows] = readme.split(`| ${head} |`, 2)[1]!.split(/^\| --- \| --- \|\n/m, 2);
  return rows!
    .split("\n\n")[0]!
    .split("\n")
    .map((row) => row.split("|")[1]!.trim());
}

describe("the README", () => {
  const [claim] = fences("yaml");

  it("explains a claim that reads well", () => {
    expect(fences("yaml")).toHaveLength(1);
    expect(parseClaim(Buffer.from(claim!), "claim.yaml")).toMatchObject({ ok: true });
  });

  it("names npm scripts that there are", () => {
    const { scripts } = JSON.parse(readFileSync("package.json", "utf8")) as { scripts: object };
    for (const [, name] of readme.matchAll(/npm run (\w+)/g)) expect(scripts).toHaveProperty(name!);
  });

  const calls = fences("sh")
    .flatMap((text) => text.split("\n"))
    .flatMap((line) => /^npx (cupel .*?)(?:\s+#.*)?$/.exec(line)?.[1] ?? []);

  it.each(calls)("names a call that runs: %s", async (call) => {
    write("claim.yaml", quickClaim());
    const line = call.replace(/^cupel/, "$CUPEL").replace("claims/**/*.yaml", "*.yaml");
    const { code, stdout, stderr } = await shell(line, { cwd });
    expect([code, stderr]).toEqual([0, ""]);
    expect(stdout).not.toBe("");
  });

  it("lists the options of audit, all of them", async () => {
    const { stdout } = await cupel(["audit", "--help"]);
    const options = [...stdout.matchAll(/^ +(--[\w-]+)/gm)].map(([, name]) => name!);
    const listed = column("option").map((cell) => cell.replaceAll("`", "").split(" ")[0]!);
    expect(["--help", ...listed].sort()).toEqual(options.sort());
  });

  describe("tells of the demo", () => {
    let demo: Ended;
    let result: ResultFile["claims"][number];
    beforeAll(async () => {
      const args = ["audit", `${CLAIMS}/demo.yaml`, "--out", "pages", "--json", "result.json"];
      demo = await cupel(args, { cwd });
      [result] = (JSON.parse(readFileSync(`${cwd}/result.json`, "utf8")) as ResultFile).claims as [
        typeof result,
      ];
    });

    it("what it prints", () => {
      for (const line of fences("text").join("").trimEnd().split("\n"))
        expect(demo.stdout).toContain(`${line}\n`);
      const [, inNull] = /\((\d\.\d+) arcsec\/century of the quoted figure/.exec(readme)!;
      expect(result.asSolved.null!.toPrecision(3)).toBe(inNull);
    });

    it("which checks are made, in their order", () => {
      expect(column("check")).toEqual(result.checks.map(({ name }) => name));
    });
  });
});
