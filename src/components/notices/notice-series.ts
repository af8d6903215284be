// What the pages about notices show of a series: its parts by number, its amounts.
import { amountsOfDesk } from '#components/workroom/desk-of-part.ts';
import type { AmountGroup } from '#core/craft/amount-choices.ts';
import { audienceWords } from '#core/notices/audience-words.ts';
import { titleHalves } from '#core/series/title.ts';
import type { Units } from '#core/units/units.ts';
import type { NoticeInList } from '#server/queries/notices/workroom-notices.ts';
import type { ClassSeries } from '#server/queries/workroom/class-of.ts';

/** Amounts of the one series there is; of several, each has its own names. */
export function amountsToWrite(classes: readonly ClassSeries[], units: Units): AmountGroup[] {
  const only = classes.length === 1 ? classes[0] : undefined;
  return only === undefined ? [] : amountsOfDesk({ pattern: only.piece }, units);
}

/** Whom it means, in words; a part that was taken out since is said to be gone. */
export function whomWords(notice: NoticeInList, classes: readonly ClassSeries[]): string {
  const series = titleHalves(notice.seriesTitle).name;
  if (notice.kind === 'nudge') return notice.toName === null ? series : `${notice.toName}, ${series}`;
  const part = classes.find(({ id }) => id === notice.seriesId)?.parts.find(({ id }) => id === notice.atLessonId) ?? null;
  if (notice.atLessonId !== null && part === null) return `Those at a part of ${series} that is not there any more`;
  return audienceWords({ series, part, stillDays: notice.stillDays });
}

/** `3 people have it, 2 by letter too; one has marked it as read.` */
export function reachedWords({ reached, byLetter, read }: NoticeInList): string {
  const people = reached === 0 ? 'Nobody was there to get it' : `${reached} ${reached === 1 ? 'person has' : 'people have'} it`;
  const letters = byLetter === 0 ? '' : reached === 1 ? ', by letter too' : `, ${byLetter} by letter too`;
  return `${people}${letters}${reached === 0 ? '' : `; ${read === 0 ? 'nobody has' : read === 1 ? 'one has' : `${read} have`} marked it as read`}.`;
}
