/**
 * Slips of the pen that turn one text into the other: a character more, less or other, or two neighbours
 * exchanged (F. J. Damerau, Commun. ACM 7, 171, 1964).
 */
function distance(one: string, other: string): number {
  let before: number[] = [];
  let row = Array.from({ length: other.length + 1 }, (_, j) => j);
  for (let i = 1; i <= one.length; i++) {
    const next = [i];
    for (let j = 1; j <= other.length; j++) {
      const replaced = row[j - 1]! + (one[i - 1] === other[j - 1] ? 0 : 1);
      const exchanged =
        i > 1 && j > 1 && one[i - 1] === other[j - 2] && one[i - 2] === other[j - 1]
          ? before[j - 2]! + 1
          : Number.POSITIVE_INFINITY;
      next.push(Math.min(replaced, exchanged, row[j]! + 1, next[j - 1]! + 1));
    }
    before = row;
    row = next;
  }
  return row[other.length]!;
}

/** Longer texts are not mistyped names. */
const LONGEST = 60;

/** The known name that a mistyped one is nearest to; null when it is near none. */
export function nearest(name: string, known: readonly string[]): string | null {
  if (name.length > LONGEST) return null;
  // A slip in three characters, and never all of them: 'q' is not a mistyped 'c'.
  const allowed = Math.min(Math.max(1, Math.floor(name.length / 3)), name.length - 1);
  let best: string | null = null;
  let least = allowed + 1;
  for (const candidate of known) {
    const edits = distance(name.toLowerCase(), candidate.toLowerCase());
    if (edits < least) {
      least = edits;
      best = candidate;
    }
  }
  return best;
}

/** What to say instead of a name that is not known: the nearest one, or all of them. */
export function oneOf(name: string, known: readonly string[]): string {
  const near = nearest(name, known);
  return near === null ? `one of ${known.join(", ")}` : `'${near}'?`;
}
