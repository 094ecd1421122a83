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

describe("a start in SI", () => {
  const scenarioOf = async (name: string) => {
    const read = await readClaim(new URL(name, fixtures).pathname);
    if (!read.ok) throw new Error(read.problems.map(formatProblem).join());
    return read.claim.scenario;
  };

  it("by semi-major axis and eccentricity has its apsides at a (1 - e) and a (1 + e)", async () => {
    const { start, span } = await scenarioOf("oblate-inclined.yaml");
    expect(start).toMatchObject({ kind: "elements", turningPoints: false, trueAnomaly: 0 });
    if (start.kind !== "elements") throw new Error("kind");
    expect(start.periapsis / (190e6 * 0.88)).toBeCloseTo(1, 15);
    expect(start.apoapsis / (190e6 * 1.12)).toBeCloseTo(1, 15);
    expect([start.inclination, start.node, start.argumentOfPeriapsis]).toEqual(
      [28, 40, 75].map((degrees) => expect.closeTo((degrees * Math.PI) / 180, 15)),
    );
    expect(span).toEqual({ kind: "time", length: 400 * 86_400, text: "400 d" });
  });

  it("by turning points says so", async () =>
    expect(await scenarioOf("strong-field.yaml")).toMatchObject({
      start: { kind: "elements", periapsis: 30_000, apoapsis: 55_000, turningPoints: true },
      parameters: { c: 299_792_458 },
      span: { kind: "angle", length: 60 },
    }));

  it("by a state has the variables of the equations, z and vz left out", async () =>
    expect((await scenarioOf("from-state.json")).start).toEqual({
      kind: "state",
      values: { x: 44_879_361_210, y: 0, vx: -6000, vy: 61_000 },
    }));

  it("by a state in the angle has GM/h² too", async () => {
    const { start } = await scenarioOf("from-state-in-angle.yaml");
    if (start.kind !== "state") throw new Error("kind");
    expect(start.values).toEqual({
      u: 2.1 / 149_597_870_700,
      w: expect.closeTo(-0.3 / 149_597_870_700, 25),
      "inverse-semi-latus-rectum": expect.closeTo(1.8 / 149_597_870_700, 25),
    });
  });
});

describe("a claim in another dress", () => {
  const json = readFileSync(new URL("from-state.json", fixtures), "utf8");
  it.each([
    ["line ends of Windows", good.replaceAll("\n", "\r\n")],
    ["a byte order mark", `\ufeff${good}`],
    ["marks of a document", `---\n${good}...\n`],
    ["JSON with tabs", JSON.stringify(JSON.parse(json), null, "\t")],
    ["JSON on one line", JSON.stringify(JSON.parse(json))],
    [
      "a title full of HTML and brackets",
      good.replace(/title: .*/, `title: '<b>[[{{</b>' # ${"[".repeat(99)}`),
    ],
    ["a title with joined emoji", good.replace(/title: .*/, "title: 👩\u200d🚀 12 µas")],
  ])("%s", (_, text) => expect(problemsOf(text).map(formatProblem)).toEqual([]));
});

describe("what is left of a claim with problems", () => {
  const outcome = (text: string) => parseClaim(new TextEncoder().encode(text), "c.yaml");
  it("has the title, where that is right, and the hash of the bytes", () => {
    // SHA-256 of no bytes: NIST CAVP, SHA256ShortMsg, Len = 0 (from memory).
    expect(outcome("")).toMatchObject({
      ok: false,
      sha256: "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855",
    });
    expect(outcome(good.replace("rk4", "rk5"))).toMatchObject({
      title: expect.stringContaining("dim dwarf"),
    });
    expect(outcome(good.replace("title:", "titel:"))).not.toHaveProperty("title");
  });
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

  it("says what is wrong with what is no file", async () => {
    const said = async (path: string) => {
      const read = await readClaim(path);
      return read.ok ? "" : read.problems.map(formatProblem).join();
    };
    expect(await said("no-such-file.yaml")).toMatch(/no such file/);
    expect(await said(fixtures.pathname)).toMatch(/directory.*\*\.yaml/);
    expect(await said("a\0b")).toMatch(/no file can have/);
  });

  it("never throws, whatever the bytes", () => {
    fc.assert(
      fc.property(fc.string({ unit: "binary" }), (text) => void problemsOf(text)),
      { numRuns: 300 },
    );
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 200 }), (bytes) => void problemsOf(bytes)),
      { numRuns: 300 },
    );
  });

  it("never throws, and tells in single lines, whatever is put into a good claim", () => {
    const scrap = fc.oneof(
      fc.string({ maxLength: 12 }),
      fc.string({ unit: fc.constantFrom(..."{}[]:,-?&*!|>'\"%@` \n\t"), maxLength: 12 }),
      fc.constantFrom(".nan", "1e999", "-0", "~", "<<: *a", "__proto__: {}", "[]", "{}", "null", "0x10"),
    );
    fc.assert(
      fc.property(fc.nat(good.length - 1), fc.nat(20), scrap, (at, length, put) => {
        for (const problem of problemsOf(good.slice(0, at) + put + good.slice(at + length))) {
          expect(formatProblem(problem)).not.toMatch(/\p{Cc}|undefined|\[object/u);
          expect(problem.line === null || problem.line >= 1).toBe(true);
        }
      }),
      { numRuns: 600 },
    );
  });

  it("never throws, whatever value stands in whatever place of a good claim", () => {
    const places = placesOf(parse(good));
    fc.assert(
      fc.property(fc.constantFrom(...places), fc.jsonValue({ maxDepth: 2 }), (place, value) => {
        const data = parse(good);
        const parent = place.slice(0, -1).reduce((inner, key) => inner[key], data);
        parent[place.at(-1)!] = value;
        for (const problem of problemsOf(JSON.stringify(data))) {
          expect(formatProblem(problem)).not.toMatch(/\p{Cc}|undefined|\[object/u);
        }
      }),
      { numRuns: 600 },
    );
  });
});

/** Every path into a block of keys. */
function placesOf(data: unknown, path: readonly string[] = []): (readonly string[])[] {
  if (typeof data !== "object" || data === null) return [];
  return Object.entries(data).flatMap(([key, inner]) => [[...path, key], ...placesOf(inner, [...path, key])]);
}
