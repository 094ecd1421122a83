import { oneOf } from "../claim/nearest.js";
import { unitsCatalog } from "../claim/units.js";
import { equationsCatalog } from "../equations/catalog/index.js";
import type { EquationsDefinition, ParameterDefinition } from "../equations/definition.js";
import { methodsCatalog } from "../methods/catalog/index.js";
import type { MethodDefinition } from "../methods/definition.js";
import { wrap } from "../report/text.js";
import { CallError } from "./call-error.js";

const WIDTH = 80;
const SECTIONS = ["equations", "methods", "quantities", "units"] as const;

/** Figures that a claim may quote. */
const quantities = [
  {
    name: "apsidal-advance",
    meaning:
      "Turn of the apsis: least-squares slope of the unwrapped apsidal angle on the passage number, less 2π; per orbit (one radial period, periapsis to periapsis) or per time (divided by the run's own mean radial period). In the orbital plane of an inclined orbit it is counted from the ascending node.",
  },
];

/**
 * What there is, with sources; all of it generated from the definitions.
 *
 * @throws CallError for a name that is not in the catalog
 */
export function catalogText(what: string | undefined): string {
  return `${(what === undefined ? overview() : chosen(what)).join("\n")}\n`;
}

function overview(): string[] {
  return [
    "equations",
    ...equationsCatalog.map(({ name, title }) => row(name, title)),
    "",
    "methods",
    ...methodsCatalog.map(({ name, order, family }) => row(name, `order ${order}, ${family}`)),
    "",
    "quantities",
    ...quantities.map(({ name }) => `  ${name}`),
    "",
    "units",
    ...wrap(unitsCatalog.map(({ name }) => name).join(", "), WIDTH - 2).map((line) => `  ${line}`),
    "",
    "cupel catalog NAME shows one of them in full.",
  ];
}

function chosen(what: string): string[] {
  switch (what) {
    case "equations":
      return separated(equationsCatalog.map(describeEquations));
    case "methods":
      return separated(methodsCatalog.map(describeMethod));
    case "quantities":
      return separated(quantities.map(({ name, meaning }) => [name, ...indented(meaning)]));
    case "units":
      return unitsCatalog.flatMap(({ name, meaning, source }) => [
        row(name, meaning),
        ...indented(source, 24),
      ]);
  }
  const equations = equationsCatalog.find(({ name }) => name === what);
  if (equations !== undefined) return describeEquations(equations);
  const method = methodsCatalog.find(({ name }) => name === what);
  if (method !== undefined) return describeMethod(method);
  const quantity = quantities.find(({ name }) => name === what);
  if (quantity !== undefined) return [quantity.name, ...indented(quantity.meaning)];
  const known = [
    ...SECTIONS,
    ...[...equationsCatalog, ...methodsCatalog, ...quantities].map(({ name }) => name),
  ];
  throw new CallError(`catalog ${what}: there is no such entry; wanted ${oneOf(what, known)}`);
}

function describeEquations(equations: EquationsDefinition): string[] {
  const { name, title, display, form, source, parameters, coordinates, conserved, potential } = equations;
  const kept = [...(potential === undefined ? [] : ["energy"]), ...Object.keys(conserved)];
  const vanishing = Object.entries(parameters).flatMap(([parameter, { vanishesAt }]) =>
    vanishesAt === undefined ? [] : [vanishesAt === 0 ? `${parameter} = 0` : `${parameter} without limit`],
  );
  return [
    `${name}: ${title}`,
    ...indented(display),
    ...labelled("form", form === "angle" ? "the polar angle is the independent variable" : "time"),
    ...Object.entries(parameters).flatMap(([parameter, definition]) =>
      labelled(parameter, describeParameter(definition)),
    ),
    ...labelled(
      "variables",
      Object.entries(coordinates)
        .map(([coordinate, { rate, unit }]) => `${coordinate} (${unit}) with rate ${rate}`)
        .join(", "),
    ),
    ...labelled("conserved", kept.join(", ")),
    ...labelled(
      "null run",
      vanishing.length === 0 ? "the run itself: nothing can be switched off" : vanishing.join(", "),
    ),
    ...labelled("source", source),
  ];
}

function describeParameter({ unit, meaning, default: value, fromStart }: ParameterDefinition): string {
  const given = fromStart !== undefined || value === undefined ? "" : `; ${value} when left out`;
  return `${unit === "1" ? "a pure number" : unit}: ${meaning}${given}`;
}

function describeMethod({
  name,
  title,
  order,
  family,
  source,
  note,
  symmetric,
  symplectic,
}: MethodDefinition): string[] {
  const traits = [family, symmetric ? "symmetric" : "", symplectic ? "symplectic" : ""].filter(Boolean);
  return [
    `${name}: ${title}`,
    ...labelled("order", String(order)),
    ...labelled("family", traits.join(", ")),
    ...(note === undefined ? [] : labelled("note", note)),
    ...labelled("source", source),
  ];
}

const row = (name: string, text: string): string => `  ${name.padEnd(22)}${text}`;
const indented = (text: string, indent = 2): string[] =>
  wrap(text, WIDTH - indent).map((line) => " ".repeat(indent) + line);

function labelled(label: string, text: string): string[] {
  const [first = "", ...rest] = wrap(text, WIDTH - 24);
  return [row(label, first), ...rest.map((line) => " ".repeat(24) + line)];
}

const separated = (blocks: readonly (readonly string[])[]): string[] =>
  blocks.flatMap((lines, i) => (i === 0 ? lines : ["", ...lines]));
