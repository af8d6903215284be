// A seat as cloth: the piece, how much of it is woven, and where each part lies on it.
import type { ClothPiece, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { PartStretch } from '#core/craft/cloth/parts-strip.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { madeFor, type MadeFor } from '#core/craft/made-for.ts';
import { countedCloth } from '#core/following/counted-cloth.ts';
import { fellOf, howFar, type HowFar } from '#core/following/progress.ts';
import { titleHalves } from '#core/series/title.ts';
import type { Units } from '#core/units/units.ts';
import type { SeatOnLoom } from '#server/queries/loom/my-loom.ts';

export interface ClothOnLoom {
  readonly made: MadeFor | null;
  /** Null where nothing can be drawn. */
  readonly piece: ClothPiece | null;
  readonly far: HowFar;
  /** Share of the height, 0 to 1. */
  readonly woven: number;
  readonly stretches: readonly PartStretch[];
}

export function clothOnLoom(seat: SeatOnLoom, units: Units): ClothOnLoom {
  const made = madeFor(seat.pattern, seat.mine, units, seat.woven);
  const far = howFar(seat.parts);
  const { name } = titleHalves(seat.title);
  const piece = made && clothOf(made.piece, made.plan, name);
  if (made === null || piece?.kind !== 'woven') return { made, far, piece, woven: far.inHand === undefined ? 1 : 0, stretches: [] };
  const { stretches, heights, counted } = countedCloth(made, piece, seat.parts.map(({ amountKeys }) => amountKeys), seat.counts, seat.woven);
  const { share: woven, ...fell } = fellOf(seat.parts, stretches, heights, counted);
  return { made, far: fell, piece, stretches, woven };
}

export interface LoomMark {
  /** From the upper edge of the woven height, in per cent of it. */
  readonly share: number;
  readonly number: number;
  readonly title: string;
  readonly state: 'done' | 'here' | 'ahead';
}

/** Where the parts that weave lie on the cloth, as shares of its height from the first row: a part ahead at its middle. */
export function marksOf(seat: SeatOnLoom, { stretches, far, woven }: ClothOnLoom, piece: WovenPiece): LoomMark[] {
  const total = piece.bands.reduce((sum, { heightMm }) => sum + heightMm, 0);
  let at = 0;
  return seat.parts.flatMap((part, index): LoomMark[] => {
    const high = (stretches[index]?.bands ?? []).reduce<number>((sum, band) => sum + (typeof band === 'number' ? (piece.bands[band]?.heightMm ?? 0) : 0), 0);
    if (high === 0 || total === 0) return [];
    const middle = (at + high / 2) / total;
    at += high;
    const here = far.inHand?.number === part.number;
    return [{ share: here ? woven : middle, number: part.number, title: part.title, state: here ? 'here' : index < far.done ? 'done' : 'ahead' }];
  });
}
