/** Places in a text by lines, which count from 1. */

export interface Stretch {
  readonly from: number;
  readonly to: number;
}

/** The whole of a line without its end; of a line beyond the last, the end of the text. */
export function stretchOfLine(source: string, line: number): Stretch {
  let from = 0;
  for (let at = 1; at < line; at += 1) {
    const end = source.indexOf('\n', from);
    if (end === -1) return { from: source.length, to: source.length };
    from = end + 1;
  }
  const end = source.indexOf('\n', from);
  return { from, to: end === -1 ? source.length : end };
}

/** What a remark speaks of: its columns where it has both, else its line. */
export function stretchOfRemark(source: string, { line, column, endColumn }: { readonly line: number; readonly column: number; readonly endColumn?: number }): Stretch {
  const whole = stretchOfLine(source, line);
  if (endColumn === undefined || whole.from + endColumn - 1 > whole.to) return whole;
  return { from: whole.from + column - 1, to: whole.from + endColumn - 1 };
}

/** The line in which a place lies. */
export function lineAt(source: string, place: number): number {
  let line = 1;
  for (let at = source.indexOf('\n'); at !== -1 && at < place; at = source.indexOf('\n', at + 1)) line += 1;
  return line;
}

/** The words of a line, short enough to stand in a list. */
export function wordsOfLine(source: string, line: number, most = 80): string {
  const { from, to } = stretchOfLine(source, line);
  const words = source.slice(from, Math.min(to, from + 4 * most)).trim();
  return words.length > most ? `${words.slice(0, most - 1)}…` : words;
}
