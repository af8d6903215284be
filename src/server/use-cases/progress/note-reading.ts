import { QueryTypes } from 'sequelize';
import type { ReadInput } from '#contracts/following.ts';
import type { Context } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { authorize, found, signedIn } from '#server/errors.ts';
import { LessonRead } from '#server/models/index.ts';
import { seriesFor, type PartFor, type SeriesFor } from '#server/queries/series/series-for.ts';

/**
 * Called as a part is drawn for who follows it. The first time keeps which text it was; after that only she herself
 * says that she has read a newer one.
 * @returns id of the version she read before, where that is not the one of now; else null
 */
export async function noteReading({ seat }: Pick<SeriesFor, 'seat'>, part: Pick<PartFor, 'id' | 'access' | 'publishedVersionId'>, now: Date): Promise<number | null> {
  if (seat === null || part.access.may !== 'follow' || part.publishedVersionId === null) return null;
  const read = await LessonRead.findOne({ where: { enrolmentId: seat.enrolmentId, lessonId: part.id } });
  if (read !== null) return read.versionId === part.publishedVersionId ? null : read.versionId;
  await sequelize.query(
    'INSERT IGNORE INTO lesson_reads (enrolment_id, lesson_id, version_id, created_at, updated_at) VALUES (?, ?, ?, ?, ?)',
    { replacements: [seat.enrolmentId, part.id, part.publishedVersionId, now, now], type: QueryTypes.INSERT },
  );
  return null;
}

/** The student says that she has read what changed. `version` is the one she was shown: of a newer one she is told still. */
export async function readAnew(ctx: Context, { series: slug, lesson, version }: ReadInput): Promise<PartFor> {
  const series = found(await seriesFor(signedIn(ctx), slug, ctx.clock.now()));
  const part = found(series.parts.find(({ publicId }) => publicId === lesson));
  authorize(series.seat !== null && part.access.may === 'follow');
  if (part.publishedVersionId === version) await LessonRead.upsert({ enrolmentId: series.seat.enrolmentId, lessonId: part.id, versionId: version, updatedAt: ctx.clock.now() });
  return part;
}
