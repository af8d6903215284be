/** How wide a piece can be on the loom that was typed. */
import { changePiece } from '#core/craft/fitting/change-piece.ts';
import { roomOnLoom } from '#core/craft/fit.ts';
import type { Piece } from '#core/craft/piece.ts';
import { fieldText, readText } from '#core/craft/piece-form/field-text.ts';
import { textOf } from '#core/craft/piece-form/typed-piece.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import { INSIDE_WIDTH, NAIL_PITCH, WIDTH } from './asked-of-mine.ts';
import { chosenLoom, judgeMine } from './judge-mine.ts';
import type { TypedMine } from './typed-mine.ts';

/** Narrower than this nobody would call it the same piece. */
const LEAST_MM = 80;
const STEPS = 12;

/** In mm, a round number in her units; null when nothing worth weaving fits, or something else stands in the way. */
export function widestOnLoom(typed: TypedMine, pattern: Piece): number | null {
  const inside = lengthOfField(typed, INSIDE_WIDTH);
  if (inside === undefined) return null;
  const pitch = lengthOfField(typed, NAIL_PITCH);
  const onLoom = changePiece(pattern, { loom: { ...chosenLoom(typed), insideWidthMm: inside, ...(pitch === undefined ? {} : { nailPitchMm: pitch }) }, endsTogether: textOf(typed.texts, 'endsTogether') === '2' ? 2 : 1 });
  const room = roomOnLoom(onLoom).widthMm;
  if (room === undefined) return null;
  const step = typed.units === 'in' ? MM_PER_INCH / 4 : 5;
  // The room is reckoned before the number of ends is made even, so the first width may be a step too wide.
  for (let steps = Math.floor(room / step), tries = 0; tries < STEPS && steps * step >= LEAST_MM; steps -= 1, tries += 1) {
    const narrower = { ...typed, texts: { ...typed.texts, [WIDTH.key]: fieldText(steps * step, WIDTH, typed.units) } };
    if (judgeMine(narrower, pattern).ok) return steps * step;
  }
  return null;
}

function lengthOfField(typed: TypedMine, asked: typeof INSIDE_WIDTH): number | undefined {
  const read = readText(textOf(typed.texts, asked.key), asked, typed.units);
  return read.ok && typeof read.value === 'number' ? read.value : undefined;
}
