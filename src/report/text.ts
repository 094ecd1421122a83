/** Characters that fill two columns of a terminal: East Asian wide and full-width forms, emoji. */
const WIDE =
  /[\u1100-\u115f\u2e80-\u303e\u3041-\ua4cf\ua960-\ua97c\uac00-\ud7a3\uf900-\ufaff\ufe30-\ufe6f\uff00-\uff60\uffe0-\uffe6]|\p{Extended_Pictographic}/u;
const NO_WIDTH = /\p{Mn}|\p{Me}|\p{Cf}/u;

/** Untrusted text on one line: what could move the cursor or hide text becomes a space. */
export function clean(text: string): string {
  return text.replaceAll(/[\p{Cc}\p{Cf}\u2028\u2029]+/gu, " ");
}

/** Columns that a text takes. */
export function columns(text: string): number {
  let count = 0;
  for (const character of text) count += NO_WIDTH.test(character) ? 0 : WIDE.test(character) ? 2 : 1;
  return count;
}

/** A text cut to a number of columns, with an ellipsis where something is lost. */
export function cut(text: string, width: number): string {
  if (columns(text) <= width) return text;
  let kept = "";
  for (const character of text) {
    if (columns(kept + character) > width - 1) break;
    kept += character;
  }
  return `${kept}…`;
}

export const padEnd = (text: string, width: number): string =>
  text + " ".repeat(Math.max(0, width - columns(text)));
export const padStart = (text: string, width: number): string =>
  " ".repeat(Math.max(0, width - columns(text))) + text;

/** Breaks a text into lines of at most `width` columns; words longer than that are cut. */
export function wrap(text: string, width: number): string[] {
  const lines: string[] = [];
  let line = "";
  for (const word of text.split(/\s+/).filter(Boolean)) {
    let rest = word;
    if (line !== "" && columns(line) + 1 + columns(rest) > width) {
      lines.push(line);
      line = "";
    }
    while (columns(rest) > width) {
      let piece = "";
      for (const character of rest) {
        if (columns(piece + character) > width) break;
        piece += character;
      }
      lines.push(piece);
      rest = rest.slice(piece.length);
    }
    line = line === "" ? rest : `${line} ${rest}`;
  }
  if (line !== "") lines.push(line);
  return lines;
}
