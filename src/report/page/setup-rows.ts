import type { ClaimResult } from "../../result/result.js";
import { stepsPerOrbit } from "../format.js";
import { typeset } from "./typeset.js";

interface Row {
  readonly name: string;
  readonly value: string;
}

/** What was run and with what, every number in full. */
export function setupRows({ setup, reference, rounding }: ClaimResult): readonly Row[] {
  if (setup === null) return [];
  const { method, arithmetic, stepsPerOrbit: count, step } = setup;
  const amounts = (list: typeof setup.start): Row[] =>
    list.map(({ name, value, unit }) => ({
      name,
      value: typeset(unit === "1" ? inFull(value) : `${inFull(value)} ${unit}`),
    }));
  const perOrbit = count === null ? "" : `${stepsPerOrbit(count)} steps an orbit`;
  return [
    { name: "equations", value: `${setup.equations.title} (${setup.equations.name}, ${formOf(setup)})` },
    ...amounts(setup.parameters),
    ...amounts(setup.start).map(({ name, value }) => ({ name: `start ${name}`, value })),
    { name: "span", value: setup.span },
    { name: "null run", value: setup.nullRun },
    {
      name: "method",
      value: method ? `${method.title} (${method.name}, order ${method.order})` : "not given",
    },
    {
      name: "step",
      value:
        step === null ? "not given" : /orbit/.test(step) ? step : [step, perOrbit].filter(Boolean).join(", "),
    },
    ...(arithmetic === null ? [] : [{ name: "arithmetic", value: `${arithmetic} precision` }]),
    ...(reference === null ? [] : [{ name: "reference", value: typeset(reference.says) }]),
    ...(rounding === null ? [] : [{ name: "rounding", value: typeset(rounding.says) }]),
  ];
}

/** Every digit, in powers of ten where the plain number would be a row of noughts. */
const inFull = (value: number): string => (Math.abs(value) >= 1e15 ? value.toExponential() : String(value));

const formOf = ({ equations }: NonNullable<ClaimResult["setup"]>): string =>
  equations.form === "angle" ? "the angle as the independent variable" : "in time";

/** Published sources of the equations and of every method that ran. */
export function sourceRows({ setup, reference }: ClaimResult): readonly Row[] {
  if (setup === null) return [];
  const methods = setup.method === null ? setup.witnesses : [setup.method, ...setup.witnesses];
  const rows = [setup.equations, ...methods].map(({ name, source }) => ({ name, value: typeset(source) }));
  const source = reference?.source ?? null;
  return source === null ? rows : [...rows, { name: "reference", value: typeset(source) }];
}
