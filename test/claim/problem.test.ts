import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { echo, formatProblem } from "../../src/claim/problem.js";

describe("a problem in a line", () => {
  it("has place, path, what was found and what would be right", () =>
    expect(
      formatProblem({ file: "a.yaml", line: 3, column: 8, path: "title", found: "'x'", wanted: "y" }),
    ).toBe("a.yaml:3:8: title: found 'x'; wanted y"));

  it("has the file alone where the whole of it is meant", () =>
    expect(
      formatProblem({ file: "a.yaml", line: null, column: null, path: "", found: "x", wanted: "y" }),
    ).toBe("a.yaml: found x; wanted y"));

  it("is one line without control characters, whatever the file holds", () =>
    fc.assert(
      fc.property(fc.string({ unit: "binary" }), fc.string({ unit: "binary" }), (file, text) => {
        const line = formatProblem({ file, line: 1, column: 1, path: text, found: echo(text), wanted: "y" });
        expect(line).not.toMatch(/[\p{Cc}\p{Cf}\u2028\u2029]/u);
        expect(echo(text).length).toBeLessThan(130);
      }),
    ));

  it("cuts a long echo after 60 characters and never in the middle of one", () => {
    expect(echo("x".repeat(61))).toBe(`'${"x".repeat(60)}…'`);
    expect(echo("🪐".repeat(61))).toBe(`'${"🪐".repeat(60)}…'`);
  });
});
