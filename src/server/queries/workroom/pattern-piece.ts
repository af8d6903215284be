/** The pattern piece of a series, for its teacher, and which texts ask for amounts it does not give. */
import type { CraftName, Piece } from '#core/craft/crafts.ts';
import type { FormTexts } from '#core/craft/piece-form/field-names.ts';
import type { Actor } from '#server/context.ts';
import { PatternPiece, PieceDraft, Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { seriesInHand } from '#server/queries/series/series-in-hand.ts';

export interface PatternPieceFor {
  readonly series: { readonly slug: string; readonly title: string; readonly craft: CraftName };
  /** Null while nothing is described. */
  readonly piece: Piece | null;
  /** Of the form: counts drafts and saved pieces. */
  readonly revision: number;
  readonly savedAt: Date | null;
  /** What was typed since and is not the piece yet. */
  readonly draft: { readonly texts: FormTexts; readonly writtenAt: Date } | null;
  /** When something was typed that other texts took the place of; it can be taken up again. */
  readonly asideAt: Date | null;
  /** Parts whose text or list asks for amounts that this piece's plan does not give. */
  readonly asking: readonly { readonly part: number; readonly title: string; readonly keys: readonly string[] }[];
}

/** @returns null when there is no such series, or it is another teacher's. */
export async function patternPiece(actor: Actor, slug: string): Promise<PatternPieceFor | null> {
  const series = await Series.findOne({ where: { slug } });
  if (series === null || !mayTeachIn(actor, series.workroomId)) return null;
  const [kept, draft, { inHand }] = await Promise.all([PatternPiece.findByPk(series.id), PieceDraft.findByPk(series.id), seriesInHand(series)]);
  return {
    series: { slug, title: series.title, craft: series.craft },
    piece: kept?.data ?? null,
    revision: draft?.revision ?? 0,
    savedAt: kept?.updatedAt ?? null,
    draft: draft === null || draft.texts === null ? null : { texts: draft.texts, writtenAt: draft.writtenAt },
    asideAt: draft === null || draft.setAside === null ? null : new Date(draft.setAside.writtenAt),
    asking: inHand.parts.flatMap(({ number, title, unknownAmounts, unknownListAmounts }) => {
      const keys = [...new Set([...unknownAmounts, ...unknownListAmounts])];
      return keys.length === 0 ? [] : [{ part: number, title, keys }];
    }),
  };
}
