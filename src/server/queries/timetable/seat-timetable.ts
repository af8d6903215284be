/** When the parts of a series open to one seat: those that are published, in their order. */
import { QueryTypes } from 'sequelize';
import { openingDays, type OpeningDay } from '#core/timetable/opening-days.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { Enrolment, Lesson, Series, User, Workroom } from '#server/models/index.ts';

export type TimetableDay = OpeningDay & { readonly revision: number; readonly changedAt: Date };

export interface SeatTimetable {
  readonly seat: { readonly publicId: string; readonly startedAt: Date; readonly calendarRevision: number };
  readonly series: { readonly slug: string; readonly title: string };
  readonly teacherName: string;
  readonly answerDays: number;
  readonly days: readonly TimetableDay[];
}

/** @returns null without such an active seat. Whether the asker may see it is for the caller to ask first. */
export async function seatTimetable(seatPublicId: string, now: Date): Promise<SeatTimetable | null> {
  const seat = await Enrolment.findOne({ where: { publicId: seatPublicId, state: 'active' } });
  if (seat === null) return null;
  const series = await Series.findByPk(seat.seriesId, { rejectOnEmpty: true });
  const workroom = await Workroom.findByPk(series.workroomId, { rejectOnEmpty: true });
  const [teacher, lessons, woven, finished] = await Promise.all([
    User.findByPk(workroom.ownerId, { rejectOnEmpty: true }),
    Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null }, order: ['position', 'id'], attributes: ['publicId', 'title', 'opens', 'isPreview', 'checkpoint', 'publishedVersionId', 'timetableRevision', 'updatedAt'] }),
    sequelize.query<{ publicId: string; at: Date }>(
      `SELECT l.public_id AS publicId, MIN(p.verdict_at) AS at FROM progress_photos p JOIN lessons l ON l.id = p.lesson_id
        WHERE p.enrolment_id = ? AND p.verdict = 'weave-on' GROUP BY l.public_id`,
      { replacements: [seat.id], type: QueryTypes.SELECT },
    ),
    sequelize.query<{ publicId: string; at: Date }>(
      'SELECT l.public_id AS publicId, v.finished_at AS at FROM lesson_visits v JOIN lessons l ON l.id = v.lesson_id WHERE v.enrolment_id = ? AND v.finished_at IS NOT NULL',
      { replacements: [seat.id], type: QueryTypes.SELECT },
    ),
  ]);
  const shown = lessons.filter(({ publishedVersionId }) => publishedVersionId !== null);
  const parts = shown.map(({ publicId, title, opens, isPreview, checkpoint }, index) => ({ publicId, number: index + 1, title, opens, isPreview, asksForPhoto: checkpoint !== null }));
  const days = openingDays(parts, { seatStartedAt: seat.startedAt, wovenOnAt: byPart(woven), doneAt: byPart([...woven, ...finished]), answerDays: workroom.answerDays, now });
  return {
    seat: { publicId: seat.publicId, startedAt: seat.startedAt, calendarRevision: seat.calendarRevision },
    series: { slug: series.slug, title: series.title },
    teacherName: teacher.name,
    answerDays: workroom.answerDays,
    days: days.map((day, index) => ({ ...day, revision: shown[index]?.timetableRevision ?? 0, changedAt: shown[index]?.updatedAt ?? seat.startedAt })),
  };
}

const byPart = (rows: readonly { publicId: string; at: Date }[]): Map<string, Date> => new Map(rows.map(({ publicId, at }) => [publicId, at]));
