import { describe, expect, it } from "vitest";
import { cupel, filesIn, workshop } from "./cupel.js";

const { path } = workshop();

describe("calibrate", () => {
  it("prints what held, the table of verdicts and nothing on the other stream", async () => {
    const { code, stdout, stderr } = await cupel(["calibrate", "--claims", "4", "--seed", "2"]);
    expect(code).toBe(0);
    expect(stderr).toBe("");
    expect(stdout).toMatch(/^4 claims of invented systems with known truth, seed 2, in /);
    expect(stdout).toMatch(/^resolved for a figure that is not +0$/m);
    expect(stdout).toMatch(/^verdicts right +\d+\.\d\d % +\d of 4$/m);
    for (const verdict of ["resolved", "partly-resolved", "not-resolved", "contradicted", "undetermined"]) {
      expect(stdout).toMatch(new RegExp(`^${verdict}( +(\\d+|·)){5}$`, "m"));
    }
    for (const line of stdout.split("\n")) expect(line.length).toBeLessThanOrEqual(80);
  });

  it("writes its figures as JSON", async () => {
    const { code, stdout } = await cupel(["calibrate", "--claims", "3", "--seed", "2", "--json", "-"]);
    expect(code).toBe(0);
    const figures = JSON.parse(stdout);
    expect(figures).toMatchObject({ format: "cupel/calibration-1", seed: 2, claims: 3, wrongResolved: 0 });
    await cupel(["calibrate", "--claims", "1", "--json", "figures.json"], { cwd: path });
    expect(filesIn(path)).toEqual(["figures.json"]);
  });

  it.each([
    [["--claims", "0"], "--claims: found '0'; wanted a whole number from 1 to 1000000"],
    [["--seed", "-1"], "--seed: found '-1'; wanted a whole number from 0 to 2147483647"],
    [["--seed", "x"], "--seed: found 'x'; wanted a whole number from 0 to 2147483647"],
    [["--workers", "0"], "--workers: found '0'; wanted a whole number from 1 to 256"],
    [["--json", ""], "--json: found nothing; wanted a file, or -"],
    [["--json", "/nowhere/at/all.json"], "cannot write /nowhere/at/all.json"],
  ])("refuses %j in one line", async (args, message) => {
    const { code, stdout, stderr } = await cupel(["calibrate", ...args]);
    expect(code).toBe(2);
    expect(stdout).toBe("");
    expect(stderr).toContain(message);
    expect(stderr).not.toContain("    at ");
  });
});
