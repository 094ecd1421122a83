import { describe, expect, it } from "vitest";
import { toDouble } from "../../src/arithmetic/double-double.js";
import { newtonian } from "../../src/equations/catalog/newtonian.js";
import { postNewtonian1 } from "../../src/equations/catalog/post-newtonian-1.js";
import { compileSystem } from "../../src/kernel/system.js";
import { preciseOrbit, referenceMethods } from "../../src/reference/orbit.js";
import { planarOrbit } from "../measure/scenarios.js";

describe.each(referenceMethods)("the reference by %s", (method) => {
  it.each([0.01, 0.2056, 0.7, 0.95])("turns no apsis of a Kepler ellipse of e = %d", (e) => {
    const system = compileSystem(newtonian, { parameters: ["GM"], planar: true });
    const scenario = planarOrbit(1.3e20, 5.8e10, e, 10);
    const orbit = preciseOrbit(method, system, scenario, scenario.precise.parameters, 1e-24, 1e8);
    console.log(method, e, orbit, performance.now());
    expect(orbit.end).toBe("done");
    expect(Math.abs(toDouble(orbit.advance!))).toBeLessThan(1e-20);
  });
  it("pn", () => {
    const system = compileSystem(postNewtonian1, { parameters: ["GM", "c"], planar: true });
    const scenario = planarOrbit(1.3e20, 5.8e10, 0.2056, 10, [3e8], [1.3e20, Infinity]);
    for (const tol of [1e-16, 1e-18, 1e-20, 1e-22, 1e-24]) {
      const t0 = performance.now();
      const orbit = preciseOrbit(method, system, scenario, scenario.precise.parameters, tol, 1e8);
      console.log(method, tol, orbit.method, orbit.advance, orbit.evaluations, performance.now() - t0);
    }
    const orbit = preciseOrbit(method, system, scenario, scenario.precise.nullParameters!, 1e-22, 1e8);
    console.log(method, orbit);
  });
});
