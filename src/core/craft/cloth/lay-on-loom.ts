/** Where a piece stands in its frame on the screen, in pixels: frame, nails, cloth. */
import { wovenHeightMm, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';

export interface LoomPlaces {
  /** How thick the frame's bars are. */
  readonly rail: number;
  /** From the left edge to the first end. */
  readonly inset: number;
  readonly pxPerMm: number;
  readonly nailsTop: number;
  readonly nailsBottom: number;
  /** Bare warp between the lower nails and the first row. */
  readonly below: number;
  readonly clothHeight: number;
  /** Lower edge of the frame. */
  readonly frame: number;
}

export function layOnLoom(piece: WovenPiece, width: number): LoomPlaces {
  const rail = width * 0.05;
  const { loom } = piece;
  const pxPerMm = loom === undefined ? (width * 0.83) / piece.widthMm : (width - 2 * rail) / loom.insideWidthMm;
  const clothHeight = wovenHeightMm(piece) * pxPerMm;
  const below = (loom?.bottomMm ?? 30) * pxPerMm;
  const nailsTop = rail * 0.7;
  const span = loom === undefined ? clothHeight * 1.32 + below : Math.max(loom.insideHeightMm * pxPerMm, clothHeight + below * 1.5);
  const nailsBottom = nailsTop + span;
  return { rail, inset: (width - piece.widthMm * pxPerMm) / 2, pxPerMm, nailsTop, nailsBottom, below, clothHeight, frame: nailsBottom + rail * 0.7 };
}
