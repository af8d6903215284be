// What stands beside a part in a list, for the person who asks: done, at the teacher's, to mend, opening later.
import type { FlagKind } from '#islands/ui/flag-kinds.ts';
import { firstName, opensShort } from '#core/following/opening-words.ts';
import { isDone, type PartInHand } from '#core/following/progress.ts';
import type { PartFor, SeriesFor } from '#server/queries/series/series-for.ts';

export interface PartFlag {
  readonly kind: FlagKind;
  readonly words: string;
}

export function partFlag(series: SeriesFor, part: PartFor, progress: PartInHand, timeZone: string): PartFlag | undefined {
  const { access } = part;
  if (access.may === 'preview') return { kind: 'here', words: 'Free to read' };
  if (access.may === 'buy') return { kind: 'held', words: 'With a seat' };
  if (access.may === 'wait') return { kind: 'opens', words: opensShort({ ...openingOf(series, part), timeZone }) };
  if (series.seat === null) return undefined;
  if (part.verdict === 'mend-first') return { kind: 'mend', words: 'Mend first' };
  if (part.verdict === 'waits') return { kind: 'waits', words: `Waits for ${firstName(series.workroom.teacherName)}` };
  if (isDone(progress)) return { kind: 'on', words: part.checkpoint === null ? 'Done' : 'Weave on' };
  return undefined;
}

/** What a part that is not open waits for, with the part that comes before it. */
export function openingOf(series: SeriesFor, part: PartFor) {
  const standing = part.access.may === 'wait' ? part.access.standing : ({ open: true } as const);
  const before = !standing.open && standing.until !== 'date' ? series.parts.find(({ publicId }) => publicId === standing.lesson) : undefined;
  return {
    standing,
    awaited: before === undefined ? undefined : { number: before.number, ask: before.checkpoint?.ask ?? null },
    teacher: firstName(series.workroom.teacherName),
  };
}

/** Whether the part's page shows the part itself, not when it opens. */
export function isOpenTo({ access: { may } }: PartFor): boolean {
  return may === 'look-after' || may === 'follow' || may === 'preview';
}
