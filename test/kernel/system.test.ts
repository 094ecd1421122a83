import { describe, expect, it } from "vitest";
import { equationsCatalog, findEquations } from "../../src/equations/catalog/index.js";
import type { EquationsDefinition } from "../../src/equations/definition.js";
import { evaluate, inOrder, mentions } from "../../src/formula/walk.js";
import { appliesTo } from "../../src/kernel/applies-to.js";
import { compileStepLoop, stepLoopInC } from "../../src/kernel/compile.js";
import { conservedObservables } from "../../src/kernel/observables.js";
import { compileSystem } from "../../src/kernel/system.js";
import { findMethod, methodsCatalog } from "../../src/methods/catalog/index.js";

const system = (name: string, parameters: readonly string[], planar = false) =>
  compileSystem(findEquations(name)!, { parameters, planar });

describe("a compiled system", () => {
  it("leaves out z where the equations keep it zero", () => {
    expect(system("newtonian", ["GM"], true).states).toEqual(["x", "y", "vx", "vy"]);
    expect(system("newtonian", ["GM"]).states).toEqual(["x", "y", "z", "vx", "vy", "vz"]);
    expect(system("post-newtonian-1", ["GM", "c", "mass-ratio"], true).states).toHaveLength(4);
    expect(system("oblate", ["GM", "R", "J2"], true).states).toHaveLength(4);
  });

  it("keeps z where a motion in the plane is pulled out of it: J3 is not the same north and south", () => {
    expect(system("oblate", ["GM", "R", "J2", "J3"], true).states).toHaveLength(6);
  });

  it("folds in a parameter that the claim leaves out", () => {
    const particle = system("post-newtonian-1", ["GM", "c"]);
    expect(particle.parameters).toEqual(["GM", "c"]);
    const operations = (nodes: typeof particle.accelerations) =>
      new Set(nodes.flatMap((node) => inOrder(node))).size;
    const twoBodies = system("post-newtonian-1", ["GM", "c", "mass-ratio"]);
    expect(twoBodies.parameters).toEqual(["GM", "c", "mass-ratio"]);
    expect(operations(particle.accelerations)).toBeLessThan(operations(twoBodies.accelerations));
    expect(particle.accelerations.some((node) => mentions(node, (name) => name === "nu"))).toBe(false);
  });

  it("keeps a parameter without a default even where it is not given", () => {
    expect(system("newtonian", []).parameters).toEqual(["GM"]);
  });

  it("takes Newton's force from the potential", () => {
    const { accelerations } = system("newtonian", ["GM"]);
    const at: Record<string, number> = { x: 3, y: -4, z: 12, GM: 2197 };
    // r = 13, GM = 13³.
    expect(accelerations.map((node) => evaluate(node, (name) => at[name]!))).toEqual([
      expect.closeTo(-3, 14),
      expect.closeTo(4, 14),
      expect.closeTo(-12, 13),
    ]);
  });

  it("adds the energy of a potential: vis-viva, v²/2 - GM/r = -GM/(2a)", () => {
    const [energy] = conservedObservables(system("newtonian", ["GM"], true), [1]);
    // Periapsis of a = 2, e = 0.5: r = 1, v² = GM (2/r - 1/a) = 1.5.
    expect(energy!.name).toBe("energy");
    expect(energy!.value([1, 0, 0, Math.sqrt(1.5)])[0]).toBeCloseTo(-0.25, 15);
  });

  it("knows what depends on the velocity", () => {
    const dependent = equationsCatalog.filter(
      (definition) => compileSystem(definition, { parameters: [], planar: false }).velocityDependent,
    );
    expect(dependent.map(({ name }) => name)).toEqual(["post-newtonian-1"]);
  });

  it("turns the radius as x·v, or as -u' in angle form", () => {
    const at: Record<string, number> = { x: 2, y: 3, z: 5, vx: 7, vy: 11, vz: 13, u: 4, w: 6 };
    const rate = (name: string) => evaluate(system(name, []).radialRate, (symbol) => at[symbol]!);
    expect(rate("newtonian")).toBe(2 * 7 + 3 * 11 + 5 * 13);
    expect(rate("newtonian-angle")).toBe(-6);
  });
});

describe("a splitting method", () => {
  it.each(methodsCatalog.filter(({ family }) => family === "splitting").map(({ name }) => name))(
    "%s refuses accelerations that depend on velocity, and says why",
    (name) => {
      const applies = appliesTo(findMethod(name)!, system("post-newtonian-1", []));
      expect(applies.ok).toBe(false);
      if (applies.ok) return;
      expect(applies.reason).toContain(name);
      expect(applies.reason).toContain("post-newtonian-1");
      expect(applies.reason).toMatch(/velocity/);
      expect(appliesTo(findMethod(name)!, system("oblate", [])).ok).toBe(true);
    },
  );
});

describe("a generated loop", () => {
  it("holds none of the names of a definition, whatever they are", () => {
    const odd: EquationsDefinition = {
      name: "odd-names",
      title: "Kepler's problem with names that mean something elsewhere",
      display: "r'' = -GM r / |r|^3",
      form: "time",
      source: "common practice",
      parameters: {
        GM: { symbol: "constructor", unit: "m^3/s^2", meaning: "the centre", range: "positive" },
      },
      coordinates: {
        x: { rate: "__proto__", unit: "m" },
        while: { rate: "arguments", unit: "m" },
      },
      let: { eval: "sqrt(x^2 + while^2)" },
      potential: "-constructor / eval",
      conserved: { momentum: { formula: "x*arguments - while*__proto__", unit: "m^2/s" } },
    };
    const compiled = compileSystem(odd, { parameters: ["GM"], planar: false });
    const loop = compileStepLoop(compiled, findMethod("rk4")!);
    const text = stepLoopInC(compiled, findMethod("rk4")!, "loop");
    for (const name of ["constructor", "__proto__", "arguments", "eval"]) expect(text).not.toContain(name);

    const io = new Float64Array(loop.ioLength);
    io.set([1, 0, 0, 1]);
    // A circle of period 2π, at 1000 steps: rk4 is right to some 1e-10.
    const ran = loop.advance(io, Float64Array.of(1), (2 * Math.PI) / 1000, 250);
    expect(ran).toBe(250);
    expect(io[0]).toBeCloseTo(0, 8);
    expect(io[1]).toBeCloseTo(1, 8);
    expect(conservedObservables(compiled, [1])[1]!.value(io.slice(0, 4))[0]).toBeCloseTo(1, 9);
  });
});
