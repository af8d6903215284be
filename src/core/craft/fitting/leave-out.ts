/** A lower piece: the band that fills shrinks first, then whole bands are left out. The hem-stitch stays. */
import { bandKey } from '#core/craft/fitting/way.ts';
import { ownHeights } from '#core/craft/frame-loom/own-heights.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';

/** A filling band lower than a finger is wide is no sky any more: rather one band less. */
const LEAST_FILL_MM = 10;

/** Whether the band takes what the others leave. */
export const fills = (band: Band): boolean => 'fill' in band;

/** As high as its bands come to, where none of them fills. */
export function withOwnHeight(piece: FrameLoomPiece): FrameLoomPiece {
  if (piece.bands.some(fills)) return piece;
  const heights = ownHeights(piece);
  if (heights === undefined) return piece;
  const heightMm = heights.reduce<number>((sum, height) => sum + (height === 'fill' ? 0 : height), 0);
  return { ...piece, size: { ...piece.size, heightMm } };
}

/** `piece` without the bands of these keys, at this height if a band fills what is left. Keys it does not know do nothing. */
export function leaveOut(piece: FrameLoomPiece, keys: readonly string[], heightMm: number | undefined): FrameLoomPiece {
  const bands = piece.bands.filter((band, index) => !keys.includes(bandKey(band, index)));
  const lower = { ...piece, bands, size: { ...piece.size, heightMm: heightMm ?? piece.size.heightMm } };
  return withOwnHeight(lower);
}

export interface Lower {
  readonly leaveOut: readonly string[];
  /** Missing where no band fills: the piece is then as high as its bands. */
  readonly heightMm?: number;
}

/** Bands that may go, in the order in which they do. */
function mayGo(piece: FrameLoomPiece, from: 'first' | 'last'): readonly number[] {
  const indices = piece.bands.flatMap((band, index) => (band.technique === 'hem-stitch' || fills(band) ? [] : [index]));
  return from === 'first' ? indices : indices.toReversed();
}

/**
 * What `piece` must leave to be at most `roomMm` high. `order` is the end from which bands go, or the keys of those
 * that do whatever the room is; undefined where too little would be left.
 */
export function lowerTo(piece: FrameLoomPiece, roomMm: number, order: 'first' | 'last' | readonly string[], stepMm: number): Lower | undefined {
  const heights = ownHeights(piece);
  if (heights === undefined) return undefined;
  const filling = piece.bands.findIndex(fills);
  const out = new Set<number>();
  const fixedMm = (): number => heights.reduce<number>((sum, height, index) => sum + (height === 'fill' || out.has(index) ? 0 : height), 0);
  const fillMm = filling < 0 ? 0 : Math.max(0, piece.size.heightMm - fixedMm());
  const chosen = typeof order === 'string' ? [] : piece.bands.flatMap((band, index) => (order.includes(bandKey(band, index)) ? [index] : []));
  chosen.forEach((index) => out.add(index));
  const going = typeof order === 'string' ? [...mayGo(piece, order)] : [];
  const keptFillMm = (): number => (filling < 0 || out.has(filling) ? 0 : fillMm);
  while (fixedMm() + Math.min(LEAST_FILL_MM, keptFillMm()) > roomMm + 1e-9) {
    const next = going.shift();
    if (next === undefined) return undefined;
    out.add(next);
  }
  const isCloth = heights.some((height, index) => !out.has(index) && (height === 'fill' || height > 0));
  if (!isCloth) return undefined;
  const leaveOutKeys = piece.bands.flatMap((band, index) => (out.has(index) ? [bandKey(band, index)] : []));
  if (keptFillMm() === 0) return { leaveOut: leaveOutKeys };
  const wholeMm = fixedMm() + keptFillMm();
  const least = fixedMm() + Math.min(LEAST_FILL_MM, keptFillMm());
  const heightMm = wholeMm <= roomMm ? wholeMm : Math.max(least, Math.floor(roomMm / stepMm + 1e-9) * stepMm);
  return { leaveOut: leaveOutKeys, heightMm };
}
