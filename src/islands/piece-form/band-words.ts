/** What a planned band says of itself in its row: a patch of its cloth, how high it is, what is counted in it. */
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { swatchOfBand } from '#core/craft/cloth/swatch-of.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import type { BandPlan, FrameLoomPlan } from '#core/craft/plan-types.ts';
import { formatAmount, type AmountPart } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

export interface BandWords {
  readonly patch: WovenPiece;
  readonly height: readonly AmountPart[];
  readonly counts: string;
}

const counted = (count: number, one: string, many = `${one}s`): string => `${String(count)} ${count === 1 ? one : many}`;

function countsOf(band: Band, planned: BandPlan): string {
  switch (band.technique) {
    case 'tabby':
      return counted(planned.picks ?? 0, 'row');
    case 'soumak':
    case 'twining':
    case 'loop-pile':
      return counted(band.rows, 'row');
    case 'rya':
      return `${counted(band.rows, 'row')} of ${counted((planned.knots ?? 0) / band.rows, 'knot')}`;
    case 'roving':
      return counted(band.passes ?? 1, 'pass', 'passes');
    case 'hem-stitch':
      return counted(planned.stitches ?? 0, 'stitch', 'stitches');
  }
}

/** In the order of the piece's bands. */
export function bandWords(piece: FrameLoomPiece, plan: FrameLoomPlan, cloth: WovenPiece, units: Units): readonly BandWords[] {
  return piece.bands.flatMap((band, index) => {
    const planned = plan.bands[index];
    if (planned === undefined) return [];
    const height = planned.heightMm === 0 ? [] : formatAmount(lengthOf(planned.heightMm, planned.heightMm < 10 ? 'fine' : 'size'), units);
    return [{ patch: swatchOfBand(cloth, index), height, counts: countsOf(band, planned) }];
  });
}
