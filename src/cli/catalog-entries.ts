import { unitsCatalog } from "../claim/units.js";
import { equationsCatalog } from "../equations/catalog/index.js";
import type {
  ConservedDefinition,
  EquationsDefinition,
  ParameterDefinition,
} from "../equations/definition.js";
import { methodsCatalog } from "../methods/catalog/index.js";
import type { Family, MethodDefinition } from "../methods/definition.js";
import { wrap } from "../report/text.js";
import { indented, labelled } from "./columns.js";

/** An entry of the catalog as the command shows it. */
export interface Entry {
  readonly name: string;
  /** Beside its name in a list. */
  readonly brief: string;
  /** In full, 80 columns wide. */
  readonly lines: readonly string[];
}

const heading = (name: string, title: string): string[] => wrap(`${name}: ${title}`, 80);

function ofEquations(equations: EquationsDefinition): Entry {
  const { name, title, display, form, source, parameters, coordinates, conserved, potential } = equations;
  const kept: Record<string, ConservedDefinition> =
    potential === undefined ? conserved : { energy: { formula: "", unit: "m^2/s^2" }, ...conserved };
  const vanishing = Object.entries(parameters).flatMap(([parameter, { vanishesAt }]) =>
    vanishesAt === undefined ? [] : [vanishesAt === 0 ? `${parameter} = 0` : `${parameter} without limit`],
  );
  return {
    name,
    brief: title,
    lines: [
      ...heading(name, title),
      ...indented(display),
      ...labelled("runs in", form === "time" ? "time (s)" : "the polar angle (rad)"),
      ...Object.entries(coordinates).flatMap(([coordinate, { rate, unit }]) =>
        labelled(coordinate, `${unit}: a variable, with rate ${rate}`),
      ),
      ...Object.entries(parameters).flatMap(ofParameter),
      ...labelled("conserved", Object.entries(kept).map(ofConserved).join("; ") || "nothing"),
      ...labelled("null run", vanishing.join(", ") || "nothing to switch off: the run itself"),
      ...labelled("source", source),
    ],
  };
}

function ofParameter([name, definition]: [string, ParameterDefinition]): string[] {
  const { symbol, unit, meaning, default: value, fromStart } = definition;
  const label = symbol === name ? name : `${name} (${symbol})`;
  const left = value === undefined || fromStart !== undefined ? "" : `; ${value} when left out`;
  return labelled(label, `${unit === "1" ? "a pure number" : unit}: ${meaning}${left}`);
}

function ofConserved([name, { unit, truncatedAt }]: [string, ConservedDefinition]): string {
  return `${name}${unit === "1" ? "" : ` (${unit})`}${truncatedAt === undefined ? "" : ` up to ${truncatedAt}`}`;
}

const FAMILIES: Readonly<Record<Family, string>> = {
  "explicit-runge-kutta": "explicit Runge-Kutta",
  "implicit-runge-kutta": "implicit Runge-Kutta",
  splitting: "splitting",
};

function ofMethod(method: MethodDefinition): Entry {
  const { name, title, order, family, source, note, symmetric, symplectic } = method;
  const traits = [FAMILIES[family], symmetric ? "symmetric" : "", symplectic ? "symplectic" : ""];
  const traitsText = traits.filter(Boolean).join(", ");
  return {
    name,
    brief: `order ${order}, ${traitsText}`,
    lines: [
      ...heading(name, title),
      ...labelled("order", String(order)),
      ...labelled("family", traitsText),
      ...(note === undefined ? [] : labelled("note", note)),
      ...labelled("source", source),
    ],
  };
}

/** The figures that a claim may quote. */
const quantities: readonly Entry[] = [
  {
    name: "apsidal-advance",
    brief: "turn of the apsis, per orbit or per time",
    lines: [
      ...heading("apsidal-advance", "Turn of the apsis"),
      ...indented(
        "The least-squares slope of the unwrapped apsidal angle on the passage number, less a whole turn.",
      ),
      ...labelled("per orbit", "of one radial period, periapsis to periapsis"),
      ...labelled("per d, yr, century", "divided by the run's own mean radial period"),
      ...labelled("inclined orbits", "the angle is counted from the ascending node"),
    ],
  },
];

const units: readonly Entry[] = unitsCatalog.map(({ name, meaning, source }) => ({
  name,
  brief: meaning,
  lines: [...heading(name, meaning), ...labelled("source", source)],
}));

export const sections: Readonly<Record<string, readonly Entry[]>> = {
  equations: equationsCatalog.map(ofEquations),
  methods: methodsCatalog.map(ofMethod),
  quantities,
  units,
};
