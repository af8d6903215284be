import type { Actor } from '#server/context.ts';
import { Lesson, Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/** The draft of a part as it is kept now; null when it is not the asker's. */
export async function draftOf(actor: Actor, publicId: string): Promise<{ revision: number; source: string } | null> {
  const lesson = await Lesson.findOne({ where: { publicId }, attributes: ['seriesId', 'draftRevision', 'draftSource'] });
  const series = lesson === null ? null : await Series.findByPk(lesson.seriesId, { attributes: ['workroomId'] });
  return lesson === null || series === null || !mayTeachIn(actor, series.workroomId) ? null : { revision: lesson.draftRevision, source: lesson.draftSource };
}
