/** Looms to try a pattern piece on. */
import type { MyPiece } from '#core/craft/fit.ts';

/** A student's own loom, width and yarns. */
export interface StudentLoom {
  /** Public id of her seat. */
  readonly id: string;
  readonly name: string;
  readonly mine: MyPiece;
}
