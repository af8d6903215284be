/** The largest piece a loom holds. */
import { END_RANGE, endsSuit } from '#core/craft/ends.ts';
import type { Settings } from '#core/craft/frame-loom/settings.ts';
import { holderStep, loomKind } from '#core/craft/looms/looms.ts';
import { bottomAllowance, heightAfterShrinking, topAllowance } from '#core/craft/loom-height.ts';
import { endsOnNails, endsPerMm, nailsOnRail, usedPitch, type NailLayout } from '#core/craft/nails.ts';
import type { Dowel, Loom, Warp } from '#core/craft/piece.ts';

export function layoutOf(loom: Pick<Loom, 'kind' | 'nailPitchMm' | 'nailRows' | 'everyNthNail' | 'warping'>): NailLayout {
  return { pitchMm: usedPitch(holderStep(loom), loom.everyNthNail ?? 1), warping: loom.warping };
}

/** Finished width of so many ends. */
export function widthOfEnds(ends: number, loom: Loom, settings: Settings): number {
  return (ends / endsPerMm(layoutOf(loom))) * (1 - settings.drawIn);
}

/** Finished width that fits between the sides at this spacing; undefined if the loom does not say how wide it is, 0 if nothing fits. */
export function largestWidth(loom: Loom, warp: Pick<Warp, 'endsTogether' | 'parity'>, settings: Settings): number | undefined {
  if (loom.insideWidthMm === undefined) return undefined;
  const layout = layoutOf(loom);
  let ends = Math.min(END_RANGE.max, endsOnNails(nailsOnRail(loom.insideWidthMm, layout.pitchMm), layout.warping));
  while (ends >= END_RANGE.min && !endsSuit(ends, warp.endsTogether ?? 1, warp.parity ?? 'any')) ends -= 1;
  return ends < END_RANGE.min ? 0 : widthOfEnds(ends, loom, settings);
}

/** Finished height that fits between the rails beside the bare warp; 0 if nothing fits. */
export function largestHeight(loom: Loom, dowel: Dowel | undefined, settings: Settings): number {
  const bareMm = topAllowance(settings.topMm, dowel?.diameterMm, loomKind(loom).leastBareMm.top) + bottomAllowance(settings.bottomMm, loomKind(loom).leastBareMm.bottom);
  return Math.max(0, heightAfterShrinking(loom.insideHeightMm - bareMm, settings.relaxation, settings.wetShrinkage));
}
