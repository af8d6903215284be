/** A student's timetable as a calendar file (RFC 5545): one event without length for each part that opens on a known day. */
import ical, { ICalCalendarMethod, ICalEventTransparency } from 'ical-generator';
import { titleHalves } from '#core/series/title.ts';
import type { SeatTimetable } from '#server/queries/timetable/seat-timetable.ts';

/**
 * Ids of events stay the same from file to file, and their number rises with each change of a part's day, so that a
 * calendar that reads the file again moves what it has. Times are UTC.
 * @param now stamped on the file, as the standard asks
 */
export function calendarFile({ seat, series, days }: SeatTimetable, publicUrl: string, now: Date): string {
  const { name } = titleHalves(series.title);
  const calendar = ical({ name: `Fellmark: ${name}`, prodId: { company: 'Fellmark', product: 'Timetable', language: 'EN' }, method: ICalCalendarMethod.PUBLISH, ttl: 3_600 });
  // A calendar without any event is none (RFC 5545, 3.6), so the day of the seat is always in it.
  calendar.createEvent({
    id: `begins-${seat.publicId}@fellmark`,
    start: seat.startedAt,
    stamp: now,
    summary: `${name} begins: your seat is yours`,
    url: `${publicUrl}/series/${series.slug}`,
    transparency: ICalEventTransparency.TRANSPARENT,
  });
  for (const day of days) {
    if (day.when !== 'at') continue;
    calendar.createEvent({
      id: `opens-${day.publicId}-${seat.publicId}@fellmark`,
      sequence: day.revision,
      start: day.at,
      stamp: now,
      lastModified: day.changedAt,
      summary: `Part ${day.number} of ${name} opens: ${day.title}`,
      description: 'It stays open from then on: begin when it suits you.',
      url: `${publicUrl}/series/${series.slug}/${day.number}`,
      transparency: ICalEventTransparency.TRANSPARENT,
    });
  }
  return calendar.toString();
}
