import { factsOf } from '#core/lesson-text/lesson-facts.ts';
import { whatIsMissing } from '#core/series/missing.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { LessonVersion, Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { seriesInHand, type Draft } from '#server/queries/series/series-in-hand.ts';
import { publishMedia } from './_publish-media.ts';

/**
 * Makes a series open to buyers, and each draft that differs from what students read the text they read from now on;
 * videos and their captions likewise.
 * Doing it again publishes what was changed since.
 * @throws VALIDATION with the list of what blocks.
 */
export async function publishSeries(ctx: Context, slug: string): Promise<void> {
  const known = found(await Series.findOne({ where: { slug } }));
  authorize(mayTeachIn(ctx.actor, known.workroomId));
  await withTransaction(async () => {
    const series = found(await Series.findByPk(known.id, { lock: true }));
    const { inHand, drafts } = await seriesInHand(series);
    const blocking = whatIsMissing(inHand).filter(({ blocks }) => blocks);
    if (blocking.length > 0) {
      throw new AppError('VALIDATION', { says: `It is not ready yet. ${blocking.map(({ part, says }) => (part === null ? says : `Part ${part}: ${says}`)).join(' ')}` });
    }
    for (const draft of drafts) await publishDraft(ctx, draft);
    await publishMedia(series.id);
    await series.update({ state: 'published', publishedAt: series.publishedAt ?? ctx.clock.now() });
    await audit(ctx, 'publish-series', { kind: 'series', id: series.publicId });
  });
}

async function publishDraft(ctx: Context, { lesson, text }: Draft): Promise<void> {
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
