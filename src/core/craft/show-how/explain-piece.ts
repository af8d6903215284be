/** The workings of a whole piece, in the order in which one number needs the other. */
import { weaveBands } from '#core/craft/frame-loom/add-up.ts';
import { putOnLoom } from '#core/craft/frame-loom/plan-frame-loom.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { noteWarp } from '#core/craft/show-how/explain-warp.ts';
import { noteWeft } from '#core/craft/show-how/explain-weft.ts';
import type { Notebook } from '#core/craft/show-how/notebook.ts';

export function notePiece(book: Notebook, fields: Fields): boolean {
  fields.choice('craft', 'Craft', ['frame-loom']);
  const piece = putOnLoom(fields);
  if (piece === undefined) return false;
  const of = { book, piece };
  const bands = weaveBands(piece);
  const warp = noteWarp(of);
  noteWeft(of, bands, warp);
  return true;
}
