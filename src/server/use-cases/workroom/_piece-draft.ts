/** Steps that every act on a pattern piece being described shares. All of them run under the series' lock. */
import { textsOfTyped, typedOfTexts, type FormTexts } from '#core/craft/piece-form/field-names.ts';
import { typePiece } from '#core/craft/piece-form/type-piece.ts';
import type { Context } from '#server/context.ts';
import { PatternPiece, PieceDraft, type Series } from '#server/models/index.ts';
import type { AsideTexts } from '#server/models/piece-draft.ts';

/** The draft of the series; a fresh one, not written yet, where there is none. */
export async function draftOfPiece(series: Series): Promise<PieceDraft> {
  return (await PieceDraft.findByPk(series.id)) ?? PieceDraft.build({ seriesId: series.id, writtenAt: series.createdAt });
}

/** Without anything a form of a piece does not ask. */
export const onlyAsked = (texts: FormTexts): FormTexts => textsOfTyped(typedOfTexts(texts));

/** What the form shows for this draft: its own texts, else those of the saved piece; null for neither. */
export async function standingTexts(ctx: Context, draft: PieceDraft): Promise<AsideTexts | null> {
  if (draft.texts !== null) return { texts: draft.texts, writtenAt: draft.writtenAt.toISOString() };
  const saved = await PatternPiece.findByPk(draft.seriesId);
  if (saved?.data.craft !== 'frame-loom') return null;
  return { texts: textsOfTyped(typePiece(saved.data, ctx.actor?.units ?? 'cm')), writtenAt: saved.updatedAt.toISOString() };
}

/** The next state of the draft; `texts` null means that the piece stands as it was saved. */
export async function writeDraft(ctx: Context, draft: PieceDraft, next: { texts: FormTexts | null; setAside?: AsideTexts | null }): Promise<PieceDraft> {
  return draft.set({ ...next, revision: draft.revision + 1, authorId: ctx.actor?.userId ?? null, writtenAt: ctx.clock.now() }).save();
}
