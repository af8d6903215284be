import { config } from '#server/config.ts';
import { calendarFile } from '#server/web/calendar-file.ts';
import type { SeatTimetable } from '#server/queries/timetable/seat-timetable.ts';

/** A timetable as a calendar file, for a download or for a calendar that reads it again and again. */
export function sendCalendar(timetable: SeatTimetable, now: Date): Response {
  return new Response(calendarFile(timetable, config().publicUrl, now), {
    headers: {
      'Content-Type': 'text/calendar; charset=utf-8',
      'Content-Disposition': `inline; filename="${timetable.series.slug}.ics"`,
      'Cache-Control': 'private, no-cache',
      'X-Robots-Tag': 'noindex',
      Vary: 'Cookie',
    },
  });
}
