import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { growthOf } from "../../src/measure/growth.js";

/** Repeatable normal deviates: the generator of Park and Miller (1988), by Box and Muller's transform (1958). */
function deviates(seed: number): () => number {
  let state = (seed % 2147483646) + 1;
  const uniform = (): number => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}
const series = (count: number, value: (k: number) => number): number[] =>
  Array.from({ length: count }, (_, k) => value(k));
const walk = (count: number, step: () => number): number[] => {
  let at = 0;
  return series(count, () => (at += step()));
};
/** How many of 200 repetitions come out as each kind. */
function tally(make: (normal: () => number) => number[]): Record<string, number> {
  const counts: Record<string, number> = { none: 0, linear: 0, faster: 0, "random-walk": 0 };
  for (let seed = 1; seed <= 200; seed++) counts[growthOf(make(deviates(seed * 7919)), 0).kind]!++;
  return counts;
}

describe("growthOf", () => {
  it("reads the power of clean growth", () => {
    for (const p of [0.5, 1, 1.5, 2, 3]) {
      const found = growthOf(
        series(60, (k) => 3 - 2e-9 * (k + 0.5) ** p),
        1e-18,
      );
      expect(found.exponent).toBeCloseTo(p, 3);
      expect(found.kind).toBe(p > 1.25 ? "faster" : "linear");
      expect(found.slope).toBeLessThan(0);
    }
  });

  it("finds no growth in scatter", () => {
    for (const count of [20, 100, 400])
      expect(tally((normal) => series(count, normal)).none).toBeGreaterThan(190);
  });

  it("finds a steady drift under scatter as large as a tenth of it", () => {
    for (const count of [20, 100]) {
      const counts = tally((normal) => series(count, (k) => k / count + 0.1 * normal()));
      expect(counts.linear! + (count === 20 ? counts.faster! : 0)).toBeGreaterThan(190);
    }
  });

  it("finds a random walk, and its exponent of a half", () => {
    expect(tally((normal) => walk(100, normal))["random-walk"]).toBeGreaterThan(160);
    const exponents: number[] = [];
    for (let seed = 1; seed <= 50; seed++) {
      const found = growthOf(walk(400, deviates(seed * 104729)), 0);
      if (found.kind === "random-walk") exponents.push(found.exponent!);
    }
    expect(exponents.length).toBeGreaterThan(45);
    expect(exponents.reduce((sum, p) => sum + p, 0) / exponents.length).toBeCloseTo(0.5, 1);
  });

  it("finds the drift of uneven steps that go one way", () => {
    expect(tally((normal) => walk(100, () => 1 + 0.5 * normal())).linear).toBeGreaterThan(190);
  });

  it("finds faster growth under scatter", () => {
    expect(tally((normal) => series(100, (k) => (k / 100) ** 2 + 0.05 * normal())).faster).toBeGreaterThan(
      190,
    );
  });

  it("takes a long swing for no growth", () => {
    for (const turns of [1.5, 2, 3.3]) {
      expect(
        growthOf(
          series(100, (k) => Math.sin((2 * Math.PI * turns * k) / 100)),
          0,
        ).kind,
      ).toBe("none");
    }
  });

  it("does not depend on the scale, the sign or an offset", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e6 }),
        fc.constantFrom(1e-14, 1e-6, 1, 1e5),
        fc.constantFrom(-1, 1),
        (seed, scale, sign) => {
          const plain = walk(40, deviates(seed));
          const other = growthOf(
            plain.map((value) => sign * scale * value),
            0,
          );
          expect(other.kind).toBe(growthOf(plain, 0).kind);
          expect(
            growthOf(
              plain.map((value) => value + 1),
              0,
            ).kind,
          ).toBe(other.kind);
        },
      ),
    );
  });

  it("says what it can of a handful of orbits", () => {
    expect(growthOf([1, 2, 3], 0)).toEqual({ kind: "linear", slope: 1, exponent: null });
    expect(growthOf([1, 2, 1.5, 2], 0).kind).toBe("none");
    expect(growthOf([1], 0)).toEqual({ kind: "none", slope: 0, exponent: null });
  });
});
