/** What a student says of her own making; what is missing stays as in the pattern. */
import type { EndsTogether, LoomKindName, NailRows, Warping, Yarn } from '#core/craft/piece.ts';

export interface MyPiece {
  readonly loom?: {
    readonly kind?: LoomKindName;
    readonly nailRows?: NailRows;
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
