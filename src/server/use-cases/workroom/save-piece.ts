import { planPiece } from '#core/craft/plan.ts';
import type { Piece } from '#core/craft/crafts.ts';
import type { Problem } from '#core/outcome.ts';
import type { Context } from '#server/context.ts';
import { PatternPiece } from '#server/models/index.ts';
import { ownSeries, requireRevision, withSeriesLocked } from './_own-series.ts';

export type PieceSaved = { readonly ok: true; readonly revision: number } | { readonly ok: false; readonly problems: readonly Problem[] };

/**
 * Keeps the pattern piece of a series, if it can be woven. `revision` is 0 for a series without one.
 * What the engine finds wrong comes back by place (JSON pointers); nothing is kept then.
 * @throws CONFLICT when another window saved it since.
 */
export async function savePiece(ctx: Context, input: { series: string; revision: number; piece: unknown }): Promise<PieceSaved> {
  const known = await ownSeries(ctx, input.series);
  const plan = planPiece(input.piece);
  if (!plan.ok) return { ok: false, problems: plan.problems };
  // Reckoned without a problem, so it has the shape of a piece.
  const data = input.piece as Piece;
  if (data.craft !== known.craft) {
    return { ok: false, problems: [{ code: 'E_ENUM', path: '/craft', message: 'This piece is of another craft than the series.' }] };
  }
  return withSeriesLocked(known, async (series) => {
    const kept = await PatternPiece.findByPk(series.id);
    requireRevision(kept?.revision ?? 0, input.revision);
    const revision = (kept?.revision ?? 0) + 1;
    if (kept === null) await PatternPiece.create({ seriesId: series.id, data, revision });
    else await kept.update({ data, revision });
    return { ok: true, revision };
  });
}
