import type { Context } from '#server/context.ts';
import { authorize, found } from '#server/errors.ts';
import { Enrolment } from '#server/models/index.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

/** Makes a new private address for the asker's calendar of a series; the old one ends at once. */
export async function renewCalendar(ctx: Context, slug: string): Promise<void> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const { seat } = found(await seriesFor(ctx.actor, slug, ctx.clock.now()));
  authorize(seat !== null, 'NOT_FOUND');
  await Enrolment.increment('calendarRevision', { where: { id: seat.enrolmentId } });
}
