import { methodsCatalog } from "../methods/catalog/index.js";
import type { MethodDefinition } from "../methods/definition.js";
import { mistyped } from "./mistyped.js";
import type { Random } from "./random.js";

/**
 * What a claim does with the figure of its own run:
 * - sound: quotes a margin that the error stays inside
 * - over-quoted: quotes a margin that the error exceeds
 * - artefact: quotes digits off a run so coarse that the numerics may make up the figure
 * - contradicted: quotes what neither the run nor the equations give
 */
export const kinds = ["sound", "over-quoted", "artefact", "contradicted"] as const;
export type Kind = (typeof kinds)[number];

/** A scenario and a solution, as a claim file would hold them, before anything is quoted. */
export interface Draw {
  readonly kind: Kind;
  readonly equations: string;
  readonly scenario: Readonly<Record<string, unknown>>;
  readonly method: MethodDefinition;
  readonly isMistyped: boolean;
  readonly stepsPerOrbit: number;
  readonly arithmetic: "double" | "single";
  readonly baseline: "included" | "subtracted";
  readonly unit: string;
  /** Audited on the ladders alone, as where a reference would be too dear. */
  readonly withoutReference: boolean;
}

/** Evaluations that the ladders of one audit may take, as a rule and now and then. */
const BUDGET = 5e6;
const LARGE_BUDGET = 5e7;
const LARGE = 0.03;
/** Evaluations a step of all methods together, times the sum over a ladder down to a sixteenth of the step. */
const LADDERS = 40 * 32;

/** The true figure of the first two is 0: one claim in four is on that. */
const EFFECTS = ["schwarzschild-angle", "post-newtonian-1", "oblate"] as const;
const EQUATIONS = ["newtonian", "newtonian-angle", ...EFFECTS, ...EFFECTS] as const;
const IN_ANGLE: readonly string[] = ["newtonian-angle", "schwarzschild-angle"];

/** Draws a claim of an invented system. */
export function draw(random: Random): Draw {
  const kind = random.pick(kinds);
  const equations = random.pick(EQUATIONS);
  const inAngle = IN_ANGLE.includes(equations);
  const GM = random.decades(1e14, 1e21);
  // GM/(c² a), or J2 (R/a)²: from a hardly visible effect to a strong one.
  const strength = random.decades(1e-9, 3e-3);
  const c = 299_792_458;
  const relativistic = equations === "schwarzschild-angle" || equations === "post-newtonian-1";
  const a = relativistic ? GM / (c * c) / strength : random.decades(1e7, 1e12);
  // No orbit of a strong field dips into the centre.
  const most = Math.min(0.95, 1 - 20 * (relativistic ? strength : 0));
  const e = random.chance(0.1) ? random.decades(1e-3, 0.05) : random.between(0.01, most);
  const hasEffect = relativistic || equations === "oblate";
  const orbits = Math.round(random.decades(3, 30));

  const applicable = methodsCatalog.filter(
    ({ family }) => family !== "splitting" || equations !== "post-newtonian-1",
  );
  const sound = random.pick(applicable);
  const isMistyped = sound.family === "explicit-runge-kutta" && random.chance(0.08);
  const method = isMistyped ? mistyped(sound, random) : sound;
  const budget = random.chance(LARGE) ? LARGE_BUDGET : BUDGET;
  const finest = budget / LADDERS / orbits;
  const coarsest = kind === "artefact" ? 10 : 16;
  const stepsPerOrbit = Math.round(random.decades(coarsest, Math.max(2 * coarsest, finest)));

  const angles = ["deg", "arcmin", "arcsec", "mas", "uas"];
  const times = inAngle ? ["orbit"] : ["orbit", "d", "yr", "century"];
  return {
    kind,
    equations,
    method,
    isMistyped,
    stepsPerOrbit,
    arithmetic: random.chance(0.08) ? "single" : "double",
    withoutReference: random.chance(0.2),
    // Where nothing can be switched off there is nothing to subtract.
    baseline: hasEffect && random.chance(0.4) ? "subtracted" : "included",
    unit: `${random.pick(angles)}/${random.pick(times)}`,
    scenario: {
      equations,
      parameters: parametersOf(equations, GM, a, strength, random),
      start: { "semi-major-axis": `${a.toPrecision(7)} m`, eccentricity: Number(e.toPrecision(4)) },
      span: `${Math.max(3, orbits)} orbits`,
    },
  };
}

function parametersOf(
  equations: string,
  GM: number,
  a: number,
  strength: number,
  random: Random,
): Record<string, string | number> {
  const centre = { GM: `${GM.toPrecision(6)} m^3/s^2` };
  switch (equations) {
    case "oblate": {
      const J2 = random.decades(1e-6, 0.1);
      return {
        ...centre,
        R: `${(a * Math.sqrt(Math.min(0.01, strength / J2))).toPrecision(5)} m`,
        J2: Number(J2.toPrecision(4)),
      };
    }
    case "post-newtonian-1":
      return {
        ...centre,
        c: "299792458 m/s",
        ...(random.chance(0.5) ? { "mass-ratio": Number(random.between(0.001, 0.25).toPrecision(4)) } : {}),
      };
    case "schwarzschild-angle":
      return { ...centre, c: "299792458 m/s" };
    default:
      return centre;
  }
}
