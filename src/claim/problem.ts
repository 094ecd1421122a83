/** Something wrong in a claim file: where, what was found, what would be right. */
export interface Problem {
  readonly file: string;
  /** From 1; null where the file as a whole is meant. */
  readonly line: number | null;
  readonly column: number | null;
  /** Where in the claim, such as `scenario.start.periapsis`; empty for the file as a whole. */
  readonly path: string;
  readonly found: string;
  readonly wanted: string;
}

/** One line: `file:line:column: path: found ..., wanted ...`. */
export function formatProblem(problem: Problem): string {
  const { file, line, column } = problem;
  return `${onOneLine(line === null ? file : `${file}:${line}:${column}`)}: ${problemInWords(problem)}`;
}

/** The same without the place. */
export function problemInWords({ path, found, wanted }: Problem): string {
  return onOneLine(`${path === "" ? "" : `${path}: `}found ${found}; wanted ${wanted}`);
}

const LONGEST_ECHO = 60;

/** Untrusted text as it may be shown: on one line, without control characters, not too long, in quotes. */
export function echo(value: unknown): string {
  if (value === undefined) return "nothing";
  if (value === null) return "nothing";
  if (Array.isArray(value)) return "a list";
  if (typeof value === "object") return "a block of keys";
  const characters = [...onOneLine(String(value))];
  const cut = characters.length > LONGEST_ECHO;
  return `'${cut ? `${characters.slice(0, LONGEST_ECHO).join("")}…` : characters.join("")}'`;
}

/** Without control characters, invisible marks of direction and halves of surrogate pairs. */
function onOneLine(text: string): string {
  return text.replaceAll(/[\p{Cc}\p{Cf}\p{Cs}\u2028\u2029]+/gu, " ");
}
