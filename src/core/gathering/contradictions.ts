/** Lines of a series' lists that cannot both be meant: mostly one of them is a slip, and a student would buy twice or put away too soon. */
import type { GatheringLine } from './merge.ts';

export type ListedLine = Pick<GatheringLine, 'publicId' | 'part' | 'kind' | 'name' | 'amountText' | 'untilPart'>;

export interface Contradiction {
  readonly part: number;
  readonly line: string;
  /** The line it cannot stand beside; null where it contradicts its own part. */
  readonly other: { readonly part: number; readonly line: string; readonly name: string } | null;
  readonly says: string;
}

const plain = (words: string): string => words.trim().toLowerCase().replaceAll(/\s+/g, ' ');
/** `Tapestry needle, blunt` is a tapestry needle, whatever follows the comma. */
const thingOf = (name: string): string => plain(name.split(',')[0] ?? '');

/**
 * In the order of `lines`, which is that of the parts; each line is held against the first of another part that differs.
 * @param partCount how many parts there are, or undefined where that does not matter
 */
export function contradictions(lines: readonly ListedLine[], partCount = Infinity): Contradiction[] {
  return lines.flatMap((line, index) => {
    const earlier = lines.slice(0, index).filter((one) => one.part !== line.part);
    const twin = earlier.find((one) => one.kind === 'tool' && line.kind === 'tool' && thingOf(one.name) === thingOf(line.name) && differs(one, line));
    const stranger = earlier.find((one) => one.kind !== line.kind && plain(one.name) === plain(line.name));
    return [
      ...(twin === undefined ? [] : [between(line, twin, `It asks for “${worded(line, twin)}”, Part ${twin.part} for “${worded(twin, line)}”. If it is one and the same, give both lines the same words.`)]),
      ...(stranger === undefined ? [] : [between(line, stranger, `“${line.name}” is ${KINDS[line.kind]} here and ${KINDS[stranger.kind]} in Part ${stranger.part}, so it stands on her list twice. Choose one kind for both.`)]),
      ...endsWrong(line, partCount).map((says) => ({ part: line.part, line: line.publicId, other: null, says })),
    ];
  });
}

const KINDS = { tool: 'a tool', yarn: 'a yarn', material: 'material' } as const;

const between = ({ part, publicId }: ListedLine, other: ListedLine, says: string): Contradiction =>
  ({ part, line: publicId, other: { part: other.part, line: other.publicId, name: other.name }, says });

function endsWrong({ name, part, untilPart }: ListedLine, partCount: number): string[] {
  if (untilPart !== null && untilPart < part) return [`“${name}” is needed until Part ${untilPart}, which comes before this part. Say anew how long it is needed.`];
  return untilPart !== null && untilPart > partCount ? [`“${name}” is needed until Part ${untilPart}, and there are only ${partCount} parts. Say anew how long it is needed.`] : [];
}

const differs = (a: ListedLine, b: ListedLine): boolean =>
  plain(a.name) !== plain(b.name) || (a.amountText !== null && b.amountText !== null && plain(a.amountText) !== plain(b.amountText));

/** The amount is said only where the names are alike. */
function worded(line: ListedLine, other: ListedLine): string {
  return plain(line.name) === plain(other.name) ? `${line.name}: ${line.amountText ?? ''}` : line.name;
}
