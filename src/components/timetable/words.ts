// When a part opens, as a calendar says it.
import { clockWords, dayWords } from '#core/moment-words.ts';
import type { OpeningDay } from '#core/timetable/opening-days.ts';

/** `teacher`: her first name, or `you` on her own page. */
export function openingDayWords(day: OpeningDay, teacher: string, timeZone: string): string {
  switch (day.when) {
    case 'from-the-start':
      return day.isPreview ? 'Free to read, from the start.' : 'Open from the start.';
    case 'at':
      return `Opens on ${dayWords(day.at, timeZone)} at ${clockWords(day.at, timeZone)}.`;
    case 'part':
    case 'verdict': {
      if (day.after === null) return 'It waits for a part that comes later, or was taken out: nobody can open it.';
      if (day.when === 'part') return `Opens when Part ${day.after} is done.${day.earliest === null ? '' : ` On ${dayWords(day.earliest, timeZone)} at the earliest.`}`;
      const says = `Opens when ${teacher} ${teacher === 'you' ? 'say' : 'says'} weave on to the photo of Part ${day.after}.`;
      return day.earliest === null ? says : `${says} On ${dayWords(day.earliest, timeZone)}, if the photo is shown at once and answered in the time promised.`;
    }
  }
}
