import { mkdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { beforeEach, describe, expect, it } from "vitest";
import type { ResultFile } from "../../src/result/result.js";
import { claim, cupel, filesIn, shell, workshop } from "./cupel.js";

const { path: root, write } = workshop();
let cwd: string;
let count = 0;

/** A folder for each test, with one claim that is quick to audit. */
beforeEach(() => {
  const folder = `test-${count++}`;
  cwd = join(root, folder);
  mkdirSync(cwd);
  write(`${folder}/quick.yaml`, claim());
});
const put = (name: string, text: string): string => write(join(cwd.slice(root.length + 1), name), text);
const results = (text: string): ResultFile["claims"] => (JSON.parse(text) as ResultFile).claims;

describe("an audit", () => {
  it("says its conclusion first, names its page, and leaves with 0", async () => {
    const { code, stdout, stderr } = await cupel(["audit", "quick.yaml"], { cwd });
    expect([code, stderr]).toEqual([0, ""]);
    expect(stdout).toMatch(/^RESOLVED {3}grade [AB]/);
    expect(stdout).toMatch(/no clearance for flight/);
    expect(stdout).toMatch(/report {2}cupel-report\/quick\.html\n$/);
    expect(stdout).not.toContain("\u001b");
    expect(Math.max(...stdout.split("\n").map((line) => [...line].length))).toBeLessThanOrEqual(80);
    expect(filesIn(join(cwd, "cupel-report"))).toEqual(["quick.html"]);
  });

  it("writes its result as JSON alone to standard output", async () => {
    const { code, stdout, stderr } = await cupel(["audit", "quick.yaml", "--json", "-", "--no-report"], {
      cwd,
    });
    expect([code, stderr]).toEqual([0, ""]);
    expect(results(stdout)).toMatchObject([{ file: "quick.yaml", verdict: "resolved" }]);
    expect(filesIn(cwd)).toEqual(["quick.yaml"]);
  });

  it("takes globs and paths, each file once, in a stable order, with an index", async () => {
    put("b.yaml", claim({ title: "Second" }));
    put("a.yaml", claim({ title: "First" }));
    put("odd[1].yaml", claim({ title: "Name that reads like a pattern" }));
    const args = ["audit", "quick.yaml", "odd[1].yaml", "[ab].yaml", "./a.yaml", "--json", "r.json"];
    const { code, stdout } = await cupel([...args, "--out", "pages/deep"], { cwd });
    expect(code).toBe(0);
    const files = results(readFileSync(join(cwd, "r.json"), "utf8")).map(({ file }) => file);
    expect(files).toEqual(["quick.yaml", "odd[1].yaml", "a.yaml", "b.yaml"]);
    expect(
      stdout
        .split("\n")
        .slice(0, 4)
        .map((line) => line.split(/\s+/).at(-1)),
    ).toEqual(files);
    expect(stdout).toMatch(/report {2}pages\/deep\/index\.html\n$/);
    const pages = filesIn(join(cwd, "pages/deep"));
    expect(pages).toContain("index.html");
    expect(pages).toHaveLength(5);
  });

  it("gives the same figures on one worker as on three", async () => {
    put("b.yaml", claim({ value: "1.0(1) arcsec/orbit", solution: "{ method: rk4, steps-per-orbit: 128 }" }));
    const figures = async (workers: string): Promise<unknown> => {
      const args = ["audit", "*.yaml", "--json", "-", "--no-report", "--workers", workers];
      return JSON.parse((await cupel(args, { cwd })).stdout, (key, value: unknown) =>
        key === "seconds" ? 0 : value,
      );
    };
    expect(await figures("1")).toEqual(await figures("3"));
  });

  it("takes a name with a leading dash after --", async () => {
    put("-odd.yaml", claim());
    const { code, stdout } = await cupel(["audit", "--quiet", "--no-report", "--", "-odd.yaml"], { cwd });
    expect([code, stdout]).toEqual([0, expect.stringMatching(/ -odd\.yaml\n$/)]);
  });

  it("audits the readable claims beside one that is not, and leaves with 2", async () => {
    put("bad.yaml", claim({ span: "0 orbits" }));
    const { code, stdout, stderr } = await cupel(["audit", "*.yaml"], { cwd });
    expect(code).toBe(2);
    expect(stderr).toMatch(/^bad\.yaml:10:\d+: scenario\.span: found '0 orbits'; wanted .*\n$/);
    expect(stdout).toMatch(/^UNDETERMINED +- +bad\.yaml\nRESOLVED +[AB] +quick\.yaml\n/);
    expect(filesIn(join(cwd, "cupel-report"))).toEqual(["bad.html", "index.html", "quick.html"]);
  });

  it("calls a step longer than the orbit by its name", async () => {
    put("long.yaml", claim({ solution: "{ method: rk4, step: 4000 d }" }));
    const { code, stderr } = await cupel(["audit", "long.yaml", "--json", "r.json"], { cwd });
    expect(code).toBe(2);
    expect(stderr).toMatch(/^long\.yaml: the step 4000 d is \d+(\.\d+)? times the orbit; [^\n]*\n$/);
    expect(filesIn(cwd)).toEqual(["long.yaml", "quick.yaml", "r.json"]);
    expect(results(readFileSync(join(cwd, "r.json"), "utf8"))[0]).toMatchObject({ verdict: "undetermined" });
  });

  it.each([
    ["too coarse a step", { solution: "{ method: euler, steps-per-orbit: 16 }" }],
    ["a nearly parabolic orbit", { start: "{ semi-major-axis: 1 au, eccentricity: 0.9999999 }" }],
    ["a span of less than an orbit", { span: "1 d" }],
    ["one orbit", { span: "1 orbits" }],
  ])("ends honestly on %s", async (_, parts) => {
    put("odd.yaml", claim(parts));
    const { stdout, stderr } = await cupel(["audit", "odd.yaml", "--json", "-", "--no-report"], { cwd });
    expect(stderr).not.toMatch(/internal failure|^ {4}at /m);
    const [result] = results(stdout);
    expect(result!.verdict).not.toBe("resolved");
    expect(result!.reason).toMatch(/\w/);
  });

  it("injects nothing into the page from a title full of HTML", async () => {
    const title = `'</title><script>alert(1)</script><img src=x onerror=alert(2)> & "quoted" {{file}}'`;
    put("html.yaml", claim({ title }));
    put("<b>.yaml", claim({ title }));
    expect((await cupel(["audit", "html.yaml", "<b>.yaml"], { cwd })).code).toBe(0);
    for (const page of filesIn(join(cwd, "cupel-report"))) {
      const html = readFileSync(join(cwd, "cupel-report", page), "utf8");
      expect(html).not.toMatch(/<script>alert|<img src=x|<b>\.yaml/);
      expect(html).toContain("&lt;script&gt;alert(1)");
      expect(html).toContain("{{file}}");
    }
  });
});

describe("a place that cannot be written", () => {
  it.each<[args: string[], says: string]>([
    [["--json", "quick.yaml/result.json"], "cannot write quick.yaml/result.json: part of the path is a file"],
    [["--json", "/proc/result.json"], "cannot write /proc/result.json: "],
    [["--json", "none/result.json"], "cannot write none/result.json: the folder does not exist"],
    [["--json", "."], "cannot write .: it is a folder"],
    [["--json", "./slow.yaml"], "cannot write ./slow.yaml: it is one of the claims"],
    [["--out", "quick.yaml"], "cannot write quick.yaml: it is a file"],
    [["--out", "quick.yaml/pages/deep"], "cannot write quick.yaml/pages/deep: part of the path is a file"],
    [["--out", "/proc/cupel/pages"], "cannot write /proc/cupel/pages: "],
  ])("%j is told before the work is done", async (args, says) => {
    put("slow.yaml", claim({ span: "20000 orbits" }));
    const began = performance.now();
    const { code, stdout, stderr } = await cupel(["audit", "slow.yaml", ...args], { cwd });
    expect(stderr).toContain(`cupel: ${says}`);
    expect(stderr.trimEnd().split("\n")).toHaveLength(1);
    expect([code, stdout]).toEqual([2, ""]);
    // The work takes many times as long.
    expect(performance.now() - began).toBeLessThan(10_000);
    expect(filesIn(cwd)).toEqual(["quick.yaml", "slow.yaml"]);
  });

  it.each([
    ["$CUPEL audit quick.yaml --no-report >/dev/full", "cannot write to standard output: ENOSPC"],
    ["$CUPEL audit quick.yaml --no-report --json - >/dev/full", "cannot write to standard output: ENOSPC"],
    ["$CUPEL audit quick.yaml --no-report --json /dev/full", "cannot write /dev/full: no space is left"],
    ["$CUPEL schema >/dev/full", "cannot write to standard output: ENOSPC"],
  ])("%s leaves with 2", async (line, says) => {
    const { code, stderr } = await shell(line, { cwd });
    expect(stderr).toContain(`cupel: ${says}`);
    expect(stderr.trimEnd().split("\n")).toHaveLength(1);
    expect(code).toBe(2);
    expect(filesIn(cwd)).toEqual(["quick.yaml"]);
  });

  it("is no device: that is written as it is", async () => {
    const { code, stdout } = await shell(
      "$CUPEL audit quick.yaml --no-report --quiet --json /dev/stdout | cat",
      { cwd },
    );
    expect(code).toBe(0);
    expect(stdout).toContain('"format": "cupel/result-1"');
  });
});
