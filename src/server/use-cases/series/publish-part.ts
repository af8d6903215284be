import { partMayGoOut } from '#core/series/publishing-order.ts';
import { whatIsMissing } from '#core/series/missing.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { Lesson, Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { seriesInHand } from '#server/queries/series/series-in-hand.ts';
import { mediaNamed, publishDraft } from './_publish-draft.ts';
import { publishMedia } from './_publish-media.ts';

/** The part as it went out. */
export interface PartOut {
  readonly series: string;
  readonly publicId: string;
  readonly number: number;
}

/**
 * Makes the draft of one part what students read, with the videos it speaks of; the others stay as they are.
 * @throws CONFLICT for a part that was taken out, in a series that is not open to buyers, or before an earlier part is
 * out, or while it lacks something.
 */
export async function publishPart(ctx: Context, publicId: string): Promise<PartOut> {
  const known = found(await Lesson.findOne({ where: { publicId } }));
  const of = found(await Series.findByPk(known.seriesId));
  authorize(mayTeachIn(ctx.actor, of.workroomId));
  return withTransaction(async () => {
    const series = found(await Series.findByPk(of.id, { lock: true }));
    if (series.state !== 'published') throw new AppError('CONFLICT', { says: 'This series is a draft. Publish the series first: every part that is ready goes out with it.' });
    const { inHand, drafts } = await seriesInHand(series);
    const at = drafts.findIndex(({ lesson }) => lesson.id === known.id);
    const draft = drafts[at];
    if (draft === undefined) throw new AppError('CONFLICT', { says: 'This part was taken out. Put it back first.' });
    const parts = drafts.map(({ lesson }, index) => ({ number: index + 1, isPublished: lesson.publishedVersionId !== null }));
    const outcome = partMayGoOut(at + 1, parts, whatIsMissing(inHand));
    if (!outcome.ok) throw new AppError('CONFLICT', { says: outcome.says });
    await publishDraft(ctx, draft);
    const named = mediaNamed([draft]);
    await publishMedia(series.id, (name) => named.has(name));
    await audit(ctx, 'publish-part', { kind: 'lesson', id: draft.lesson.publicId }, { series: series.publicId, part: at + 1 });
    return { series: series.slug, publicId, number: at + 1 };
  });
}
