/** Steps that every act on a series shares: find it, be its teacher, hold its lock. */
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { GatheringItem, Lesson, Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/** The series with this slug, for its teacher only. */
export async function ownSeries(ctx: Context, slug: string): Promise<Series> {
  const series = found(await Series.findOne({ where: { slug } }));
  authorize(mayTeachIn(ctx.actor, series.workroomId));
  return series;
}

/** The part with this public id and its series, for its teacher only; parts taken out as well. */
export async function ownLesson(ctx: Context, publicId: string): Promise<{ lesson: Lesson; series: Series }> {
  const lesson = found(await Lesson.findOne({ where: { publicId } }));
  const series = found(await Series.findByPk(lesson.seriesId));
  authorize(mayTeachIn(ctx.actor, series.workroomId));
  return { lesson, series };
}

export async function ownGatheringItem(ctx: Context, publicId: string): Promise<{ item: GatheringItem; lesson: Lesson; series: Series }> {
  const item = found(await GatheringItem.findOne({ where: { publicId } }));
  const lesson = found(await Lesson.findByPk(item.lessonId));
  const series = found(await Series.findByPk(lesson.seriesId));
  authorize(mayTeachIn(ctx.actor, series.workroomId));
  return { item, lesson, series };
}

/** Runs `work` with the series' row locked: everything below a series changes under that one lock. */
export function withSeriesLocked<T>(series: Series, work: (locked: Series) => Promise<T>): Promise<T> {
  return withTransaction(async () => work(found(await Series.findByPk(series.id, { lock: true }))));
}

/** Refuses to write over what another tab or person changed since. */
export function requireRevision(known: number, sent: number): void {
  if (known !== sent) {
    throw new AppError('CONFLICT', { says: 'This was changed in another window since you opened it. What you typed stands below, and is not saved yet.' });
  }
}
