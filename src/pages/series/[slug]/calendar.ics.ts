import type { APIRoute } from 'astro';
import { authorize, found, signedIn } from '#server/errors.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { seatTimetable } from '#server/queries/timetable/seat-timetable.ts';
import { answering } from '#server/web/respond.ts';
import { sendCalendar } from '#server/web/send-calendar.ts';

/** The asker's own timetable of a series she has a seat in. */
export const GET: APIRoute = ({ locals: { ctx }, params: { slug = '' } }) =>
  answering(ctx.requestId, async () => {
    const now = ctx.clock.now();
    const { seat } = found(await seriesFor(signedIn(ctx), slug, now));
    authorize(seat !== null, 'NOT_FOUND');
    return sendCalendar(found(await seatTimetable(seat.publicId, now)), now);
  });
