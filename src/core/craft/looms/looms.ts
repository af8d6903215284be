/** Every kind of loom a piece can be woven on. */
import type { LoomKind } from '#core/craft/looms/loom-kind.ts';
import { nailedFrame } from '#core/craft/looms/nailed-frame.ts';
import { notchedFrame } from '#core/craft/looms/notched-frame.ts';
import { twoRowFrame } from '#core/craft/looms/two-row-frame.ts';
import { staggeredPitch } from '#core/craft/nails.ts';
import type { Loom, LoomKindName, NailRows } from '#core/craft/piece.ts';

export const LOOM_KINDS: Readonly<Record<LoomKindName, LoomKind>> = {
  'nailed-frame': nailedFrame,
  'notched-frame': notchedFrame,
  'two-row-frame': twoRowFrame,
};

export const LOOM_KIND_NAMES = ['nailed-frame', 'notched-frame', 'two-row-frame'] as const satisfies readonly LoomKindName[];

export const NAIL_ROW_NAMES = ['both', 'inner'] as const satisfies readonly NailRows[];

/** Of a loom that does not say what it is. */
export const DEFAULT_KIND: LoomKindName = 'nailed-frame';

export function loomKind({ kind }: Pick<Loom, 'kind'>): LoomKind {
  return LOOM_KINDS[kind ?? DEFAULT_KIND];
}

/** From one nail or notch to the next along the rail, those of both rows counted where both are used. */
export function holderStep(loom: Pick<Loom, 'kind' | 'nailPitchMm' | 'nailRows'>): number {
  return loomKind(loom).rows === 2 ? staggeredPitch(loom.nailPitchMm, loom.nailRows ?? 'both') : loom.nailPitchMm;
}
