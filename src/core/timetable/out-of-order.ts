/** Parts that would open before an earlier one, whatever rules they have: told to the teacher before she saves an order. */
import { earliestOf, openingDays, type PartToOpen } from '#core/timetable/opening-days.ts';

const DAY_MS = 86_400_000;

export interface OutOfOrder {
  readonly part: number;
  readonly earlier: number;
  /** `Part 4 would open 3 days before Part 3.` */
  readonly says: string;
}

/**
 * One for each part that somebody who starts at `seatStartedAt` could open before a part in front of it. A verdict is
 * given the day the photo can be shown, a part done the day it opens: whoever waits may always wait longer.
 */
export function outOfOrder(parts: readonly PartToOpen[], seatStartedAt: Date): OutOfOrder[] {
  const seat = { seatStartedAt, wovenOnAt: new Map(), doneAt: new Map(), answerDays: 0, now: seatStartedAt };
  const opens = openingDays(parts, seat).filter(({ isPreview }) => !isPreview).map((day) => ({ number: day.number, at: earliestOf(day, seat) }));
  return opens.flatMap(({ number, at }, index) => {
    const before = opens.slice(0, index).reduce<{ number: number; at: Date | null } | null>((latest, one) => (one.at !== null && (latest?.at == null || one.at > latest.at) ? one : latest), null);
    if (at === null || before?.at == null || before.at <= at) return [];
    return [{ part: number, earlier: before.number, says: `Part ${number} would open ${spanWords(before.at.getTime() - at.getTime())} before Part ${before.number}.` }];
  });
}

function spanWords(ms: number): string {
  const days = Math.round(ms / DAY_MS);
  if (days >= 1) return days === 1 ? 'a day' : `${days} days`;
  const hours = Math.max(1, Math.round(ms / 3_600_000));
  return hours === 1 ? 'an hour' : `${hours} hours`;
}
