/** A person's finished piece of one series, with all that its page tells. */
import { madeFor, type MadeFor } from '#core/craft/made-for.ts';
import { yarnsInPiece, type YarnInPiece, type YarnSaid } from '#core/finish/yarns-in-piece.ts';
import type { Actor } from '#server/context.ts';
import { FinishedPiece, Media, WallPiece } from '#server/models/index.ts';
import { mayWriteDown } from '#server/policies/finish.ts';
import { weavingTimes } from '#server/queries/loom/weaving-times.ts';
import { piecesOf } from '#server/queries/pieces/pieces-of.ts';
import { finishedBy } from '#server/queries/reviews/reviews-of.ts';
import { seriesFor, type SeriesFor } from '#server/queries/series/series-for.ts';

export interface FinishedPieceFor {
  readonly series: SeriesFor;
  readonly seat: NonNullable<SeriesFor['seat']>;
  /** Every part is done. */
  readonly hasFinished: boolean;
  readonly mayWriteDown: boolean;
  /** Null for a series that tells no piece. */
  readonly made: MadeFor | null;
  readonly yarns: readonly YarnInPiece[];
  readonly said: Readonly<Record<string, YarnSaid>>;
  /** Null while she said nothing; then what she wrote down at the loom stands for it. */
  readonly minutes: number | null;
  readonly writtenDownMinutes: number;
  readonly note: string;
  /** What she agreed to show last; null while she never did. */
  readonly wall: { readonly name: string; readonly words: string; readonly hangs: boolean; readonly hiddenWhy: string } | null;
  readonly photo: { readonly publicId: string; readonly width: number; readonly height: number } | null;
}

/** Null without a seat, and when there is no such series. */
export async function finishedPiece(actor: Actor, slug: string, now: Date): Promise<FinishedPieceFor | null> {
  const series = await seriesFor(actor, slug, now);
  if (series === null || series.seat === null) return null;
  const { seat } = series;
  const [{ pattern, mine, woven }, row, wall, times] = await Promise.all([piecesOf(series.id, seat.enrolmentId), FinishedPiece.findByPk(seat.enrolmentId), WallPiece.findOne({ where: { enrolmentId: seat.enrolmentId } }), weavingTimes([seat.enrolmentId])]);
  const photo = row === null || row.mediaId === null ? null : await Media.findByPk(row.mediaId);
  const made = madeFor(pattern, mine, actor.units, woven);
  const hasFinished = finishedBy(series);
  return {
    series, seat, hasFinished, made,
    mayWriteDown: mayWriteDown({ hasSeat: true, hasFinished, saysSo: (row?.saidAt ?? null) !== null }),
    yarns: made === null ? [] : yarnsInPiece(made),
    said: row?.yarns ?? {},
    minutes: row?.minutes ?? null,
    writtenDownMinutes: times.reduce((sum, { minutes }) => sum + minutes, 0),
    note: row?.note ?? '',
    wall: wall === null ? null : { name: wall.shownName, words: wall.words, hangs: wall.withdrawnAt === null && wall.mediaId === (row?.mediaId ?? null) && wall.mediaId !== null, hiddenWhy: wall.hiddenAt === null ? '' : wall.hiddenWhy },
    photo: photo === null ? null : { publicId: photo.publicId, width: photo.width ?? 1, height: photo.height ?? 1 },
  };
}
