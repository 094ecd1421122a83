import { expect, it } from "vitest";
import { fromDouble } from "../../src/arithmetic/double-double.js";
import { findEquations } from "../../src/equations/catalog/index.js";
import { exactOrbit } from "../../src/truth/exact-orbit.js";
import { elements, orbitOf } from "../published/orbit.js";

/*
 * The project's own step loops at fine steps come to the same: an independent road from the same start, through
 * the equations as they are in the catalog.
 */
it.each([
  ["schwarzschild-angle", { GM: 1, c: 1 }, 30, 60],
  ["post-newtonian-1", { GM: 1, c: 1, "mass-ratio": 0 }, 60, 120],
  ["post-newtonian-1", { GM: 1, c: 1, "mass-ratio": 0.25 }, 60, 120],
  ["oblate", { GM: 1, R: 0.4, J2: 0.01, J3: 0, J4: -0.002 }, 1, 2],
])("%s with %o", (name, parameters, periapsis, apoapsis) => {
  const orbit = orbitOf(findEquations(name)!, parameters, elements(periapsis, apoapsis), 10);
  const { scenario } = orbit;
  const open = Object.fromEntries(Object.entries(parameters).map(([key, value]) => [key, fromDouble(value)]));
  if (name === "schwarzschild-angle")
    open["inverse-semi-latus-rectum"] = fromDouble(scenario.parameters.at(-1)!);
  const exact = exactOrbit(name, open, scenario.state.map(fromDouble))!;
  const { perOrbit } = orbit.advance("gauss-legendre-6", 800);
  expect(Math.abs(perOrbit / exact.advance.high - 1)).toBeLessThan(1e-10);
});

it("knows nothing of an oblate body's orbit out of its equator, or pulled out of it", () => {
  const state = (z: number, vz: number) => [1, 0, z, 0, 1.1, vz].map(fromDouble);
  const parameters = (J3: number) =>
    Object.fromEntries(
      Object.entries({ GM: 1, R: 0.4, J2: 0.01, J3, J4: 0 }).map(([key, value]) => [key, fromDouble(value)]),
    );
  expect(exactOrbit("oblate", parameters(0), state(0, 0))).not.toBeNull();
  expect(exactOrbit("oblate", parameters(0), state(0, 0.1))).toBeNull();
  expect(exactOrbit("oblate", parameters(0.001), state(0, 0))).toBeNull();
});
