/** Which techniques a part teaches, as told by its text: those of the bands whose amounts it shows. */
import type { Piece } from '#core/craft/crafts.ts';
import type { TechniqueName } from '#core/craft/piece.ts';

/** A part that speaks of more than so many plans or sums up; it teaches none of them. */
const MOST = 2;

/** Each once, in the order of the bands; none where the craft knows no bands. */
export function techniquesOfPart(piece: Piece | null, amountKeys: readonly string[]): readonly TechniqueName[] {
  if (piece === null || !('bands' in piece)) return [];
  const named = piece.bands.filter(({ name }) => name !== undefined && amountKeys.some((key) => key.startsWith(`band.${name}.`)));
  const techniques = [...new Set(named.map(({ technique }) => technique))];
  return techniques.length > MOST ? [] : techniques;
}
