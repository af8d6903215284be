import type { FormTexts } from '#core/craft/piece-form/field-names.ts';
import type { Context } from '#server/context.ts';
import { draftOfPiece, onlyAsked, writeDraft } from './_piece-draft.ts';
import { ownSeries, requireRevision, withSeriesLocked } from './_own-series.ts';

/**
 * Puts something else into the form of a pattern piece: the piece `as-saved`, or the texts that were `set-aside`. What
 * stood in the form is set aside, so that each way leads back.
 * @throws CONFLICT when another window was first.
 */
export async function exchangePieceDraft(ctx: Context, input: { series: string; revision: number; texts: FormTexts; to: 'as-saved' | 'set-aside' }): Promise<void> {
  const known = await ownSeries(ctx, input.series);
  await withSeriesLocked(known, async (series) => {
    const draft = await draftOfPiece(series);
    requireRevision(draft.revision, input.revision);
    const setAside = { texts: onlyAsked(input.texts), writtenAt: ctx.clock.now().toISOString() };
    if (input.to === 'as-saved') await writeDraft(ctx, draft, { texts: null, setAside });
    else if (draft.setAside !== null) await writeDraft(ctx, draft, { texts: draft.setAside.texts, setAside });
  });
}
