import type { Claim } from "../claim/claim.js";
import type { MethodDefinition } from "../methods/definition.js";
import type { Setup } from "../result/result.js";
import type { Prepared } from "./prepare.js";

/** What was run, for the page. */
export function setupOf(claim: Claim, { system, scenario, witnesses, authorsStep }: Prepared): Setup {
  const { equations } = claim.scenario;
  return {
    equations: {
      name: equations.name,
      title: equations.title,
      display: equations.display,
      source: equations.source,
      form: equations.form,
    },
    parameters: system.parameters.map((name, i) => ({
      name,
      value: scenario.parameters[i]!,
      unit: equations.parameters[name]!.unit,
    })),
    nullRun: nullRunInWords(claim, system.parameters),
    start: system.states.map((name, i) => ({ name, value: scenario.state[i]!, unit: unitOf(claim, name) })),
    span: claim.scenario.span.text,
    method: claim.solution && describe(claim.solution.method),
    arithmetic: claim.solution?.arithmetic ?? null,
    step: claim.solution?.step.text ?? null,
    stepsPerOrbit: authorsStep === null ? null : scenario.period / authorsStep,
    witnesses: witnesses.map(describe),
  };
}

const describe = ({ name, title, order, source }: MethodDefinition) => ({ name, title, order, source });

function nullRunInWords(claim: Claim, parameters: readonly string[]): string {
  const vanishing = parameters.flatMap((name) => {
    const at = claim.scenario.equations.parameters[name]!.vanishesAt;
    if (at === undefined) return [];
    return [at === Number.POSITIVE_INFINITY ? `${name} without limit` : `${name} = ${at}`];
  });
  return vanishing.length === 0
    ? "nothing can be switched off: the run is its own null run, and the true figure is 0"
    : `the same start, constants, method and step with ${vanishing.join(", ")}`;
}

/** m, m/s; 1/m in angle form. */
function unitOf(claim: Claim, state: string): string {
  const { coordinates, form } = claim.scenario.equations;
  for (const [name, { rate, unit }] of Object.entries(coordinates)) {
    if (state === name) return unit;
    if (state === rate) return form === "angle" ? unit : `${unit}/s`;
  }
  return "1";
}
