/** Keeping a text that another one takes the place of, so that nothing a teacher wrote is lost. */
import type { Context } from '#server/context.ts';
import { EarlierDraft, LessonVersion, type Lesson } from '#server/models/index.ts';

export interface Written {
  readonly source: string;
  readonly at: Date;
}

/**
 * Keeps `text` among the earlier texts of the part, unless it is empty or stands there already: as what students read,
 * or as the last one set aside. Runs under the series' lock.
 */
export async function setAside(ctx: Context, lesson: Lesson, text: Written): Promise<void> {
  if (text.source.trim() === '') return;
  const [published, last] = await Promise.all([
    lesson.publishedVersionId === null ? null : LessonVersion.findByPk(lesson.publishedVersionId, { attributes: ['source'] }),
    EarlierDraft.findOne({ where: { lessonId: lesson.id }, order: [['id', 'DESC']] }),
  ]);
  if (published?.source === text.source || last?.source === text.source) return;
  await EarlierDraft.create({ lessonId: lesson.id, source: text.source, authorId: ctx.actor?.userId ?? null, writtenAt: text.at });
}

/** The draft of `lesson` as it stands. */
export function draftOfLesson({ draftSource, updatedAt }: Lesson): Written {
  return { source: draftSource, at: updatedAt };
}
