import type { Path } from "./document.js";

/** A part of the claim format that this version reads but does not carry out. */
export interface LaterPart {
  readonly path: Path;
  readonly found: string;
  readonly wanted: string;
}

const LATER = "part of the claim format that this version does not carry out";

interface Rule {
  readonly path: Path;
  /** Whether what stands there is of the later kind. */
  readonly applies: (value: unknown) => boolean;
  readonly found: string;
  readonly wanted: string;
}

/** Figures of the format that are not read off yet. */
const LATER_FIGURES = [
  "nodal-advance",
  "radial-period",
  "periapsis-distance",
  "deflection-angle",
  "end-state",
];

const isBlock = (value: unknown): boolean => typeof value === "object" && value !== null;
const RULES: readonly Rule[] = [
  {
    path: ["evidence"],
    applies: () => true,
    found: "stored files or a program",
    wanted: "a solution that the audit can run itself: solution.method and a step",
  },
  {
    path: ["claimed", "quantity"],
    applies: (value) => LATER_FIGURES.includes(String(value)),
    found: "a figure of another kind",
    wanted: "apsidal-advance",
  },
  {
    path: ["scenario", "equations"],
    applies: isBlock,
    found: "a block of formulas",
    wanted: "the name of equations in the catalog",
  },
  {
    path: ["solution", "method"],
    applies: isBlock,
    found: "the author's own coefficients",
    wanted: "the name of a method in the catalog",
  },
  {
    path: ["solution", "tolerance"],
    applies: () => true,
    found: "a tolerance",
    wanted: "a fixed step: step or steps-per-orbit",
  },
  {
    path: ["solution", "read-off"],
    applies: (value) => value === "nearest-sample" || value === "parabola",
    found: "a reading off the output samples",
    wanted: "refined",
  },
  {
    path: ["solution", "output-every"],
    applies: () => true,
    found: "an output cadence",
    wanted: "no such key: every step is looked at",
  },
  {
    path: ["solution", "fit"],
    applies: (value) => value === "end-to-end",
    found: "a figure from the two ends",
    wanted: "slope",
  },
];

/** Takes the parts out of the data that come with a later version, and says which they were. */
export function takeLaterParts(data: unknown): LaterPart[] {
  return RULES.flatMap(({ path, applies, found, wanted }) => {
    const parent = path
      .slice(0, -1)
      .reduce<unknown>(
        (value, key) => (isBlock(value) ? (value as Record<string, unknown>)[key] : undefined),
        data,
      ) as Record<string, unknown> | undefined;
    const key = path.at(-1)!;
    if (!isBlock(parent) || !Object.hasOwn(parent!, key) || !applies(parent![key])) return [];
    delete parent![key];
    return [{ path, found: `${found}, ${LATER}`, wanted }];
  });
}
