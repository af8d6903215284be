/** Where the woven part of a drawn piece lies in its picture, for rulers and marks beside it. */
import { wovenHeightMm, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';

export interface ClothBox {
  /** Pixels of the picture; `top` is the upper edge of the cloth when all of it is woven. */
  readonly left: number;
  readonly top: number;
  readonly height: number;
  readonly pxPerMm: number;
  /** Which edge of the screen holds the first row. */
  readonly begin: 'head' | 'foot';
}

/** Of a piece that hangs from its dowel, in a picture so many pixels wide. */
export function hangingBox(piece: WovenPiece, width: number): ClothBox {
  const left = Math.max(6, width * 0.03);
  const pxPerMm = (width - 2 * left) / piece.widthMm;
  return { left, top: Math.max(16, width * 0.13) + 3, height: wovenHeightMm(piece) * pxPerMm, pxPerMm, begin: piece.turned ? 'head' : 'foot' };
}

/** Of a piece in its frame. */
export function loomBox(piece: WovenPiece, width: number): ClothBox {
  const rail = width * 0.05;
  const { loom } = piece;
  const pxPerMm = loom === undefined ? (width * 0.83) / piece.widthMm : (width - 2 * rail) / loom.insideWidthMm;
  const height = wovenHeightMm(piece) * pxPerMm;
  const below = (loom?.bottomMm ?? 30) * pxPerMm;
  const span = loom === undefined ? height * 1.32 + below : Math.max(loom.insideHeightMm * pxPerMm, height + below * 1.5);
  return { left: (width - piece.widthMm * pxPerMm) / 2, top: rail * 0.7 + span - below - height, height, pxPerMm, begin: 'foot' };
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
