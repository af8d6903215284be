import { partsGoingOut } from '#core/series/publishing-order.ts';
import { whatIsMissing, type Missing } from '#core/series/missing.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { seriesInHand } from '#server/queries/series/series-in-hand.ts';
import { mediaNamed, publishDraft } from './_publish-draft.ts';
import { publishMedia } from './_publish-media.ts';

/** Numbers of the parts that students read as they are drafted now, and of those that were held back. */
export interface Published {
  readonly out: readonly number[];
  readonly held: readonly number[];
}

/**
 * Makes a series open to buyers, and each draft that is ready and differs from what students read the text they read
 * from now on; videos and their captions likewise. Parts go out in their order: the first that lacks something holds
 * back those behind it that were never out. Doing it again publishes what was changed since.
 * @throws VALIDATION with the list of what blocks, when no part can go out.
 */
export async function publishSeries(ctx: Context, slug: string): Promise<Published> {
  const known = found(await Series.findOne({ where: { slug } }));
  authorize(mayTeachIn(ctx.actor, known.workroomId));
  return withTransaction(async () => {
    const series = found(await Series.findByPk(known.id, { lock: true }));
    const { inHand, drafts } = await seriesInHand(series);
    const { out, held, blocking } = partsGoingOut(drafts.map(({ lesson }, index) => ({ number: index + 1, isPublished: lesson.publishedVersionId !== null })), whatIsMissing(inHand));
    if (out.length === 0) throw notReady(blocking);
    const going = drafts.filter((_draft, index) => out.includes(index + 1));
    const kept = mediaNamed(drafts.filter((draft) => !going.includes(draft)));
    const shown = mediaNamed(going);
    for (const draft of going) await publishDraft(ctx, draft);
    await publishMedia(series.id, (name) => shown.has(name) || !kept.has(name));
    await series.update({ state: 'published', publishedAt: series.publishedAt ?? ctx.clock.now() });
    await audit(ctx, 'publish-series', { kind: 'series', id: series.publicId }, { parts: out.join(', ') });
    return { out, held };
  });
}

function notReady(blocking: readonly Missing[]): AppError {
  return new AppError('VALIDATION', { says: `It is not ready yet. ${blocking.map(({ part, says }) => (part === null ? says : `Part ${part}: ${says}`)).join(' ')}` });
}
