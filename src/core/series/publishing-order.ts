/**
 * Which parts of a series go out when its teacher publishes: those that lack nothing, in their order. A part is never
 * out before the one in front of it, so that nobody meets Part 3 before Part 2.
 */
import type { Missing } from '#core/series/missing.ts';

export interface PartToPublish {
  readonly number: number;
  /** Students read a version of it already. */
  readonly isPublished: boolean;
}

export interface GoingOut {
  /** Numbers of the parts whose drafts students read from then on. */
  readonly out: readonly number[];
  /** Those that stay as they are, because they lack something or stand behind one that does. */
  readonly held: readonly number[];
  /** What keeps the first of them, or all of them, from going out. */
  readonly blocking: readonly Missing[];
}

/** `parts` in their order. What the series as a whole lacks holds every part. */
export function partsGoingOut(parts: readonly PartToPublish[], missing: readonly Missing[]): GoingOut {
  const blocking = missing.filter(({ blocks }) => blocks);
  const isReady = (number: number): boolean => blocking.every(({ part }) => part !== null && part !== number);
  const gap = parts.find(({ number, isPublished }) => !isPublished && !isReady(number))?.number ?? Infinity;
  const goesOut = ({ number, isPublished }: PartToPublish): boolean => isReady(number) && (isPublished || number < gap);
  return { out: parts.filter(goesOut).map(({ number }) => number), held: parts.filter((part) => !goesOut(part)).map(({ number }) => number), blocking };
}

export type PartMayGoOut = { readonly ok: true } | { readonly ok: false; readonly says: string };

/** Whether the draft of part `number` may go out by itself, in a series that is open to buyers. */
export function partMayGoOut(number: number, parts: readonly PartToPublish[], missing: readonly Missing[]): PartMayGoOut {
  const [first] = missing.filter(({ part, blocks }) => part === number && blocks);
  if (first !== undefined) return { ok: false, says: `Part ${number} is not ready yet. ${first.says}` };
  const before = parts.find((part) => part.number < number && !part.isPublished);
  if (before === undefined || parts.some((part) => part.number === number && part.isPublished)) return { ok: true };
  return { ok: false, says: `Part ${before.number} is not published yet. Parts come out in their order: publish Part ${before.number} first, or move this one before it.` };
}
