/** A pattern piece recomputed for a student's own loom, width and yarns. */
import { fail, type Outcome } from '#core/outcome.ts';
import type { EndsTogether, Piece, Warping, Yarn } from '#core/craft/piece.ts';
import type { Plan } from '#core/craft/plan.ts';

/** What a student says of her own making; what is missing stays as in the pattern. */
export interface MyPiece {
  readonly loom?: {
    readonly insideWidthMm?: number;
    readonly insideHeightMm?: number;
    readonly nailPitchMm?: number;
    readonly warping?: Warping;
  };
  readonly widthMm?: number;
  readonly endsTogether?: EndsTogether;
  /** Her own yarn in a role of the pattern. */
  readonly yarns?: Readonly<Record<string, Yarn>>;
}

export interface FittedPiece {
  readonly piece: Piece;
  readonly plan: Plan;
  /** What differs from the pattern, in words. */
  readonly changes: readonly string[];
}

export function fitPiece(_pattern: Piece, _mine: MyPiece): Outcome<FittedPiece> {
  return fail([{ code: 'E_ENUM', path: '/craft', message: 'No craft can be reckoned yet.' }]);
}
