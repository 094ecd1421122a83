import { describe, expect, it } from "vitest";
import { aspectsOf, widestAspect } from "../../src/measure/aspects.js";
import { driftOf } from "../../src/measure/drift.js";
import { type OrbitMean, orbitMean } from "../../src/measure/orbit-mean.js";

const SAMPLES = 48;

/** Orbit means of a curve of time in orbits, sampled with a phase that slips from orbit to orbit. */
function sampled(orbits: number, curve: (t: number) => readonly number[]): OrbitMean[] {
  const means: OrbitMean[] = [];
  const spacing = 1 / (SAMPLES + 0.37);
  for (let k = 0, i = 0; k < orbits; k++) {
    const phases: number[] = [];
    const rows: (readonly number[])[] = [];
    for (; i * spacing < k + 1; i++) {
      phases.push(i * spacing - k);
      rows.push(curve(i * spacing));
    }
    means.push(orbitMean(phases, rows)!);
  }
  return means;
}

/** The pattern of a scalar curve, with its largest value as it would be seen. */
function patternOf(orbits: number, curve: (t: number) => number, rounding = 1e-15): string {
  const means = sampled(orbits, (t) => [curve(t)]);
  const largest = Math.max(
    ...Array.from({ length: orbits * SAMPLES }, (_, i) => Math.abs(curve(i / SAMPLES))),
  );
  const swing = Math.max(...means.map((orbit) => orbit.swing));
  return driftOf(largest, widestAspect(aspectsOf(means, [1]))!, swing, rounding, rounding / 100).pattern;
}

/** Peaked at whole orbits, as leapfrog's energy is: the inverse cube of the distance at e = 0.6 or so. */
const peak = (t: number): number => 1 / (1 - 0.6 * Math.cos(2 * Math.PI * t)) ** 3;
/** A staircase whose steps are a few hundredths of an orbit wide. */
const stairs = (t: number): number => Math.round(t) + Math.tanh((t - Math.round(t)) / 0.02) / 2;

describe("driftOf", () => {
  it("names each pattern", () => {
    expect(patternOf(50, (t) => 1e-16 * Math.sin(40 * t))).toBe("rounding-level");
    expect(patternOf(50, (t) => 1e-4 * (peak(t) - peak(0)))).toBe("bounded-oscillation");
    expect(patternOf(50, (t) => -1e-9 * t)).toBe("linear-drift");
    expect(patternOf(50, (t) => 1e-9 * t ** 2)).toBe("faster-growth");
    expect(patternOf(50, (t) => 1e-9 * stairs(t))).toBe("jumps-at-periapsis");
  });

  it("sees a drift through a swing ten times as large, and not one of a thousandth of it", () => {
    const swing = (t: number): number => 1e-6 * (peak(t) - peak(0));
    const size = 1e-6 * peak(0);
    expect(patternOf(50, (t) => swing(t) + (0.1 * size * t) / 50)).toBe("linear-drift");
    expect(patternOf(50, (t) => swing(t) + (0.001 * size * t) / 50)).toBe("bounded-oscillation");
  });

  it("tells a staircase from a ramp under a swing that is the same before and after the passages", () => {
    expect(patternOf(50, (t) => stairs(t) + 2 * peak(t))).toBe("jumps-at-periapsis");
    expect(patternOf(50, (t) => t + 2 * peak(t))).toBe("linear-drift");
  });
});

describe("orbitMean", () => {
  it("averages a periodic peak to the same value at any phase of the samples", () => {
    // The mean under the weight sin⁶, from a thousand times as many samples.
    const fine = orbitMean(
      Array.from({ length: 48000 }, (_, i) => i / 48000),
      Array.from({ length: 48000 }, (_, i) => [peak(i / 48000)]),
    )!;
    for (const { mean } of sampled(20, (t) => [peak(t)]))
      expect(Math.abs(mean[0]! - fine.mean[0]!)).toBeLessThan(1e-9);
  });

  it("has no stretch where no sample falls, and no mean of nothing", () => {
    expect(orbitMean([0.5], [[2]])).toEqual({ mean: [2], early: null, late: null, swing: 0 });
    expect(orbitMean([], [])).toBeNull();
    expect(orbitMean([0], [[1]])).toBeNull();
  });
});

describe("aspectsOf", () => {
  it("follows a vector that turns through whole turns, or grows", () => {
    const turning = sampled(40, (t) => [Math.cos(0.4 * t) - 1, Math.sin(0.4 * t)]);
    const turn = widestAspect(aspectsOf(turning, [1, 0]))!.mean;
    expect(turn[39]! - turn[0]!).toBeCloseTo(0.4 * 39, 3);
    const growing = sampled(40, (t) => [0.6 * 0.01 * t, 0.8 * 0.01 * t]);
    const growth = widestAspect(aspectsOf(growing, [0.6, 0.8]))!.mean;
    expect(growth[39]! - growth[0]!).toBeCloseTo(0.39, 6);
  });

  it("follows a turn out of the plane, either way round", () => {
    const turning = sampled(10, (t) => [Math.cos(0.1 * t) - 1, 0, -Math.sin(0.1 * t)]);
    const turn = widestAspect(aspectsOf(turning, [1, 0, 0]))!.mean;
    expect(Math.abs(turn[9]! - turn[0]!)).toBeCloseTo(0.9, 4);
  });

  it("sees a vector that starts near nothing along its way", () => {
    const means = sampled(10, (t) => [3 * t, -4 * t]);
    expect(widestAspect(aspectsOf(means, null))!.mean[9]! - 5 * 9.5).toBeCloseTo(0, 1);
  });
});
