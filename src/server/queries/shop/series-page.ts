/** Everything the page of one series shows, as one person meets it. */
import { QueryTypes } from 'sequelize';
import type { PartStretch } from '#core/craft/cloth/parts-strip.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import type { Piece } from '#core/craft/crafts.ts';
import { stretchesOf } from '#core/following/bands-by-part.ts';
import { mergeLines, type MergedLine } from '#core/gathering/merge.ts';
import type { LessonFacts } from '#core/lesson-text/lesson-facts.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { worksIn } from '#server/policies/lesson.ts';
import { gatheringLines } from '#server/queries/gathering/gathering-lines.ts';
import { seriesFor, type SeriesFor } from '#server/queries/series/series-for.ts';

export interface SeriesPage {
  readonly series: SeriesFor;
  /** Who looks after it sees drafts, and is told so. */
  readonly looksAfter: boolean;
  readonly pattern: Piece | null;
  /** What the asker has changed of it for herself; null without a seat or a change. */
  readonly mine: MyPiece | null;
  readonly toGather: readonly MergedLine[];
  /** Names of who helps the teacher at the bench. */
  readonly helpers: readonly string[];
  /** Bands woven in each part, as far as the texts tell. */
  readonly stretches: readonly PartStretch[] | null;
}

interface AroundRow { readonly pattern: Piece | null; readonly mine: MyPiece | null; readonly helpers: string | null }
interface FactsRow { readonly lessonId: number; readonly facts: LessonFacts }

const SEPARATOR = '\u001f';

/** Five statements at most. @returns null when there must seem to be no such series. */
export async function seriesPage(actor: Actor | null, slug: string, now: Date): Promise<SeriesPage | null> {
  const series = await seriesFor(actor, slug, now);
  if (series === null) return null;
  const enrolmentId = series.seat?.enrolmentId ?? null;
  const [around, lines, facts] = await Promise.all([piecesAndHelpers(series, enrolmentId), gatheringLines(series.parts, enrolmentId), factsOfParts(series)]);
  const amountKeys = series.parts.map(({ id }) => facts.find(({ lessonId }) => lessonId === id)?.facts.amounts ?? []);
  return {
    series,
    looksAfter: worksIn(actor, series.workroom.id),
    ...around,
    toGather: mergeLines(lines),
    stretches: around.pattern === null ? null : stretchesOf(around.pattern, amountKeys),
  };
}

async function piecesAndHelpers({ id }: SeriesFor, enrolmentId: number | null): Promise<Pick<SeriesPage, 'pattern' | 'mine' | 'helpers'>> {
  const [row] = await sequelize.query<AroundRow>(
    `SELECT p.data AS pattern, m.data AS mine,
            (SELECT GROUP_CONCAT(u.name ORDER BY u.id SEPARATOR '${SEPARATOR}') FROM workroom_helpers h JOIN users u ON u.id = h.user_id WHERE h.workroom_id = s.workroom_id) AS helpers
       FROM series s
       LEFT JOIN pieces p ON p.series_id = s.id
       LEFT JOIN my_pieces m ON m.enrolment_id = :enrolmentId
      WHERE s.id = :id`,
    { replacements: { id, enrolmentId: enrolmentId ?? 0 }, type: QueryTypes.SELECT },
  );
  return { pattern: row?.pattern ?? null, mine: row?.mine ?? null, helpers: row?.helpers?.split(SEPARATOR) ?? [] };
}

function factsOfParts({ id }: SeriesFor): Promise<FactsRow[]> {
  return sequelize.query<FactsRow>(
    'SELECT l.id AS lessonId, v.facts FROM lessons l JOIN lesson_versions v ON v.id = l.published_version_id WHERE l.series_id = ? AND l.taken_out_at IS NULL',
    { replacements: [id], type: QueryTypes.SELECT },
  );
}
