import { planPiece } from '#core/craft/plan.ts';
import type { Piece } from '#core/craft/crafts.ts';
import type { Problem } from '#core/outcome.ts';
import type { Context } from '#server/context.ts';
import { PatternPiece } from '#server/models/index.ts';
import { draftOfPiece, standingTexts, writeDraft } from './_piece-draft.ts';
import { ownSeries, requireRevision, withSeriesLocked } from './_own-series.ts';

export type PieceSaved = { readonly ok: true; readonly revision: number } | { readonly ok: false; readonly problems: readonly Problem[] };

/**
 * Keeps the pattern piece of a series, if it can be woven: from now on students have it, and no draft is left.
 * `revision` is that of the draft, 0 for a series without one. What the engine finds wrong comes back by place (JSON
 * pointers); nothing is kept then. `over` sets aside what stood there.
 * @throws CONFLICT when another window kept or saved something since.
 */
export async function savePiece(ctx: Context, input: { series: string; revision: number; piece: unknown; over?: boolean }): Promise<PieceSaved> {
  const known = await ownSeries(ctx, input.series);
  const plan = planPiece(input.piece);
  if (!plan.ok) return { ok: false, problems: plan.problems };
  // Reckoned without a problem, so it has the shape of a piece.
  const data = input.piece as Piece;
  if (data.craft !== known.craft) {
    return { ok: false, problems: [{ code: 'E_ENUM', path: '/craft', message: 'This piece is of another craft than the series.' }] };
  }
  return withSeriesLocked(known, async (series) => {
    const draft = await draftOfPiece(series);
    requireRevision(draft.revision, input.revision);
    const stood = input.over === true ? { setAside: await standingTexts(ctx, draft) } : {};
    const kept = await PatternPiece.findByPk(series.id);
    if (kept === null) await PatternPiece.create({ seriesId: series.id, data, revision: 1 });
    else await kept.update({ data, revision: kept.revision + 1 });
    return { ok: true, revision: (await writeDraft(ctx, draft, { texts: null, ...stood })).revision };
  });
}
