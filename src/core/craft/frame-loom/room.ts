/** The largest piece a loom holds. */
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { END_RANGE, endsSuit } from '#core/craft/ends.ts';
import { settingsOf, type Settings } from '#core/craft/frame-loom/settings.ts';
import { endsForFinish } from '#core/craft/hanging.ts';
import { holderStep, loomKind } from '#core/craft/looms/looms.ts';
import { bottomAllowance, heightAfterShrinking, topAllowance } from '#core/craft/loom-height.ts';
import { endsOnNails, endsPerMm, nailsOnRail, usedPitch, type NailLayout } from '#core/craft/nails.ts';
import type { Finish, Loom, FrameLoomPiece, Warp } from '#core/craft/piece.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';

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

/** How a piece ends above and below its cloth. */
export type Edges = Pick<FrameLoomPiece, 'dowel' | 'finish'>;

/** Warp that stays bare at both edges. A warp that could not be read leaves its knots out. */
export function bareWarp(loom: Loom, warp: Pick<Warp, 'yarn'> | undefined, { dowel, finish }: Edges, settings: Settings): { readonly topMm: number; readonly bottomMm: number } {
  const least = loomKind(loom).leastBareMm;
  return {
    topMm: topAllowance(settings.topMm, dowel, least.top),
    bottomMm: bottomAllowance(settings.bottomMm, finishRoom(warp, finish), least.bottom),
  };
}

/** Warp the finish takes below the cloth. */
export function finishRoom(warp: Pick<Warp, 'yarn'> | undefined, finish: Finish | undefined): number {
  return warp === undefined || finish === undefined ? 0 : endsForFinish(finish, threadOf(warp.yarn, ASHENHURST_K.warp).loftMm);
}

/** Finished height that fits between the rails beside the bare warp; 0 if nothing fits. */
export function largestHeight(loom: Loom, warp: Pick<Warp, 'yarn'> | undefined, edges: Edges, settings: Settings): number {
  const { topMm, bottomMm } = bareWarp(loom, warp, edges, settings);
  return Math.max(0, heightAfterShrinking(loom.insideHeightMm - topMm - bottomMm, settings.relaxation, settings.wetShrinkage));
}

/** The largest finished size the piece's loom holds at its spacing; the width only if the loom tells its own. */
export function roomOnLoom(piece: FrameLoomPiece): { readonly widthMm?: number; readonly heightMm: number } {
  const settings = settingsOf(piece.allowances ?? {}, piece.mode ?? 'straight-warp', piece.beat);
  const widthMm = largestWidth(piece.loom, piece.warp, settings);
  const heightMm = largestHeight(piece.loom, piece.warp, piece, settings);
  return widthMm === undefined ? { heightMm } : { widthMm, heightMm };
}
