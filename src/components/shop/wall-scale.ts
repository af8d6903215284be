/** One scale for all pieces that hang side by side, so that a large piece is seen to be large. */
import { wovenHeightMm, type ClothPiece } from '#core/craft/cloth/cloth-piece.ts';

/** How much room a piece may take, in pixels as drawn. The page shows drawings a quarter larger on a desk, a fifth smaller on a phone. */
export interface WallRoom {
  readonly widthPx: number;
  readonly heightPx: number;
  /** A single small piece is not blown up beyond this. */
  readonly mostPxPerMm: number;
}

export const WALL_ROOM: WallRoom = { widthPx: 168, heightPx: 330, mostPxPerMm: 0.42 };
/** One piece alone hangs larger. */
export const ALONE_ROOM: WallRoom = { widthPx: 288, heightPx: 420, mostPxPerMm: 0.72 };

/** Air at each side of a hanging piece: a share of the picture, and never less than some pixels (as it is drawn). */
const AIR = 0.03;
const LEAST_AIR_PX = 6;
const DOWEL = 0.13;

/** Height of a piece with what hangs below its first row. */
function hangingMm(piece: ClothPiece): number {
  if (piece.kind === 'hung') return piece.heightMm + piece.rod.diameterMm;
  const longest = Math.max(0, ...piece.bands.map((band) => (band.technique === 'rya' ? band.pileMm : 0)));
  return wovenHeightMm(piece) + longest + DOWEL * piece.widthMm;
}

/** Pixels in a millimetre at which every piece fits the room; that of a piece of 40 cm when there is none. */
export function wallScale(pieces: readonly ClothPiece[], room: WallRoom): number {
  const widest = Math.max(...pieces.map(({ widthMm }) => widthMm), 0) || 400;
  const highest = Math.max(...pieces.map(hangingMm), 0) || 600;
  return Math.min((room.widthPx * (1 - 2 * AIR)) / widest, room.heightPx / highest, room.mostPxPerMm);
}

/** Width of the picture in which the cloth itself comes out at this scale. */
export function pictureWidth({ widthMm }: ClothPiece, scale: number): number {
  const cloth = widthMm * scale;
  return Math.max(cloth / (1 - 2 * AIR), cloth + 2 * LEAST_AIR_PX);
}
