import { describe, expect, it } from "vitest";
import { findEquations } from "../../src/equations/catalog/index.js";
import { keplerState } from "../measure/scenarios.js";
import { elements, orbitOf } from "./orbit.js";

const TILT = 0.9;
const ORBITS = 5;

describe.each([0.1, 0.3, 0.6])("an inclined Kepler orbit, e = %d", (e) => {
  const orbit = orbitOf(
    findEquations("newtonian")!,
    { GM: 1 },
    elements(1 - e, 1 + e, { inclination: TILT }),
    ORBITS,
  );

  /** Kepler's equation M = E - e sin E solved by Newton's method, in a plane turned about the x axis. */
  const exact = (time: number): number[] => {
    const [x, y, vx, vy] = keplerState(1, 1, e, time) as [number, number, number, number];
    const [cosine, sine] = [Math.cos(TILT), Math.sin(TILT)];
    return [x, y * cosine, y * sine, vx, vy * cosine, vy * sine];
  };

  it.each(["dormand-prince-8", "yoshida-8", "gauss-legendre-6"])(
    "is followed all the way for five orbits by %s",
    (method) => {
      const loop = orbit.loop(method);
      const io = new Float64Array(loop.ioLength);
      io.set(orbit.scenario.state);
      // Fine enough that what is left is rounding, carried along the orbit.
      const perOrbit = 3200;
      const step = orbit.scenario.period / perOrbit;
      for (let taken = 0; taken < ORBITS * perOrbit; ) {
        taken += loop.advance(io, Float64Array.of(1), step, 40 - (taken % 40));
        const off = exact(taken * step).map((value, i) => Math.abs(value - io[i]!));
        expect(Math.max(...off), `after ${taken} steps`).toBeLessThan(2e-11);
      }
    },
  );
});

it("as an orbit equation is the ellipse u = K (1 + e cos φ)", () => {
  const orbit = orbitOf(findEquations("newtonian-angle")!, {}, elements(0.7, 1.3), 5);
  const loop = orbit.loop("gauss-legendre-6");
  const io = new Float64Array(loop.ioLength);
  io.set(orbit.scenario.state);
  const step = Math.PI / 500;
  for (let taken = 0; taken < 5000; ) {
    taken += loop.advance(io, Float64Array.from(orbit.scenario.parameters), step, 50 - (taken % 50));
    expect(Math.abs(io[0]! - (1 + 0.3 * Math.cos(taken * step)) / 0.91)).toBeLessThan(1e-12);
  }
});
