/** The timetable of a whole series as a student would meet it who starts on a given day. For its teacher. */
import { dayIn } from '#core/timetable/day-in.ts';
import { openingDays, type OpeningDay } from '#core/timetable/opening-days.ts';
import { outOfOrder, type OutOfOrder } from '#core/timetable/out-of-order.ts';
import { instantOfWall } from '#core/timetable/opening.ts';
import type { Actor } from '#server/context.ts';
import { Lesson, Series, Workroom } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

export interface PlannedTimetable {
  readonly series: { readonly slug: string; readonly title: string };
  readonly timeZone: string;
  readonly answerDays: number;
  /** `date` is a day of the workroom's calendar, `YYYY-MM-DD`; `at` nine o'clock of it. */
  readonly start: { readonly date: string; readonly at: Date };
  /** The day that was asked for is none, so today was taken. */
  readonly notDated: boolean;
  readonly days: readonly OpeningDay[];
  /** Parts that somebody who starts on that day could open before one in front of them. */
  readonly early: readonly OutOfOrder[];
}

/**
 * @param asked `YYYY-MM-DD`; null for today
 * @returns null when there is no such series, or it is another teacher's.
 */
export async function planTimetable(actor: Actor, slug: string, asked: string | null, now: Date): Promise<PlannedTimetable | null> {
  const series = await Series.findOne({ where: { slug } });
  if (series === null || !mayTeachIn(actor, series.workroomId)) return null;
  const [workroom, lessons] = await Promise.all([
    Workroom.findByPk(series.workroomId, { rejectOnEmpty: true }),
    Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null }, order: ['position', 'id'], attributes: ['publicId', 'title', 'opens', 'isPreview', 'checkpoint'] }),
  ]);
  const { timeZone, answerDays } = workroom;
  const today = dayIn(now, timeZone);
  const wished = asked === null ? null : instantOfWall(`${asked}T09:00`, timeZone);
  const start = asked !== null && wished !== null ? { date: asked, at: wished } : { date: today, at: instantOfWall(`${today}T09:00`, timeZone) ?? now };
  const parts = lessons.map(({ publicId, title, opens, isPreview, checkpoint }, index) => ({ publicId, number: index + 1, title, opens, isPreview, asksForPhoto: checkpoint !== null }));
  return {
    series: { slug, title: series.title },
    timeZone,
    answerDays,
    start,
    notDated: asked !== null && asked !== '' && wished === null,
    days: openingDays(parts, { seatStartedAt: start.at, wovenOnAt: new Map(), doneAt: new Map(), answerDays, now: start.at }),
    early: outOfOrder(parts, start.at),
  };
}
