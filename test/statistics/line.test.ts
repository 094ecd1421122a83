import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fitLine } from "../../src/statistics/line.js";

describe("fitLine", () => {
  // NIST Statistical Reference Datasets, Norris (linear regression, lower difficulty), certified values.
  const norris: readonly (readonly [number, number])[] = [
    [0.1, 0.2],
    [338.8, 337.4],
    [118.1, 118.2],
    [888.0, 884.6],
    [9.2, 10.1],
    [228.1, 226.5],
    [668.5, 666.3],
    [998.5, 996.3],
    [449.1, 448.6],
    [778.9, 777.0],
    [559.2, 558.2],
    [0.3, 0.4],
    [0.1, 0.6],
    [778.1, 775.5],
    [668.8, 666.9],
    [339.3, 338.0],
    [448.9, 447.5],
    [10.8, 11.6],
    [557.7, 556.0],
    [228.3, 228.1],
    [998.0, 995.8],
    [888.8, 887.6],
    [119.6, 120.2],
    [0.3, 0.3],
    [0.6, 0.3],
    [557.6, 556.8],
    [339.3, 339.1],
    [888.0, 887.2],
    [998.5, 999.0],
    [778.9, 779.0],
    [10.2, 11.1],
    [117.6, 118.3],
    [228.9, 229.2],
    [668.4, 669.1],
    [449.2, 448.9],
    [0.2, 0.5],
  ]
    .map(([y, x]) => [x!, y!] as const)
    .map(([x, y]) => [x, y]);

  it("agrees with the certified values of NIST's Norris data", () => {
    const line = fitLine(
      norris.map((p) => p[0]),
      norris.map((p) => p[1]),
    )!;
    expect(line.slope).toBeCloseTo(1.00211681802045, 12);
    expect(line.intercept).toBeCloseTo(-0.262323073774029, 11);
    expect(line.slopeError).toBeCloseTo(0.429796848199937e-3, 13);
  });

  it("keeps the slope at abscissae as large as a Julian date", () => {
    const x = Array.from({ length: 50 }, (_, i) => 2_451_545 + i * 0.01);
    const line = fitLine(
      x,
      x.map((value) => 2e-6 * (value - 2_451_545)),
    )!;
    expect(Math.abs(line.slope / 2e-6 - 1)).toBeLessThan(1e-8);
  });

  it("gives the weighted slope of repeated points", () => {
    const plain = fitLine([0, 1, 1, 2, 3], [0, 2, 2, 3, 7])!;
    const weighted = fitLine([0, 1, 2, 3], [0, 2, 3, 7], [1, 2, 1, 1])!;
    expect(weighted.slope).toBeCloseTo(plain.slope, 14);
  });

  it("refuses one point and equal abscissae", () => {
    expect(fitLine([1], [1])).toBeNull();
    expect(fitLine([2, 2, 2], [1, 2, 3])).toBeNull();
  });

  it("moves with the data: shifting x or y leaves the slope", () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -100, max: 100 }), { minLength: 3, maxLength: 9 }), (y) => {
        const x = y.map((_, i) => i);
        const line = fitLine(x, y)!;
        const shifted = fitLine(
          x.map((v) => v + 1024),
          y.map((v) => v - 512),
        )!;
        expect(shifted.slope).toBeCloseTo(line.slope, 10);
      }),
    );
  });
});
