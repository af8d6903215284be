/** From nails along a rail to warp ends and back. */
import { RAIL_MARGIN_MM, SPACING_ROWS } from '#core/craft/defaults.ts';
import type { EndsTogether, Warping } from '#core/craft/piece.ts';

export interface NailLayout {
  /** From one used nail to the next. */
  readonly pitchMm: number;
  readonly warping: Warping;
}

/** Nails in use when only every k-th is: the pitch grows. */
export function usedPitch(nailPitchMm: number, everyNthNail: number): number {
  return nailPitchMm * everyNthNail;
}

/**
 * Ends in a millimetre. Zigzag goes round every nail, so two ends leave each; the
 * two-nail step runs along two neighbouring nails, so one end leaves each.
 */
export function endsPerMm({ pitchMm, warping }: NailLayout): number {
  return (warping === 'zigzag' ? 2 : 1) / pitchMm;
}

/** Between working ends, which are one or two ends together. */
export function workingSpacing(layout: NailLayout, endsTogether: EndsTogether): number {
  return endsTogether / endsPerMm(layout);
}

/** Inner and outer rows of nails, each at pitch q and set half of it aside, work as one row at q/2. */
export function staggeredPitch(rowPitchMm: number, rows: 'both' | 'inner'): number {
  return rows === 'both' ? rowPitchMm / 2 : rowPitchMm;
}

export interface Nails {
  readonly top: number;
  readonly bottom: number;
}

/**
 * Nails the warp goes round, begun at the top. Zigzag uses one nail more than there are
 * ends: alike on both rails when ends are odd, one more at the top when even, and then
 * both knots are on the same rail. The two-nail step uses one nail an end on each rail.
 */
export function nailsUsed(ends: number, warping: Warping): Nails {
  if (warping === 'two-nail') return { top: ends, bottom: ends };
  return { top: Math.floor((ends + 2) / 2), bottom: Math.floor((ends + 1) / 2) };
}

/** The most ends this many nails on the top rail can carry. */
export function endsOnNails(topNails: number, warping: Warping): number {
  return warping === 'two-nail' ? topNails : 2 * topNails - 1;
}

/** Clear rail the nails need, with room beyond the first and the last. */
export function railNeeded(topNails: number, pitchMm: number): number {
  return (topNails - 1) * pitchMm + 2 * RAIL_MARGIN_MM;
}

/** Nails that find room on a rail of this length; 0 when not even one does. */
export function nailsOnRail(railMm: number, pitchMm: number): number {
  return Math.max(0, Math.floor((railMm - 2 * RAIL_MARGIN_MM) / pitchMm + 1e-9) + 1);
}

/**
 * Zigzag ends meet in pairs at the nails. At a share `u` of the height from one rail the
 * gaps alternate between these two, whether the rails stand nail over nail or half a pitch
 * aside; they are even at half height only, hence the spacing rows at both ends.
 */
export function zigzagGaps(u: number, pitchMm: number): { readonly first: number; readonly second: number } {
  return { first: u * pitchMm, second: (1 - u) * pitchMm };
}

/**
 * How much a gap between ends differs from their mean at a share `u` of the height, as a
 * share of that mean: 1 at a rail, 0 at half height. Ends of the two-nail step lie parallel.
 */
export function unevenness(u: number, warping: Warping): number {
  return warping === 'two-nail' ? 0 : Math.abs(2 * u - 1);
}

/** Share of the height, round its middle, in which bare ends are even within `tolerance`, 0 to 1. */
export function evenShare(tolerance: number, warping: Warping): number {
  return warping === 'two-nail' ? 1 : tolerance;
}

/** Rows of twining or scrap yarn at each edge that set the ends even before weaving begins; none where they stand even. */
export function spacingRows(warping: Warping): { readonly fewest: number; readonly most: number } {
  return warping === 'two-nail' ? { fewest: 0, most: 0 } : SPACING_ROWS;
}
