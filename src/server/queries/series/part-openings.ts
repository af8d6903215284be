/** What decides when each part of a series opens, with parts by their numbers. */
import type { PartOpening } from '#core/series/opening-faults.ts';
import { awaitedPart, type OpeningRule } from '#core/timetable/opening.ts';
import type { Lesson } from '#server/models/index.ts';

/** `lessons` are the parts that are in, in their order. */
export function partOpenings(lessons: readonly Pick<Lesson, 'publicId' | 'opens' | 'opensAt' | 'checkpoint'>[]): PartOpening[] {
  const numberOf = new Map(lessons.map(({ publicId }, index) => [publicId, index + 1]));
  return lessons.map(({ opens, opensAt, checkpoint }, index) => ({
    number: index + 1,
    opensAfterPart: opensAfter(opens, numberOf),
    waitsFor: opens.rule === 'after-part' ? 'done' : 'verdict',
    hasCheckpoint: checkpoint !== null,
    opensAt,
  }));
}

function opensAfter(rule: OpeningRule, numberOf: ReadonlyMap<string, number>): PartOpening['opensAfterPart'] {
  const awaited = awaitedPart(rule);
  return awaited === undefined ? null : (numberOf.get(awaited) ?? 'taken-out');
}
