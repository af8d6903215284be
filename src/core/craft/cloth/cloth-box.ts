/** Where the woven part of a drawn piece lies in its picture, for rulers and marks beside it. */
import { wovenHeightMm, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { layOnLoom } from '#core/craft/cloth/lay-on-loom.ts';

export interface ClothBox {
  /** Pixels of the picture; `top` is the upper edge of the cloth when all of it is woven. */
  readonly left: number;
  readonly top: number;
  readonly height: number;
  readonly pxPerMm: number;
  /** Which edge of the screen holds the first row. */
  readonly begin: 'head' | 'foot';
  /** Which edge moves as the cloth grows. */
  readonly free: 'head' | 'foot';
}

/** Bare warp between the dowel's loops and the last row. */
const WARP_ABOVE_PX = 3;

/** Of a piece that hangs from its dowel, in a picture so many pixels wide. `dowelTop` is where the warp begins. */
export function hangingBox(piece: WovenPiece, width: number): ClothBox & { readonly dowelTop: number } {
  const left = Math.max(6, width * 0.03);
  const dowelTop = Math.max(16, width * 0.13);
  const pxPerMm = (width - 2 * left) / piece.widthMm;
  return { left, dowelTop, top: dowelTop + WARP_ABOVE_PX, height: wovenHeightMm(piece) * pxPerMm, pxPerMm, begin: piece.turned ? 'head' : 'foot', free: 'foot' };
}

/** Of a piece in its frame. */
export function loomBox(piece: WovenPiece, width: number): ClothBox {
  const { inset, pxPerMm, nailsBottom, below, clothHeight } = layOnLoom(piece, width);
  return { left: inset, top: nailsBottom - below - clothHeight, height: clothHeight, pxPerMm, begin: 'foot', free: 'head' };
}

export interface BandPlace {
  /** From the upper edge of the cloth. */
  readonly top: number;
  readonly height: number;
}

/** Where band `index` of the piece lies in the cloth; undefined if there is none. */
export function placeOfBand(piece: WovenPiece, index: number, { height, pxPerMm, begin }: ClothBox): BandPlace | undefined {
  const band = piece.bands[index];
  if (band === undefined) return undefined;
  const from = piece.bands.slice(0, index).reduce((sum, { heightMm }) => sum + heightMm, 0) * pxPerMm;
  const high = band.heightMm * pxPerMm;
  return { top: begin === 'head' ? from : height - from - high, height: high };
}
