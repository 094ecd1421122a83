import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { apart, asWritten, blanks, grouped, margin, shown } from "../../src/report/format.js";

const claimed = (text: string, value: number, halfWidth = 0.005) => ({
  text,
  value,
  halfWidth,
  unit: "arcsec/century",
  baseline: "included" as const,
  quantity: "apsidal-advance",
  digits: 4,
});

describe("a figure", () => {
  it("is never written as nought when it is not", () => {
    expect(shown(57.92365, 411.4)).toBe("57.9");
    expect(shown(7.35e-11, 1.02e-9)).toBe("7.35e-11");
    expect(shown(-0.0018, 0.187)).toBe("-0.00180");
    expect(shown(0, 1)).toBe("0");
    fc.assert(
      fc.property(
        fc.double({ min: -1e12, max: 1e12, noNaN: true }).filter((value) => Math.abs(value) > 1e-300),
        fc.double({ min: 0, max: 1e12, noNaN: true }),
        (value, halfWidth) => {
          expect(Number(shown(value, halfWidth))).not.toBe(0);
        },
      ),
    );
  });

  it("keeps the digits that its half-width leaves, rounded and not cut", () => {
    expect(shown(42.98043975, 9.31e-7)).toBe("42.98043975");
    expect(shown(62.0222359, 0.5)).toBe("62.02");
    expect(shown(62.0272359, 0.5)).toBe("62.03");
  });

  it("is nothing where there is nothing to compare", () => {
    expect([apart(null, 1), apart(1, null), apart(62.0222, 42.9804)]).toEqual(["", "", "19.0"]);
  });
});

describe("the claim", () => {
  it("keeps the noughts and the margin that the author wrote", () => {
    expect(asWritten(claimed("42.90 arcsec/century", 42.9))).toBe("42.90");
    expect(asWritten(claimed("104.40(2) arcsec/century", 104.4))).toBe("104.40");
    expect(asWritten(claimed("−3.10 ± 0.02 deg/yr", -3.1))).toBe("−3.10");
    // With an exponent the digits alone are not the value.
    expect(asWritten(claimed("4.30e1 arcsec/century", 43))).toBe("43");
    expect(margin(claimed("42.98", 42.98, 0.005000000000000001))).toBe("0.005");
  });
});

describe("a column", () => {
  it("has its points in line when what is missing is left blank", () => {
    const column = ["42.98", "62.0222359", "−433.29", "7", "1.15 × 10⁻⁸", "none", ""];
    const filled = column.map((text, k) => text + blanks(column)[k]!);
    expect(filled.slice(0, 4)).toEqual(["42.9800000", "62.0222359", "−433.2900000", "7.0000000"]);
    expect(filled.slice(4)).toEqual(column.slice(4));
  });

  it("of whole numbers is left alone", () => {
    expect(blanks(["1", "20", "300"])).toEqual(["", "", ""]);
    expect(blanks([])).toEqual([]);
  });
});

describe("a count", () => {
  it("is grouped from five digits on", () => {
    expect([0, 999, 1708, 20860, 328004, 12345678].map((count) => grouped(count, " "))).toEqual([
      "0",
      "999",
      "1708",
      "20 860",
      "328 004",
      "12 345 678",
    ]);
  });
});
