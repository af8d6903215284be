/** A teacher's rule for when a part opens, in her own words. */
import { clockWords, dayWords } from '#core/moment-words.ts';
import { instantOfWall, type OpeningRule } from '#core/timetable/opening.ts';

/**
 * To stand after `Opens `: `at once`, `7 days after the seat began`.
 * @param numberOf number of the part with this public id; undefined when it was taken out.
 */
export function ruleWords(rule: OpeningRule, numberOf: (publicId: string) => number | undefined): string {
  switch (rule.rule) {
    case 'at-once':
      return 'at once';
    case 'after-seat':
      return rule.days === 0 ? 'as soon as the seat begins' : `${rule.days} ${rule.days === 1 ? 'day' : 'days'} after the seat began`;
    case 'on-date': {
      const moment = instantOfWall(rule.wall, rule.zone);
      return moment === null ? 'on a date that is none' : `on ${dayWords(moment, rule.zone)} at ${clockWords(moment, rule.zone)}`;
    }
    case 'after-part': {
      const number = numberOf(rule.lesson);
      return number === undefined ? 'after a part that was taken out' : `when Part ${number} is done`;
    }
    case 'after-verdict': {
      const number = numberOf(rule.lesson);
      return number === undefined ? 'after a photo of a part that was taken out' : `after you say weave on to the photo of Part ${number}`;
    }
  }
}
