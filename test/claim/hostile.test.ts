import { mkdtempSync, rmSync, truncateSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, it } from "vitest";
import { formatProblem } from "../../src/claim/problem.js";
import { parseClaim, readClaim } from "../../src/claim/read.js";

const lines = (count: number, line: (i: number) => string): string =>
  Array.from({ length: count }, (_, i) => line(i)).join("\n");

/** Up to 1 MB of text made to keep a parser busy: time by the square, depth without end, or both. */
const hostile: Readonly<Record<string, string>> = {
  "a key a line": lines(40_000, (i) => `key${i}: 1`),
  "one key again and again": lines(60_000, () => "key: 1"),
  "as many keys as are looked at": lines(2300, (i) => `key${i}: 1`),
  "as many list items as are looked at": `cupel: [${lines(3000, () => "[],")}]`,
  "a flow of keys": `{${lines(60_000, (i) => `k${i}: 1,`)}}`,
  "unknown tags": lines(40_000, (i) => `k${i}: !!x 1`),
  anchors: lines(40_000, (i) => `k${i}: &a${i} 1`),
  documents: "a: 1\n---\n".repeat(80_000),
  directives: "%\n".repeat(400_000),
  "lists in lists": "- ".repeat(400_000),
  "keys in keys": "? ".repeat(400_000),
  "blocks in blocks": lines(1300, (i) => `${" ".repeat(i)}a:`),
  "brackets in brackets": `a: ${"[".repeat(900_000)}`,
  "pairs of brackets": `a: ${"[]".repeat(400_000)}`,
  "quotation marks": '"'.repeat(900_000),
  "an open text of many lines": `a: "${"x\n ".repeat(300_000)}`,
  backslashes: `a: "${"\\".repeat(900_000)}"`,
  "a long block of text": `a: |\n${" x\n".repeat(300_000)}`,
  "a long plain text": `a: ${"x ".repeat(450_000)}`,
  "marks of every kind": "}{][:-?&*!|>'\"%@`".repeat(50_000),
  "exclamation marks": "! ".repeat(450_000),
  colons: ":".repeat(900_000),
  blanks: " ".repeat(900_000),
  tabs: `${"\t".repeat(900_000)}a`,
  "empty lines": `${"\n".repeat(900_000)}a: [`,
  comments: "#\n".repeat(450_000),
  "a quantity of blanks": `cupel: claim/1\nscenario: { span: "1${" ".repeat(900_000)}x" }`,
  "a quantity of digits": `cupel: claim/1\nclaimed: { value: "1(${"1".repeat(900_000)}) arcsec/orbit" }`,
  "a quantity of units": `cupel: claim/1\nsolution: { step: "1 s${"*s".repeat(400_000)}" }`,
};

/** The slowest of them takes half a second; without bounds the first takes minutes. */
const PATIENCE = 10_000;

describe("a text made to keep the reader busy", () => {
  it.each(Object.keys(hostile))("%s: gets its answer soon, in few words", { timeout: PATIENCE }, (name) => {
    const read = parseClaim(new TextEncoder().encode(hostile[name]), "c.yaml");
    if (read.ok) throw new Error("read as a claim");
    expect(read.problems.length).toBeGreaterThan(0);
    for (const problem of read.problems) expect(formatProblem(problem).length).toBeLessThan(400);
    expect(read.problems.map(formatProblem).join()).not.toMatch(/call stack|undefined|\[object/);
  });
});

describe("a file that is far too large", () => {
  const folder = mkdtempSync(join(tmpdir(), "cupel-test-"));
  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  it("is refused by its size, and not read", async () => {
    const file = join(folder, "large.yaml");
    writeFileSync(file, "cupel: claim/1\n");
    truncateSync(file, 50e9);
    const before = process.memoryUsage.rss();
    const read = await readClaim(file);
    expect(read.ok ? "" : read.problems.map(formatProblem).join()).toMatch(
      /found 50000000000 bytes; wanted a claim of at most 1000000 bytes/,
    );
    expect(process.memoryUsage.rss() - before).toBeLessThan(50e6);
  });

  it("is given up after a claim's worth of bytes where it has no size", async () => {
    const read = await readClaim("/dev/zero");
    expect(read.ok ? "" : read.problems.map(formatProblem).join()).toMatch(/more than 1000000 bytes/);
  });
});
