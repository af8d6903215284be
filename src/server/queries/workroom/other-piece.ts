/** What stands in the form of a pattern piece now, for a window that comes second. */
import type { OtherPiece } from '#contracts/piece.ts';
import { textsOfTyped } from '#core/craft/piece-form/field-names.ts';
import { typePiece } from '#core/craft/piece-form/type-piece.ts';
import { clockWords } from '#core/moment-words.ts';
import type { Actor } from '#server/context.ts';
import { PatternPiece, PieceDraft, Series, User } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/** @returns null when nothing was ever kept, or it is not the asker's. */
export async function otherPiece(actor: Actor, slug: string): Promise<OtherPiece | null> {
  const series = await Series.findOne({ where: { slug }, attributes: ['id', 'workroomId'] });
  if (series === null || !mayTeachIn(actor, series.workroomId)) return null;
  const [draft, saved] = await Promise.all([PieceDraft.findByPk(series.id), PatternPiece.findByPk(series.id)]);
  const texts = draft?.texts ?? (saved?.data.craft === 'frame-loom' ? textsOfTyped(typePiece(saved.data, actor.units)) : null);
  if (draft === null || texts === null) return null;
  const author = draft.authorId === null || draft.authorId === actor.userId ? null : await User.findByPk(draft.authorId, { attributes: ['name'] });
  return { revision: draft.revision, texts, by: author?.name ?? null, at: clockWords(draft.writtenAt, actor.timeZone) };
}
