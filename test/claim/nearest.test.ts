import { describe, expect, it } from "vitest";
import { nearest, oneOf } from "../../src/claim/nearest.js";

describe("the nearest known name", () => {
  // F. J. Damerau, Commun. ACM 7, 171 (1964): the four single slips.
  it.each([
    ["perapsis", "a character less"],
    ["perriapsis", "a character more"],
    ["periaxsis", "another character"],
    ["periapssi", "two neighbours exchanged"],
    ["Periapsis", "a capital"],
  ])("%s: %s", (slip) => expect(nearest(slip, ["apoapsis", "periapsis", "node"])).toBe("periapsis"));

  it("exchanges count once even in a short name", () =>
    expect(nearest("titel", ["cupel", "title", "claimed"])).toBe("title"));

  it("leaves what is near nothing, and lists what is known", () => {
    expect(nearest("weather", ["cupel", "title"])).toBeNull();
    expect(nearest("", ["m"])).toBeNull();
    expect(nearest("q", ["c"])).toBeNull();
    expect(nearest("t".repeat(1_000_000), ["title"])).toBeNull();
    expect(oneOf("weather", ["cupel", "title"])).toBe("one of cupel, title");
  });
});
