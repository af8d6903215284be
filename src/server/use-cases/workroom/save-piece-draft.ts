import type { PieceDraftInput } from '#contracts/piece.ts';
import type { Context } from '#server/context.ts';
import { draftOfPiece, onlyAsked, standingTexts, writeDraft } from './_piece-draft.ts';
import { ownSeries, requireRevision, withSeriesLocked } from './_own-series.ts';

/**
 * Keeps the form of a pattern piece as it stands, whether it can be woven yet or not. Students go on with the piece as it
 * was saved. Of two windows that wrote, the later one's texts are set aside, or, `over` the other's, the other's are.
 * @throws CONFLICT when another window kept or saved something else since `revision`.
 */
export async function savePieceDraft(ctx: Context, input: PieceDraftInput): Promise<{ readonly revision: number; readonly savedAt: Date }> {
  const known = await ownSeries(ctx, input.series);
  const texts = onlyAsked(input.texts);
  const now = ctx.clock.now();
  const { draft, seen } = await withSeriesLocked(known, async (series) => {
    const draft = await draftOfPiece(series);
    const seen = draft.revision;
    const stood = await standingTexts(ctx, draft);
    if (JSON.stringify(stood?.texts) === JSON.stringify(texts)) return { draft, seen: input.revision };
    if (seen !== input.revision) await draft.set({ setAside: { texts, writtenAt: now.toISOString() } }).save();
    else await writeDraft(ctx, draft, { texts, ...(input.over ? { setAside: stood } : {}) });
    return { draft, seen };
  });
  requireRevision(seen, input.revision);
  return { revision: draft.revision, savedAt: now };
}
