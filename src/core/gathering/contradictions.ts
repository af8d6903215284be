/** Lines of two parts' lists that ask for one tool in two ways: one of them is mostly a slip, and she would buy both. */
export interface ToolLine {
  readonly part: number;
  readonly name: string;
  readonly amountText: string | null;
}

export interface Contradiction {
  readonly part: number;
  readonly earlier: number;
  readonly says: string;
}

const plain = (words: string): string => words.trim().toLowerCase().replaceAll(/\s+/g, ' ');
/** `Tapestry needle, blunt` is a tapestry needle, whatever follows the comma. */
const thingOf = (name: string): string => plain(name.split(',')[0] ?? '');

/** In the order of `lines`, which is that of the parts; each line is held against the first of another part that differs. */
export function contradictions(lines: readonly ToolLine[]): Contradiction[] {
  return lines.flatMap((line, index) => {
    const other = lines.slice(0, index).find((one) => one.part !== line.part && thingOf(one.name) === thingOf(line.name) && differs(one, line));
    if (other === undefined) return [];
    return [{ part: line.part, earlier: other.part, says: `It asks for “${worded(line, other)}”, Part ${other.part} for “${worded(other, line)}”. If it is one and the same, give both lines the same words.` }];
  });
}

const differs = (a: ToolLine, b: ToolLine): boolean =>
  plain(a.name) !== plain(b.name) || (a.amountText !== null && b.amountText !== null && plain(a.amountText) !== plain(b.amountText));

/** The amount is said only where the names are alike. */
function worded(line: ToolLine, other: ToolLine): string {
  return plain(line.name) === plain(other.name) ? `${line.name}: ${line.amountText ?? ''}` : line.name;
}
