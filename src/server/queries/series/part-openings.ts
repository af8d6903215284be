/** What decides when each part of a series opens, with parts by their numbers. */
import type { PartOpening } from '#core/series/opening-faults.ts';
import type { Lesson } from '#server/models/index.ts';

/** `lessons` are the parts that are in, in their order. */
export function partOpenings(lessons: readonly Pick<Lesson, 'publicId' | 'opens' | 'opensAt' | 'checkpoint'>[]): PartOpening[] {
  const numberOf = new Map(lessons.map(({ publicId }, index) => [publicId, index + 1]));
  return lessons.map(({ opens, opensAt, checkpoint }, index) => ({
    number: index + 1,
    opensAfterPart: opens.rule === 'after-verdict' ? (numberOf.get(opens.lesson) ?? 'taken-out') : null,
    hasCheckpoint: checkpoint !== null,
    opensAt,
  }));
}
