import { readdirSync, readFileSync } from "node:fs";
import Ajv2020 from "ajv/dist/2020.js";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { parse } from "yaml";
import { formatProblem, type Problem } from "../../src/claim/problem.js";
import { parseClaim, readClaim } from "../../src/claim/read.js";
import { claimJsonSchema } from "../../src/claim/schema.js";

const fixtures = new URL("../../fixtures/claims/", import.meta.url);
const names = readdirSync(fixtures);
const good = readFileSync(new URL("demo.yaml", fixtures), "utf8");

function problemsOf(text: string | Uint8Array): readonly Problem[] {
  const read = parseClaim(typeof text === "string" ? new TextEncoder().encode(text) : text, "c.yaml");
  return read.ok ? [] : read.problems;
}

describe("sample claims", () => {
  const validate = new Ajv2020.default({ strict: false }).compile(claimJsonSchema());

  it.each(names)("%s is read, and valid by the JSON Schema", async (name) => {
    const file = new URL(name, fixtures);
    const read = await readClaim(file.pathname);
    expect(read.ok ? [] : read.problems.map(formatProblem)).toEqual([]);
    expect(validate(parse(readFileSync(file, "utf8"))), JSON.stringify(validate.errors)).toBe(true);
  });

  it("the schema describes every key", () => {
    const bare: string[] = [];
    const visit = (schema: unknown, path: string): void => {
      const { properties } = schema as { properties?: Record<string, { description?: string }> };
      for (const [key, inner] of Object.entries(properties ?? {})) {
        if (inner.description === undefined) bare.push(`${path}.${key}`);
        visit(inner, `${path}.${key}`);
      }
    };
    visit(claimJsonSchema(), "");
    expect(bare).toEqual([]);
  });
});

describe("a claim in SI", () => {
  it("has the numbers of its file", () => {
    const read = parseClaim(new TextEncoder().encode(good), "demo.yaml");
    if (!read.ok) throw new Error("read");
    const { claim } = read;
    expect(claim.scenario.parameters).toEqual({ GM: 1.1e20, c: 299_792_458 });
    expect(claim.scenario.start).toMatchObject({ periapsis: 0.21 * 149_597_870_700, trueAnomaly: 0 });
    expect(claim.solution?.step).toMatchObject({ kind: "length", length: 8640, unit: "d", unitSize: 86_400 });
    expect(claim.audit).toEqual({ witnesses: null, rungs: 8 });
  });
});

/** A line of the good claim replaced, and what must be said of it: line, column, found, wanted. */
const replaced: readonly (readonly [string, string, number, number, RegExp, RegExp])[] = [
  ["cupel: claim/1", "cupel: claim/2", 2, 8, /claim\/2/, /claim\/1/],
  ["quantity: apsidal-advance", "quantity: apsidal-advanse", 5, 13, /apsidal-advanse/, /'apsidal-advance'\?/],
  ["  baseline: included", "  base-line: included", 7, 3, /unknown key 'base-line'/, /'baseline'\?/],
  ["value: 78.62(2) arcsec/century", "value: 78.62(2) arcsex/century", 6, 10, /arcsex/, /'arcsec'\?/],
  [
    "equations: post-newtonian-1",
    "equations: post-newtonian",
    9,
    14,
    /post-newtonian/,
    /'post-newtonian-1'\?/,
  ],
  ["GM: 1.1e20 m^3/s^2", "GM: 1.1e20 km/s", 10, 21, /km\/s/, /m\^3\/s\^2/],
  ["GM: 1.1e20 m^3/s^2", "GM: 0 m^3/s^2", 10, 21, /0 m\^3/, /more than zero/],
  ["GM: 1.1e20 m^3/s^2", "GM: -1e20 m^3/s^2", 10, 21, /-1e20/, /more than zero/],
  ["GM: 1.1e20 m^3/s^2", "GN: 1.1e20 m^3/s^2", 10, 17, /unknown key 'GN'/, /'GM'\?/],
  ["periapsis: 0.21 au", "periapsis: .nan", 11, 23, /'.nan'/, /unit/],
  ["periapsis: 0.21 au", "periapsis: 0.21", 11, 23, /0.21/, /unit/],
  ["apoapsis: 0.34 au", "apoapsis: 0.20 au", 11, 42, /0.20 au/, /more than the periapsis/],
  ["apoapsis: 0.34 au", "eccentricity: 0.2", 11, 10, /periapsis \+ eccentricity/, /periapsis \+ apoapsis/],
  ["span: 100 orbits", "span: 2 orbits", 12, 9, /2 orbits/, /3/],
  ["span: 100 orbits", "span: 0 orbits", 12, 9, /0 orbits/, /3/],
  ["span: 100 orbits", "span: 30 deg", 12, 9, /deg/, /a time/],
  ["method: rk4", "method: rk5", 14, 11, /rk5/, /'rk4'\?/],
  ["step: 0.1 d", "step: 0.1 km", 15, 9, /km/, /unit of s/],
  ["step: 0.1 d", "step: -0.1 d", 15, 9, /-0.1 d/, /more than zero/],
  ["step: 0.1 d", "tolerance: 1e-10", 15, 3, /tolerance.*does not carry out/, /fixed step/],
  [
    "step: 0.1 d",
    "step: 0.1 d\n  arithmetic: single",
    16,
    3,
    /single precision.*does not carry out/,
    /double/,
  ],
  ["step: 0.1 d", "step: 0.1 d\n  read-off: nearest-sample", 16, 3, /does not carry out/, /refined/],
  ["step: 0.1 d", "step: 0.1 d\n  output-every: 4", 16, 3, /does not carry out/, /no such key/],
  ["step: 0.1 d", "step: 0.1 d\n  fit: end-to-end", 16, 3, /does not carry out/, /slope/],
  [
    "step: 0.1 d",
    "step: 0.1 d\nevidence: { files: 'a-{step}.csv' }",
    16,
    1,
    /does not carry out/,
    /solution/,
  ],
  [
    "equations: post-newtonian-1",
    "equations: { potential: -GM/r }",
    9,
    3,
    /formulas.*does not carry out/,
    /catalog/,
  ],
  ["method: rk4", "method: { a: [[]], b: [1] }", 14, 3, /coefficients.*does not carry out/, /catalog/],
  ["step: 0.1 d", "step: 0.1 d\naudit: { witnesses: [rk4] }", 16, 22, /own method, rk4/, /independent/],
  ["step: 0.1 d", "step: 0.1 d\naudit: { rungs: 3 }", 16, 17, /3/, /at least 4/],
  ["step: 0.1 d", "step: 0.1 d\n  steps-per-orbit: 5", 14, 3, /both/, /one of/],
  ["title: Inner", "title: &a Inner", 3, 11, /anchor/, /no anchors/],
  ["title: Inner", "title: !!js/function Inner", 3, 22, /tag/, /plain value/],
];

describe("a wrong line", () => {
  it.each(replaced)("%s → %s", (from, to, line, column, found, wanted) => {
    expect(good).toContain(from);
    const problems = problemsOf(good.replace(from, to));
    expect(problems.map(formatProblem).join("\n")).toMatch(found);
    const problem = problems.find((one) => found.test(one.found))!;
    expect(problem.wanted).toMatch(wanted);
    expect([problem.line, problem.column]).toEqual([line, column]);
  });

  it("all wrong lines of a file are told at once, in order", () => {
    const text = good.replace("rk4", "rk5").replace("100 orbits", "2 orbits").replace("title:", "titel:");
    const lines = problemsOf(text).map(({ line }) => line);
    expect(lines.length).toBeGreaterThanOrEqual(2);
    expect(lines).toEqual([...lines].sort((a, b) => a! - b!));
  });
});

describe("angle-form claims", () => {
  const angle = readFileSync(new URL("strong-field.yaml", fixtures), "utf8");
  it.each([
    ["deg/orbit", "deg/yr", /knows no time/],
    ["span: 60 rad", "span: 60 d", /'d'/],
    ["step: 0.02 rad", "step: 0.02 d", /'d'/],
    ["turning-points: true", "inclination: 3 deg", /'inclination'/],
  ])("%s → %s", (from, to, found) =>
    expect(
      problemsOf(angle.replace(from, to))
        .map(({ found: said }) => said)
        .join("\n"),
    ).toMatch(found),
  );
});

describe("files that hold no claim", () => {
  it.each([
    ["", /empty file/],
    ["# nothing\n", /nothing/],
    ["\0\0\0", /binary/],
    [new Uint8Array([0xff, 0xfe, 0x00]), /UTF-8/],
    ["a: &x [1]\nb: *x", /anchor/],
    ["a: [[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[", /nested/],
    ["a: 1\n---\nb: 2", /second document/],
    ["a: 1\na: 2", /second time/],
    ["{", /not YAML/],
    ["- 1\n- 2", /list/],
    ["__proto__: { polluted: 1 }\ncupel: claim/1", /__proto__/],
  ])("%j", (text, found) =>
    expect(
      problemsOf(text)
        .map(({ found: said }) => said)
        .join("\n"),
    ).toMatch(found),
  );

  it("leaves no trace of a hostile key", () => {
    problemsOf("__proto__: { polluted: 1 }");
    expect(({} as { polluted?: number }).polluted).toBeUndefined();
  });

  it("is not kept long by blocks nested in each other", () => {
    const deep = Array.from({ length: 5000 }, (_, i) => `${" ".repeat(i)}a:`).join("\n");
    expect(problemsOf(deep).length).toBeGreaterThan(0);
  });

  it("says what is wrong with what is no file", async () => {
    const said = async (path: string) => {
      const read = await readClaim(path);
      return read.ok ? "" : read.problems.map(formatProblem).join();
    };
    expect(await said("no-such-file.yaml")).toMatch(/no such file/);
    expect(await said(fixtures.pathname)).toMatch(/directory.*\*\.yaml/);
    expect(await said("a\0b")).toMatch(/no file can have/);
  });

  it("never throws, whatever the text", () => {
    fc.assert(
      fc.property(fc.string(), (text) => void problemsOf(text)),
      { numRuns: 300 },
    );
    fc.assert(
      fc.property(fc.nat(good.length - 1), fc.nat(20), fc.string({ maxLength: 12 }), (at, length, put) => {
        for (const problem of problemsOf(good.slice(0, at) + put + good.slice(at + length))) {
          expect(formatProblem(problem)).not.toMatch(/\p{Cc}/u);
        }
      }),
      { numRuns: 400 },
    );
  });
});
