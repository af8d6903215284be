/** A moment in a few words, as it stands in lists: `today 7:55`, `Sunday 19:12`, `3 May 9:00`, `3 May 2025`. */
import { DateTime } from 'luxon';

export function dayAndTime(moment: Date, now: Date, timeZone: string): string {
  const then = DateTime.fromJSDate(moment, { zone: timeZone }).setLocale('en-GB');
  const today = DateTime.fromJSDate(now, { zone: timeZone });
  const days = Math.round(today.startOf('day').diff(then.startOf('day'), 'days').days);
  if (days === 0) return `today ${then.toFormat('H:mm')}`;
  if (days === 1) return `yesterday ${then.toFormat('H:mm')}`;
  if (days > 1 && days < 7) return then.toFormat('cccc H:mm');
  return then.toFormat(then.year === today.year ? 'd LLL H:mm' : 'd LLL yyyy');
}
