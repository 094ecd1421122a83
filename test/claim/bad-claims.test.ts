import { readdirSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { formatProblem, type Problem } from "../../src/claim/problem.js";
import { readClaim } from "../../src/claim/read.js";
import { badClaims } from "./bad-claims.js";

const folder = new URL("../../fixtures/bad-claims/", import.meta.url);
const files = readdirSync(folder);

const isOf = (problem: Problem, path: string, found: RegExp, wanted: RegExp): boolean =>
  problem.path === path && found.test(problem.found) && wanted.test(problem.wanted);

describe("a claim with a mistake", () => {
  it("is in the table, and the table has no other", () =>
    expect([...new Set(badClaims.map(([file]) => file))].sort()).toEqual([...files].sort()));

  it.each(files)("%s: is told of in full, at its place, in order", async (file) => {
    const read = await readClaim(new URL(file, folder).pathname);
    if (read.ok) throw new Error("read as a good claim");
    const expected = badClaims.filter(([name]) => name === file);
    const isExpected = (problem: Problem) =>
      expected.some(([, , path, found, wanted]) => isOf(problem, path, found, wanted));
    expect(read.problems.filter((problem) => !isExpected(problem)).map(formatProblem)).toEqual([]);
    const told = read.problems.map(formatProblem).join("\n");
    for (const [, place, path, found, wanted] of expected) {
      const match = read.problems.find((problem) => isOf(problem, path, found, wanted));
      expect(match, `${found} in\n${told}`).toBeDefined();
      expect([match?.line, match?.column], told).toEqual(place ?? [match?.line, match?.column]);
    }
    const places = read.problems.map(({ line, column }) => (line ?? 0) * 1e6 + (column ?? 0));
    expect(places).toEqual([...places].sort((a, b) => a - b));
  });
});
