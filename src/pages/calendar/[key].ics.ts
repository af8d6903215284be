import type { APIRoute } from 'astro';
import { authorize, found } from '#server/errors.ts';
import { opensCalendar, seatOfKey } from '#server/auth/calendar-key.ts';
import { seatTimetable } from '#server/queries/timetable/seat-timetable.ts';
import { answering } from '#server/web/respond.ts';
import { sendCalendar } from '#server/web/send-calendar.ts';

/** A timetable for a calendar program, which cannot sign in: its private address is what lets it in. */
export const GET: APIRoute = ({ locals: { ctx }, params: { key = '' } }) =>
  answering(ctx.requestId, async () => {
    const now = ctx.clock.now();
    const timetable = found(await seatTimetable(found(seatOfKey(key)), now));
    authorize(opensCalendar(key, { seat: timetable.seat.publicId, revision: timetable.seat.calendarRevision }), 'NOT_FOUND');
    return sendCalendar(timetable, now);
  });
