import { describe, expect, it } from "vitest";
import packageJson from "../../package.json" with { type: "json" };
import { cupel } from "./cupel.js";

const COMMANDS = ["audit", "calibrate", "catalog", "schema"];

describe("help", () => {
  it("of the program lists every command, with examples and exit codes", async () => {
    const { code, stdout, stderr } = await cupel(["--help"]);
    expect([code, stderr]).toEqual([0, ""]);
    for (const command of COMMANDS) expect(stdout).toContain(`  cupel ${command}`);
    expect(stdout).toMatch(/Examples:\n {2}cupel audit claim\.yaml\n/);
    expect(stdout).toContain("Exit codes: 0 done");
    expect(stdout).toMatch(/no clearance for flight/);
  });

  it.each([[], ...COMMANDS.map((name) => [name])])(
    "of '%s' fits 80 columns and has examples",
    async (...name) => {
      const { code, stdout } = await cupel([...name.filter(Boolean), "--help"]);
      expect(code).toBe(0);
      expect(stdout).toContain("Examples:\n");
      expect(Math.max(...stdout.split("\n").map((line) => [...line].length))).toBeLessThanOrEqual(80);
    },
  );

  it("of audit names every option", async () => {
    const { stdout } = await cupel(["audit", "--help"]);
    for (const option of ["out", "no-report", "json", "workers", "quiet", "colour"]) {
      expect(stdout).toMatch(new RegExp(`^ +--${option} `, "m"));
    }
  });

  it("goes to standard error, with 2, for a call of nothing", async () => {
    const { code, stdout, stderr } = await cupel([]);
    expect([code, stdout]).toEqual([2, ""]);
    expect(stderr).toContain("cupel audit CLAIM...");
  });

  it("--version prints the version of the package", async () => {
    expect(await cupel(["--version"])).toMatchObject({ code: 0, stdout: `${packageJson.version}\n` });
  });
});

describe.concurrent("a wrong call", () => {
  it.each<[args: string[], says: string]>([
    [["catalogue"], "found the unknown command 'catalogue'; wanted 'catalog'?"],
    [
      ["frobnicate"],
      "found the unknown command 'frobnicate'; wanted one of audit, calibrate, catalog, schema",
    ],
    [["--jsno"], "found '--jsno' before the command; wanted the command first"],
    [["audit"], "found no claim to audit; wanted files or globs"],
    [["audit", "a.yaml", "--jsno", "x"], "found the unknown option '--jsno'; wanted '--json'?"],
    [["audit", "a.yaml", "--outs=x"], "found the unknown option '--outs'; wanted '--out'?"],
    [["audit", "a.yaml", "--json"], "--json: found nothing; wanted a value"],
    [["audit", "a.yaml", "--json="], "--json: found nothing; wanted a file, or -"],
    [["audit", "a.yaml", "--json", "x", "--json", "y"], "--json: found it twice; wanted it once"],
    [["audit", "a.yaml", "--workers", "0"], "--workers: found '0'; wanted a whole number from 1 to 256"],
    [["audit", "a.yaml", "--workers", "2.5"], "--workers: found '2.5'; wanted a whole number"],
    [["audit", "a.yaml", "--workers", "many"], "--workers: found 'many'; wanted a whole number"],
    [["audit", "a.yaml", "--colour", "red"], "--colour: found 'red'; wanted one of auto, always, never"],
    [["audit", "no-such-claim.yaml"], "found no file 'no-such-claim.yaml'; wanted a claim file that exists"],
    [["audit", "no-such-*.yaml"], "found no file that matches the pattern 'no-such-*.yaml'"],
    [["audit", "{1..100000000}.yaml"], "found the pattern '{1..100000000}.yaml'; wanted one"],
    [["audit", "fixtures"], "found the directory 'fixtures'; wanted a file, or 'fixtures/**/*.yaml'"],
    [["audit", ""], "found ''; wanted the name of a claim file"],
    [["audit", "\u001b[31mred.yaml"], "found no file ' [31mred.yaml'"],
    [["catalog", "rk5"], "found no entry 'rk5' in the catalog; wanted 'rk4'?"],
    [["catalog", "toString"], "found no entry 'toString' in the catalog; wanted a name"],
    [["catalog", "rk4", "heun"], "found 'heun' too much; wanted no more arguments"],
    [["schema", "--draft", "7"], "found the unknown option '--draft'; wanted none"],
  ])("%j", async (args, says) => {
    const { code, stdout, stderr } = await cupel(args);
    expect(stderr).toContain(`cupel: ${says}`);
    expect(stderr.trimEnd().split("\n")).toHaveLength(1);
    expect([code, stdout]).toEqual([2, ""]);
  });

  it("is told in full, a line each", async () => {
    const { code, stderr } = await cupel(["audit", "none.yaml", "none-*.yaml", "src"]);
    expect(stderr.trimEnd().split("\n")).toHaveLength(3);
    expect(code).toBe(2);
  });
});
