/** The pattern piece of a series, for its teacher, and which texts ask for amounts it does not give. */
import type { CraftName, Piece } from '#core/craft/crafts.ts';
import type { Actor } from '#server/context.ts';
import { PatternPiece, Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { seriesInHand } from '#server/queries/series/series-in-hand.ts';

export interface PatternPieceFor {
  readonly series: { readonly slug: string; readonly title: string; readonly craft: CraftName };
  /** Null while nothing is described. */
  readonly piece: Piece | null;
  readonly revision: number;
  readonly savedAt: Date | null;
  /** Parts whose text or list asks for amounts that this piece's plan does not give. */
  readonly asking: readonly { readonly part: number; readonly title: string; readonly keys: readonly string[] }[];
}

/** @returns null when there is no such series, or it is another teacher's. */
export async function patternPiece(actor: Actor, slug: string): Promise<PatternPieceFor | null> {
  const series = await Series.findOne({ where: { slug } });
  if (series === null || !mayTeachIn(actor, series.workroomId)) return null;
  const [kept, { inHand }] = await Promise.all([PatternPiece.findByPk(series.id), seriesInHand(series)]);
  return {
    series: { slug, title: series.title, craft: series.craft },
    piece: kept?.data ?? null,
    revision: kept?.revision ?? 0,
    savedAt: kept?.updatedAt ?? null,
    asking: inHand.parts.flatMap(({ number, title, unknownAmounts, unknownListAmounts }) => {
      const keys = [...new Set([...unknownAmounts, ...unknownListAmounts])];
      return keys.length === 0 ? [] : [{ part: number, title, keys }];
    }),
  };
}
