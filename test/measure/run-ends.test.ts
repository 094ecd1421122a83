import { describe, expect, it } from "vitest";
import type { StepLoop } from "../../src/kernel/step-loop.js";
import { apsidalAdvance } from "../../src/measure/advance.js";
import { runPassages } from "../../src/measure/passages.js";
import type { PreparedScenario } from "../../src/measure/run.js";
import { handLoop, kepler } from "./hand-loop.js";
import { planarOrbit } from "./scenarios.js";

const leapfrog = handLoop("leapfrog", 4, kepler);
const run = (loop: StepLoop, scenario: PreparedScenario, perOrbit: number) =>
  runPassages(loop, scenario, scenario.parameters, scenario.period / perOrbit);

describe("a run ends", () => {
  it("ok at the N-th passage after the start", () => {
    const found = run(leapfrog, planarOrbit(1, 1, 0.3, 5), 100);
    expect(found.status).toBe("ok");
    expect(found.numbers).toEqual([0, 1, 2, 3, 4, 5]);
  });

  it("ok after a time, with every passage inside it and none after", () => {
    const orbit = planarOrbit(1, 1, 0.3, 5);
    const passages = (length: number) =>
      run(leapfrog, { ...orbit, span: { kind: "length", length: length * orbit.period } }, 200);
    expect(passages(5.5)).toMatchObject({ status: "ok", numbers: [0, 1, 2, 3, 4, 5] });
    // leapfrog's own period is longer by 8e-4 here: the fifth passage comes just after five periods.
    const fifth = passages(5.5).times[5]!;
    expect(passages(5).numbers).toEqual([0, 1, 2, 3, 4]);
    const exactly = run(leapfrog, { ...orbit, span: { kind: "length", length: fifth } }, 200);
    expect(exactly.numbers).toEqual([0, 1, 2, 3, 4, 5]);
    expect(passages(1.5).status).toBe("too-few-passages");
  });

  it("escaped or too-few-passages where Euler spirals out", () => {
    const ends = [32, 64].map((n) => run(handLoop("euler", 4, kepler), planarOrbit(1, 1, 0.3, 3), n));
    expect(ends.map(({ status }) => status)).toEqual(["escaped", "too-few-passages"]);
    for (const end of ends) expect(apsidalAdvance(end)).toBeNull();
    expect(run(handLoop("euler", 4, kepler), planarOrbit(1, 1, 0.5, 20), 128).status).toBe(
      "too-few-passages",
    );
  });

  it("escaped where a coarse step throws the body out", () => {
    const found = run(leapfrog, planarOrbit(1, 1, 0.9, 10), 100);
    expect(found.status).toBe("escaped");
    expect(found.steps).toBeLessThan(100 * 10 * 4);
  });

  it("timed-out at its limits, the same at every repetition", () => {
    const scenario = planarOrbit(1, 1, 0.3, 10);
    const step = scenario.period / 100;
    const cut = (limits: { steps: number; evaluations?: number }) => {
      const { seconds: _, ...rest } = runPassages(leapfrog, scenario, scenario.parameters, step, limits);
      return rest;
    };
    expect(cut({ steps: 550 })).toMatchObject({
      status: "timed-out",
      numbers: [0, 1, 2, 3, 4, 5],
      steps: 550,
    });
    expect(cut({ steps: 1e6, evaluations: 1000 })).toMatchObject({ status: "timed-out" });
    expect(cut({ steps: 1e6, evaluations: 1000 })).toEqual(cut({ steps: 1e6, evaluations: 1000 }));
    expect(cut({ steps: 150 }).status).toBe("too-few-passages");
  });

  it("non-finite where the state stops being a number", () => {
    const wall = handLoop("leapfrog", 4, (x, _v, out) => {
      out[0] = x[0]! < 0 ? Number.NaN : -x[0]!;
      out[1] = -x[1]!;
    });
    expect(run(wall, planarOrbit(1, 1, 0.3, 10), 100).status).toBe("non-finite");
  });

  it("unconverged where an implicit step is, in a whole step or in a partial one", () => {
    const failing = (fails: (step: number, call: number) => boolean): StepLoop => {
      let calls = 0;
      return {
        ...leapfrog,
        advance(io, parameters, step, steps) {
          const done = leapfrog.advance(io, parameters, step, steps);
          io[2 * 4 + 2] = fails(step, ++calls) ? 1 : 0;
          return done;
        },
      };
    };
    const scenario = planarOrbit(1, 1, 0.3, 10);
    const step = scenario.period / 100;
    expect(
      run(
        failing((_, call) => call === 20),
        scenario,
        100,
      ).status,
    ).toBe("unconverged");
    expect(
      run(
        failing((h) => h !== step),
        scenario,
        100,
      ).status,
    ).toBe("unconverged");
  });
});

describe("a start at periapsis", () => {
  it("is passage 0 even where its radial rate is negative by rounding", () => {
    const orbit = planarOrbit(1, 1, 0.3, 3);
    const [x, , , v] = orbit.state as [number, number, number, number];
    const found = run(leapfrog, { ...orbit, state: [x, 0, -1e-13, v] }, 200);
    expect(found.numbers).toEqual([0, 1, 2, 3]);
    expect(found.times[1]! / orbit.period).toBeCloseTo(1, 2);
  });

  it("is not counted again where a coarse step sees it late", () => {
    // At e = 1e-4 and 24 steps leapfrog's own ellipse is turned by far more than a step.
    for (const e of [1e-4, 1e-3, 3e-3, 1e-2]) {
      for (const n of [16, 24, 32, 48]) {
        const found = run(leapfrog, planarOrbit(1, 1, e, 6), n);
        expect(found.numbers.length).toBe(7);
        expect(found.times[1]).toBeGreaterThan(2);
      }
    }
  });
});

describe("a run", () => {
  it("does not depend on how its steps are cut into calls", () => {
    const single: StepLoop = {
      ...leapfrog,
      advance: (io, parameters, step, steps) => leapfrog.advance(io, parameters, step, Math.min(1, steps)),
    };
    for (const n of [7.3, 32, 100]) {
      const scenario = planarOrbit(1, 1, 0.2, 20);
      const { seconds: _a, ...whole } = run(leapfrog, scenario, n);
      const { seconds: _b, ...cut } = run(single, scenario, n);
      expect(cut).toEqual(whole);
    }
  });

  it("sees a passage that falls on a step's end once", () => {
    // A body on a circle of period 4 whose radial rate is made the sine of its angle: exactly 0 at every
    // fourth whole step.
    const scripted: StepLoop = {
      ...leapfrog,
      advance(io, _parameters, step, steps) {
        const [c, s] = step === 1 ? [0, 1] : [Math.cos((step * Math.PI) / 2), Math.sin((step * Math.PI) / 2)];
        for (let done = 1; ; done++) {
          const before = io[8]!;
          io.copyWithin(4, 0, 4);
          const [x, y] = [io[0]!, io[1]!];
          io.set([c * x - s * y, s * x + c * y, 0, 0]);
          io[8] = io[1]!;
          io[9] = 1;
          if (done === steps || (before < 0 && io[8]! >= 0)) return done;
        }
      },
    };
    const scenario = { ...planarOrbit(1, 1, 0.3, 3), state: [1, 0, 0, 0], period: 4 };
    const found = runPassages(scripted, scenario, [1], 1);
    expect(found.times).toEqual([0, 4, 8, 12]);
    expect(found.status).toBe("ok");
  });
});
