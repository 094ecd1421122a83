import { mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import type { ResultFile } from "../../src/result/result.js";
import { claim, cupel, type Ended, filesIn, workshop } from "./cupel.js";

const { path: cwd, write } = workshop();

/** Every call here is wrong: told in single lines of what it is, with nothing left behind. */
function expectWrong({ code, stdout, stderr }: Ended, says: RegExp): void {
  expect(stderr).toMatch(says);
  expect(stderr).not.toMatch(/^ {4}at /m);
  expect(stderr).not.toContain("internal failure");
  for (const line of stderr.split("\n")) expect(line.length).toBeLessThan(400);
  expect(stdout).toBe("");
  expect(code).toBe(2);
}

/** YAML whose aliases stand for 9^9 words. */
const bomb = `cupel: claim/1
a: &a [x, x, x, x, x, x, x, x, x]
${[..."bcdefghi"].map((name, i) => `${name}: &${name} [${Array(9).fill(`*${"abcdefgh"[i]}`).join(", ")}]`).join("\n")}
`;

const unreadable: readonly (readonly [what: string, text: string | Uint8Array, says: RegExp])[] = [
  ["an empty file", "", /found an empty file; wanted a claim/],
  ["nothing but comments", "# nothing\n", /found nothing in the file/],
  [
    "a binary file",
    Uint8Array.from({ length: 5000 }, (_, i) => (i * 7919) % 256),
    /found bytes that are not UTF-8/,
  ],
  ["a binary file of NULs", new Uint8Array(4096), /found a binary file/],
  [
    "50 MB of YAML",
    `cupel: claim/1\n${"- item of a list\n".repeat(3_100_000)}`,
    /found 5\d{7} bytes; wanted/,
  ],
  ["aliases that expand without end", bomb, /claims take no anchors and aliases/],
  ["an alias of itself", "cupel: &a [*a]\n", /claims take no anchors and aliases/],
  ["brackets without end", `cupel: ${"[".repeat(100_000)}`, /nest/],
  ["text that is not YAML", 'cupel: "claim/1\ntitle: [', /not YAML/],
  ["a list", "- a\n- b\n", /wanted a block of keys/],
  ["a missing key", claim().replace(/ {2}span: .*\n/, ""), /:\d+:\d+: scenario\.span: found nothing; wanted/],
  ["an unknown key", claim({ more: "remarks: none\n" }), /:\d+:1: found the unknown key 'remarks'; wanted/],
  [
    "a mistyped key",
    claim().replace("title:", "tittle:"),
    /found the unknown key 'tittle'; wanted 'title'\?/,
  ],
  ["a wrong unit", claim({ parameters: "1.1e20 m^3/kg" }), /GM: found .*kg.*; wanted/],
  ["a unit of another kind", claim({ parameters: "1.1e20 km" }), /GM: found .*; wanted/],
  ["no unit", claim({ parameters: "1.1e20" }), /GM: found .*; wanted/],
  ["a zero", claim({ parameters: "0 m^3/s^2" }), /GM: found .*; wanted/],
  ["a negative value", claim({ parameters: "-1.1e20 m^3/s^2" }), /GM: found .*; wanted/],
  ["a huge value", claim({ parameters: "1e999 m^3/s^2" }), /GM: found .*; wanted/],
  ["an exponent without end", claim({ parameters: "1e999999999999 m^3/s^2" }), /GM: found .*; wanted/],
  ["NaN", claim({ parameters: "NaN m^3/s^2" }), /GM: found .*; wanted/],
  ["YAML's NaN", claim({ parameters: ".nan" }), /GM: found .*; wanted/],
  ["an infinity", claim({ value: "Infinity arcsec/orbit" }), /value: found .*; wanted/],
  ["a margin of zero", claim({ value: "42.98(0) arcsec/orbit" }), /margin of zero; wanted/],
  [
    "e = 1",
    claim({ start: "{ semi-major-axis: 1 au, eccentricity: 1 }" }),
    /eccentricity: found '1'; wanted/,
  ],
  ["e > 1", claim({ start: "{ semi-major-axis: 1 au, eccentricity: 1.7 }" }), /eccentricity: found '1.7'/],
  ["e < 0", claim({ start: "{ semi-major-axis: 1 au, eccentricity: -0.1 }" }), /eccentricity: found '-0.1'/],
  [
    "a periapsis beyond the apoapsis",
    claim({ start: "{ periapsis: 2 au, apoapsis: 1 au }" }),
    /start.*: found/,
  ],
  ["a negative step", claim({ solution: "{ method: rk4, step: -0.1 d }" }), /step: found '-0.1 d'/],
  ["no step", claim({ solution: "{ method: rk4 }" }), /solution.*: found .*; wanted/],
  ["an unknown method", claim({ solution: "{ method: rk5, steps-per-orbit: 9 }" }), /'rk5'; wanted 'rk4'\?/],
  ["a span of no orbit", claim({ span: "0 orbits" }), /span: found '0 orbits'; wanted/],
  ["a span of nothing", claim({ span: "0 d" }), /span: found '0 d'; wanted/],
  ["two titles", claim({ more: "title: another\n" }), /a key for the second time/],
  [
    "a part of later versions",
    claim({ more: "evidence: { files: 'a-{step}.csv' }\n" }),
    /does not carry out/,
  ],
];

describe("claims that cannot be read", () => {
  let all: Ended;
  const fileOf = (i: number): string => `${String(i).padStart(2, "0")}.yaml`;

  beforeAll(async () => {
    for (const [i, [, text]] of unreadable.entries()) write(fileOf(i), text);
    all = await cupel(["audit", "*.yaml", "--json", "result.json"], { cwd });
  });

  it.each(unreadable.map(([what, , says], i) => [what, fileOf(i), says] as const))("%s", (_, file, says) => {
    const told = all.stderr.split("\n").filter((line) => line.startsWith(file));
    expect(told.join("\n")).toMatch(says);
    for (const line of told) expect(line).toMatch(/: found .+; wanted .+/);
  });

  it("leave with 2, nothing but single lines on standard error, and the result file alone", () => {
    expectWrong(all, /./);
    for (const line of all.stderr.trimEnd().split("\n")) expect(line).toMatch(/^\d\d\.yaml/);
    expect(filesIn(cwd)).toEqual([...unreadable.map((_, i) => fileOf(i)), "result.json"]);
  });

  it("each have an undetermined entry with the problems in it", () => {
    const { claims } = JSON.parse(readFileSync(join(cwd, "result.json"), "utf8")) as ResultFile;
    expect(claims.map(({ file }) => file)).toEqual(unreadable.map((_, i) => fileOf(i)));
    for (const [i, { verdict, grade, checks, claimed }] of claims.entries()) {
      expect([verdict, grade, claimed]).toEqual(["undetermined", null, null]);
      // The file is the entry's own, and the place is told in words.
      const words = unreadable[i]![2].source.replace(/^:\\d\+:(\\d\+|\d+): /, "");
      expect(checks.map(({ says }) => says).join()).toMatch(new RegExp(words));
    }
  });

  it("one alone leaves with 2 and nothing behind", async () => {
    const alone = join(cwd, "alone");
    mkdirSync(alone);
    writeFileSync(join(alone, "bomb.yaml"), bomb);
    expectWrong(await cupel(["audit", "bomb.yaml"], { cwd: alone }), /claims take no anchors and aliases/);
    expect(filesIn(alone)).toEqual(["bomb.yaml"]);
  });
});
