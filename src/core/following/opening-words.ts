/** When a part opens, in words: the day, or what the teacher must have seen. */
import { clockWords, dayWords } from '#core/moment-words.ts';
import type { Standing } from '#core/timetable/opening.ts';

export interface OpeningFacts {
  readonly standing: Standing;
  /** The part it waits for, where it does, and what its photo shall show. */
  readonly awaited?: { readonly number: number; readonly ask: string | null } | undefined;
  readonly teacher: string;
  readonly timeZone: string;
}

/** The first of a person's names: how a teacher is spoken of. */
export function firstName(name: string): string {
  return name.trim().split(/\s+/)[0] ?? name;
}

/** `Show your warped loom` is asked; `your warped loom` is what is then seen. */
function thingShown(ask: string | null): string | undefined {
  return ask === null ? undefined : /^show (?:me )?(your .+?)\.?$/i.exec(ask.trim())?.[1];
}

/** After `Part 3 `: `opens when Ilse has seen your warped loom`; empty for a part that is open. */
export function opensWhen({ standing, awaited, teacher, timeZone }: OpeningFacts): string {
  if (standing.open) return '';
  if (standing.until === 'date') return `opens on ${dayWords(standing.opensAt, timeZone)} at ${clockWords(standing.opensAt, timeZone)}`;
  if (standing.until === 'part') return awaited === undefined ? 'opens later' : `opens when Part ${awaited.number} is done`;
  const shown = awaited === undefined ? undefined : thingShown(awaited.ask);
  if (shown !== undefined) return `opens when ${teacher} has seen ${shown}`;
  return awaited === undefined ? `opens when ${teacher} says so` : `opens when ${teacher} has looked at your photo of Part ${awaited.number}`;
}

/** For a flag, where there is little room. */
export function opensShort({ standing, awaited, timeZone }: OpeningFacts): string {
  if (standing.open) return '';
  if (standing.until === 'date') return `Opens ${dayWords(standing.opensAt, timeZone)}`;
  if (awaited !== undefined && standing.until === 'part') return `Opens when Part ${awaited.number} is done`;
  return awaited === undefined ? 'Opens later' : `Opens after your photo of Part ${awaited.number}`;
}

/** Of a part that is not published yet: `Being written`, and from which day on it can open, where a date says so. */
export function beingWritten(notBefore: Date | null, now: Date, timeZone: string): string {
  return notBefore === null || notBefore <= now ? 'Being written' : `Being written, comes on ${dayWords(notBefore, timeZone)} at the earliest`;
}
