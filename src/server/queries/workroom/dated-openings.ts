import { Op } from 'sequelize';
import { Lesson, Series } from '#server/models/index.ts';

export interface DatedOpening {
  readonly seriesTitle: string;
  readonly part: number;
  readonly opensAt: Date;
}

/** Parts of a workroom that open on a date to come, the next one first. */
export async function datedOpenings(workroomId: number, now: Date): Promise<DatedOpening[]> {
  const series = new Map((await Series.findAll({ where: { workroomId }, attributes: ['id', 'title'] })).map(({ id, title }) => [id, title]));
  const lessons = await Lesson.findAll({ where: { seriesId: [...series.keys()], takenOutAt: null, opensAt: { [Op.gt]: now } }, order: ['opensAt', 'id'] });
  return lessons.flatMap(({ seriesId, position, opens, opensAt }) => (opens.rule !== 'on-date' || opensAt === null ? [] : [{ seriesTitle: series.get(seriesId) ?? '', part: position, opensAt }]));
}
