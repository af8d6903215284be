/** A series as one person follows it: its parts, her piece, and how far she is. */
import { QueryTypes } from 'sequelize';
import type { PartInHand } from '#core/following/progress.ts';
import type { RowCounts } from '#core/following/row-count.ts';
import type { LessonFacts } from '#core/lesson-text/lesson-facts.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { rowCounts } from '#server/queries/following/row-counts.ts';
import { piecesOf, type PiecesOf } from '#server/queries/pieces/pieces-of.ts';
import { seriesFor, type PartFor, type SeriesFor } from '#server/queries/series/series-for.ts';

export interface FollowedSeries {
  readonly series: SeriesFor;
  /** Revision of the seat's ticks that `progress` holds at least. */
  readonly ticksAsOf: number;
  readonly pieces: PiecesOf;
  /** In the order of `series.parts`. Without a seat nothing is ticked. */
  readonly progress: readonly PartInHand[];
  /** Keys of the amounts each part's text speaks of, in the order of the parts. */
  readonly amountKeys: readonly (readonly string[])[];
  /** Rows she counted at the loom. */
  readonly counts: RowCounts;
}

interface FactsRow { readonly lessonId: number; readonly facts: LessonFacts }
interface TickRow { readonly itemKey: string; readonly isStep: number; readonly revision: number }

/** Null when there is no such series, or when it must look as if there were none. */
export async function followedSeries(actor: Actor | null, slug: string, now: Date): Promise<FollowedSeries | null> {
  const series = await seriesFor(actor, slug, now);
  if (series === null) return null;
  const [pieces, facts, ticks, counts] = await Promise.all([
    piecesOf(series.id, series.seat?.enrolmentId ?? null),
    sequelize.query<FactsRow>(
      `SELECT l.id AS lessonId, v.facts FROM lessons l JOIN lesson_versions v ON v.id = l.published_version_id
        WHERE l.series_id = ? AND l.taken_out_at IS NULL`,
      { replacements: [series.id], type: QueryTypes.SELECT },
    ),
    series.seat === null ? [] : sequelize.query<TickRow>(
      `SELECT item_key AS itemKey, subject = 'step' AND is_ticked AS isStep, revision FROM ticks WHERE enrolment_id = ?`,
      { replacements: [series.seat.enrolmentId], type: QueryTypes.SELECT },
    ),
    series.seat === null ? {} : rowCounts(series.seat.enrolmentId),
  ]);
  const factsOf = ({ id }: PartFor): LessonFacts | undefined => facts.find(({ lessonId }) => lessonId === id)?.facts;
  return {
    series,
    pieces,
    counts,
    ticksAsOf: Math.max(0, ...ticks.map(({ revision }) => revision)),
    progress: series.parts.map((part) => partInHand(part, factsOf(part), ticks.filter(({ isStep }) => isStep === 1))),
    amountKeys: series.parts.map((part) => factsOf(part)?.amounts ?? []),
  };
}

function partInHand(part: PartFor, facts: LessonFacts | undefined, ticks: readonly TickRow[]): PartInHand {
  const begins = `${part.publicId}:`;
  return {
    number: part.number,
    title: part.title,
    steps: facts?.steps.map(({ id }) => id) ?? [],
    ticked: new Set(ticks.filter(({ itemKey }) => itemKey.startsWith(begins)).map(({ itemKey }) => itemKey.slice(begins.length))),
    isFinished: part.finishedAt !== null,
    asksForPhoto: part.checkpoint !== null,
    verdict: part.verdict,
    standing: part.access.may === 'wait' ? part.access.standing : { open: true },
  };
}
