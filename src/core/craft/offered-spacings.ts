/** Which spacings of working ends a loom offers, and which of them a yarn suits. */
import { TIGHTNESS } from '#core/craft/defaults.ts';
import { layoutOf } from '#core/craft/frame-loom/room.ts';
import { endsPerMm } from '#core/craft/nails.ts';
import type { Loom } from '#core/craft/piece.ts';
import { adviseSpacing, strandsFor, tightness, type SpacingAdvice } from '#core/craft/sett.ts';
import type { Thread } from '#core/craft/yarn/thread.ts';

export interface OfferedSpacing {
  /** 1 uses every nail, 2 every second one … */
  readonly everyNthNail: number;
  readonly spacingMm: number;
  /** What the weft, as it is taken together, does between ends so far apart. */
  readonly advice: SpacingAdvice;
  /** Strands of the weft that come out at the wished tightness; undefined where the warp alone fills the room. */
  readonly strands?: number;
}

/** Wider apart than this no weft of a hanging holds. */
const WIDEST_MM = 26;

type Frame = Pick<Loom, 'kind' | 'nailPitchMm' | 'nailRows' | 'warping'>;

/** On every nail, on every second, on every third …: the only spacings there are, narrowest first; at least one. */
function spacingsOf(loom: Frame): readonly number[] {
  const narrowest = 1 / endsPerMm(layoutOf(loom));
  const most = Math.max(1, Math.floor(WIDEST_MM / narrowest + 1e-9));
  return Array.from({ length: most }, (_, index) => (index + 1) * narrowest);
}

/** Every spacing of the loom with what `weft` does there. `warp` is one end. */
export function offeredSpacings(loom: Frame, warp: Thread, weft: Thread): readonly OfferedSpacing[] {
  const strandMm = weft.compressedMm / Math.sqrt(weft.strands);
  return spacingsOf(loom).map((spacingMm, index) => {
    const strands = strandsFor(spacingMm, warp.compressedMm, strandMm);
    const advice = adviseSpacing(spacingMm, warp.compressedMm, weft.loftMm);
    return { everyNthNail: index + 1, spacingMm, advice, ...(strands === undefined ? {} : { strands }) };
  });
}

/** The spacing at which the weft, as it is taken together, comes nearest to the wished tightness; the narrower of two alike. */
export function bestSpacing(loom: Frame, warp: Thread, weft: Thread): OfferedSpacing | undefined {
  const miss = ({ spacingMm }: OfferedSpacing): number => Math.abs(tightness(warp.compressedMm, weft.compressedMm, spacingMm) - TIGHTNESS.target);
  const [first, ...others] = offeredSpacings(loom, warp, weft);
  return others.reduce((best, next) => (best !== undefined && miss(next) < miss(best) ? next : best), first);
}
