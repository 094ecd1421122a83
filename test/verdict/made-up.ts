import type { Ladder, LedgerEntry, Rung } from "../../src/result/result.js";
import type { Evidence, SolutionEvidence } from "../../src/verdict/evidence.js";

/** Made-up evidence of a sound solution: an rk4 ladder of order 4 about 42.98044, differenced. */
export function evidence(
  changes: {
    readonly claimed?: Partial<Evidence["claimed"]>;
    readonly solution?: Partial<SolutionEvidence> | null;
    readonly best?: Partial<NonNullable<Evidence["best"]>> | null;
    readonly own?: Partial<Ladder>;
    readonly witness?: Partial<Ladder>;
    readonly ledger?: readonly LedgerEntry[];
    readonly nullExists?: boolean;
  } = {},
): Evidence {
  return {
    claimed: {
      value: 42.98,
      halfWidth: 0.005,
      digits: 4,
      unit: "arcsec/century",
      baseline: "subtracted",
      ...changes.claimed,
    },
    solution:
      changes.solution === null
        ? null
        : {
            method: "rk4",
            formalOrder: 4,
            conserving: false,
            stepsPerOrbit: 256,
            rung: 3,
            status: "ok",
            nullStatus: "ok",
            raw: 62.02222,
            null: 19.04182,
            value: 42.9804,
            rounding: 1e-7,
            readingOff: 0,
            crossReading: null,
            ...changes.solution,
          },
    best: changes.best === null ? null : { value: 42.98044, halfWidth: 1e-6, sound: true, ...changes.best },
    ladders: [ladder("rk4", "solution", changes.own), ladder("dormand-prince-8", "witness", changes.witness)],
    ledger: changes.ledger ?? [entry("energy", { perOrbit: 1e-9 })],
    orbits: 20,
    nullExists: changes.nullExists ?? true,
    writeStep: (perOrbit) => `${Math.ceil(perOrbit)} steps an orbit`,
  };
}

export function entry(quantity: string, changes: Partial<LedgerEntry> = {}): LedgerEntry {
  return {
    quantity,
    largest: 1e-8,
    perOrbit: 0,
    pattern: "linear-drift",
    exponent: 1,
    stepOrder: 5,
    series: { orbits: [], change: [] },
    says: "",
    ...changes,
  };
}

function ladder(method: string, role: Ladder["role"], changes: Partial<Ladder> = {}): Ladder {
  return {
    method,
    role,
    formalOrder: 4,
    stateOrder: 4.02,
    figureOrder: 4,
    figureOrderInterval: [3.98, 4.02],
    window: [1, 6],
    shape: "asymptotic",
    says: "",
    extrapolated: { value: 42.98044, halfWidth: 1e-6 },
    coefficient: 4e-5 * 256 ** 4,
    floor: 1e-8,
    rungs: Array.from({ length: 7 }, (_, k): Rung => {
      const stepsPerOrbit = 32 * 2 ** k;
      const figure = 42.98044 - 4e-5 * (256 / stepsPerOrbit) ** 4;
      return {
        step: 1 / stepsPerOrbit,
        stepsPerOrbit,
        status: "ok",
        value: figure,
        null: 0,
        figure,
        standardError: 0,
        stateDifference: null,
        evaluations: 80 * stepsPerOrbit,
        seconds: 0,
        isAuthors: role === "solution" && k === 3,
      };
    }),
    ...changes,
  };
}
