import { stripVTControlCharacters } from "node:util";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { renderOverview, renderTerminal } from "../../src/report/terminal.js";
import { clean, columns, cut, wrap } from "../../src/report/text.js";
import type { ClaimResult } from "../../src/result/result.js";
import { everyKind, madeUp } from "./sample.js";

const plain = (result: ClaimResult, width = 80): string => renderTerminal(result, { width, colour: false });
const widest = (text: string): number =>
  Math.max(...text.split("\n").map((line) => columns(stripVTControlCharacters(line))));

/** What a claim can hold to spoil a terminal: escapes, direction marks, wide and combining letters, no spaces. */
const HOSTILE = [
  "\u001b[2J\u001b]0;title\u0007\r\nfake line\u0000\u0085\u2028",
  "\u202egnitrever\u202c\u200b",
  "軌道の近点移動".repeat(12),
  "e\u0301".repeat(100),
  "🪐".repeat(60),
  "x".repeat(300),
];

describe("the summary of a claim", () => {
  it.each([40, 60, 80])("keeps to %i columns, whatever the kind and the texts", (width) => {
    for (const result of everyKind()) {
      for (const evil of ["A title", ...HOSTILE]) {
        const planted = {
          ...result,
          title: evil,
          file: `${evil}.yaml`,
          reason: `${evil} ${evil}`,
          gradeRule: evil,
          claimed: result.claimed === null ? null : { ...result.claimed, unit: evil, text: `62.20 ${evil}` },
          checks: result.checks.map((check) => ({ ...check, says: evil })),
          ladders: result.ladders.map((ladder) => ({ ...ladder, method: evil, says: evil })),
          setup: result.setup === null ? null : { ...result.setup, step: evil },
          remedy: result.remedy && {
            ...result.remedy,
            says: evil,
            options: result.remedy.options.map((option) => ({ ...option, method: evil, step: evil })),
          },
        };
        for (const colour of [false, true]) {
          const text = renderTerminal(planted, { width, colour });
          expect(widest(text)).toBeLessThanOrEqual(width);
          const bare = colour ? stripVTControlCharacters(text) : text;
          expect(bare.replaceAll("\n", "")).not.toMatch(/[\p{Cc}\u200b\u202a-\u202e\u2028\u2029]/u);
          if (colour) expect(bare).toBe(renderTerminal(planted, { width, colour: false }));
        }
      }
    }
  });

  it("says the conclusion first, then why, then the numbers", () => {
    const text = plain(madeUp());
    expect(text.split("\n")[0]).toBe("NOT RESOLVED   grade E   0 of 4 quoted digits stand");
    const places = ["NOT RESOLVED", "make up too much", "claimed", "reproduces", "Ladder of rk4", "Grade E:"];
    const found = places.map((part) => text.indexOf(part));
    expect(found.every((place) => place >= 0)).toBe(true);
    expect(found).toEqual(found.toSorted((a, b) => a - b));
    expect(text).toContain("no clearance for flight");
  });

  it("has the points of the figures in line, and the claim as the author wrote it", () => {
    const lines = plain(madeUp()).split("\n");
    const of = (name: string): string => lines.find((line) => line.startsWith(name))!;
    expect(of("claimed")).toContain("62.20 ");
    expect(of("claimed")).toContain("± 0.005 ");
    const points = ["claimed", "as solved", "null run", "best value", "error"].map((name) =>
      of(name).indexOf("."),
    );
    expect(new Set(points).size).toBe(1);
  });

  it("says what is not there, and makes no nought of it", () => {
    const none = { value: null, null: null, error: null, halfWidth: null };
    const { setup } = madeUp();
    const silent = plain(
      madeUp({ asSolved: none, setup: { ...setup!, step: "0.3 d", stepsPerOrbit: null } }),
    );
    expect(silent).toMatch(/as solved +none +rk4, 0\.3 d\n/);
    expect(silent).toMatch(/null run +none/);
    for (const result of everyKind()) {
      expect(plain(result)).not.toMatch(/NaN|undefined|Infinity|\bnull\b(?! run| +Check)/);
      expect(plain(result)).not.toMatch(/\b0 steps/);
    }
    // A null run far below every digit of interest is small, not nothing.
    expect(plain(madeUp({ asSolved: { ...madeUp().asSolved, null: 3e-9 } }))).toMatch(/null run +3\.00e-9/);
  });

  it("names how a rung ended that gave no figure, and marks the author's", () => {
    const [own] = madeUp().ladders;
    const lost = own!.rungs.map((rung, k) =>
      k === 0
        ? { ...rung, status: "too-few-passages" as const, value: null, null: null, figure: null }
        : rung,
    );
    const text = plain(madeUp({ ladders: [{ ...own!, rungs: lost }] }));
    expect(text).toMatch(/^ +32 +too-few-passages/m);
    expect(text).toMatch(/^ +> 256 /m);
  });

  it("never breaks the path of the page", () => {
    const page = `${"a-long-folder/".repeat(9)}claim.html`;
    expect(renderTerminal(madeUp(), { width: 80, colour: false, page })).toContain(`\nreport\n${page}\n`);
    expect(renderTerminal(madeUp(), { width: 80, colour: false, page: "p/claim.html" })).toContain(
      "\nreport  p/claim.html\n",
    );
  });
});

describe("the overview", () => {
  it("has a line a claim, verdict first, in its columns", () => {
    const results = everyKind().map((result) => ({ ...result, file: "軌道/".repeat(30) }));
    const text = renderOverview(results, { width: 80, colour: false });
    expect(text.trimEnd().split("\n")).toHaveLength(results.length);
    expect(text.split("\n")[0]).toMatch(/^RESOLVED {9}A {2}軌/);
    expect(widest(text)).toBeLessThanOrEqual(80);
  });
});

describe("text", () => {
  it("is as wide as Unicode has it (UAX 11: East Asian wide takes two columns, marks none)", () => {
    expect([columns("abc"), columns("軌道"), columns("e\u0301"), columns("🪐")]).toEqual([3, 4, 1, 2]);
  });

  it("wraps to its width and loses nothing but spaces; cuts with a sign", () => {
    fc.assert(
      fc.property(fc.string({ unit: "grapheme" }), fc.integer({ min: 4, max: 80 }), (text, width) => {
        const source = clean(text);
        const lines = wrap(source, width);
        for (const line of lines) expect(columns(line)).toBeLessThanOrEqual(width);
        expect(lines.join("").replaceAll(/\s/gu, "")).toBe(source.replaceAll(/\s/gu, ""));
        expect(columns(cut(source, width))).toBeLessThanOrEqual(width);
      }),
    );
    expect(cut("a long title", 6)).toBe("a lon…");
  });
});
