import { QueryTypes } from 'sequelize';
import type { KeepPlaceInput } from '#contracts/video.ts';
import type { Context } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { authorize, found, signedIn } from '#server/errors.ts';
import { SeriesMedia } from '#server/models/index.ts';
import { mayRead } from '#server/policies/lesson.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

/** Keeps where a student stopped in a video of a part that is open to her; how far she ever was only grows. */
export async function keepPlace(ctx: Context, { series: slug, lesson, name, placeMs }: KeepPlaceInput): Promise<void> {
  const series = found(await seriesFor(signedIn(ctx), slug, ctx.clock.now()));
  const part = found(series.parts.find(({ publicId }) => publicId === lesson));
  authorize(series.seat !== null && mayRead(part.access));
  found(await SeriesMedia.findOne({ where: { seriesId: series.id, name } }));
  await sequelize.query(
    `INSERT INTO video_places (enrolment_id, name, place_ms, furthest_ms, created_at, updated_at) VALUES (:seat, :name, :place, :place, :now, :now)
     ON DUPLICATE KEY UPDATE place_ms = :place, furthest_ms = GREATEST(furthest_ms, :place), updated_at = :now`,
    { replacements: { seat: series.seat.enrolmentId, name, place: placeMs, now: ctx.clock.now() }, type: QueryTypes.INSERT },
  );
}
