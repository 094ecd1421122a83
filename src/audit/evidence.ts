import type { Claim } from "../claim/claim.js";
import { nominalLength } from "../measure/limits.js";
import type { PreparedScenario } from "../measure/run.js";
import type { Ladder, LedgerEntry } from "../result/result.js";
import type { Evidence, SolutionEvidence } from "../verdict/evidence.js";
import { bestOf } from "./best.js";
import type { Investigation } from "./investigate.js";
import type { Prepared } from "./prepare.js";
import { readingOff } from "./readings.js";

/** Turns what was measured into the numbers that a verdict rests on. */
export function evidenceOf(
  claim: Claim,
  { scenario }: Prepared,
  investigation: Investigation,
  ladders: readonly Ladder[],
  ledger: readonly LedgerEntry[],
  crossReading: SolutionEvidence["crossReading"],
): Evidence {
  const { claimed } = claim;
  const best = bestOf(investigation);
  return {
    claimed: {
      value: claimed.value,
      halfWidth: claimed.halfWidth,
      digits: claimed.digits,
      unit: claimed.unit.text,
      baseline: claimed.baseline,
    },
    solution: solutionEvidence(claim, scenario, investigation, ladders[0]!, crossReading),
    best: best && { value: best.value, halfWidth: best.halfWidth, sound: best.sound },
    ladders,
    ledger,
    orbits: nominalLength(scenario) / scenario.period,
    nullExists: scenario.nullParameters !== null,
    writeStep: (perOrbit) => writeStep(claim, scenario.period, perOrbit),
  };
}

function solutionEvidence(
  claim: Claim,
  scenario: PreparedScenario,
  { plan, solution }: Investigation,
  ladder: Ladder,
  crossReading: SolutionEvidence["crossReading"],
): SolutionEvidence | null {
  if (solution === null || plan.authors === null) return null;
  const { method } = solution.runs;
  const { on, off } = solution.runs.rungs[plan.authors]!;
  const { value, null: base, figure, stepsPerOrbit } = ladder.rungs[plan.authors]!;
  const { unit, baseline } = claim.claimed;
  const { step } = ladder.rungs[plan.authors]!;
  const ofRun = readingOff(on, scenario, step, unit);
  const ofNull = baseline === "subtracted" && off !== on ? readingOff(off, scenario, step, unit) : 0;
  return {
    method: method.name,
    formalOrder: method.order,
    conserving: method.symplectic || method.symmetric,
    stepsPerOrbit,
    rung: plan.authors,
    status: on?.status ?? "timed-out",
    nullStatus: off?.status ?? "timed-out",
    raw: value,
    null: base,
    value: figure,
    rounding: solution.figure[plan.authors]!.floor,
    readingOff: Math.hypot(ofRun, ofNull),
    crossReading,
  };
}

/** A step as the author wrote theirs: steps an orbit, or a length in their unit, rounded down. */
function writeStep({ solution }: Claim, period: number, perOrbit: number): string {
  const step = solution?.step;
  if (step?.kind !== "length") return `${Math.ceil(perOrbit)} steps an orbit`;
  const length = period / perOrbit / step.unitSize;
  const place = 10 ** (Math.floor(Math.log10(length)) - 3);
  return `${Number((Math.floor(length / place) * place).toPrecision(4))} ${step.unit}`;
}
