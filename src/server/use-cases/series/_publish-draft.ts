import { factsOf } from '#core/lesson-text/lesson-facts.ts';
import type { Context } from '#server/context.ts';
import { LessonVersion } from '#server/models/index.ts';
import type { Draft } from '#server/queries/series/series-in-hand.ts';

/** Makes a part's draft the version that students read, if it differs from theirs. Runs under the lock of its series. */
export async function publishDraft(ctx: Context, { lesson, text }: Draft): Promise<void> {
  if (!text.ok) return;
  const current = lesson.publishedVersionId === null ? null : await LessonVersion.findByPk(lesson.publishedVersionId);
  if (current !== null && current.source === lesson.draftSource) return;
  const last = await LessonVersion.max<number | null, LessonVersion>('number', { where: { lessonId: lesson.id } });
  const version = await LessonVersion.create({
    lessonId: lesson.id,
    number: (last ?? 0) + 1,
    source: lesson.draftSource,
    tree: text.tree,
    facts: factsOf(text.tree),
    authorId: ctx.actor?.userId ?? null,
  });
  await lesson.update({ publishedVersionId: version.id });
}

/** Names of the videos and pictures that drafts speak of. */
export function mediaNamed(drafts: readonly Draft[]): Set<string> {
  return new Set(drafts.flatMap(({ text }) => (text.ok ? text.media.map(({ name }) => name) : [])));
}
