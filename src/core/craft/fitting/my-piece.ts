/** What a student says of her own making; what is missing stays as in the pattern. */
import type { EndsTogether, LoomKindName, NailRows, Warping, Yarn } from '#core/craft/piece.ts';
import { readWay, type FitWay } from '#core/craft/fitting/way.ts';
import { LOOM_KIND_NAMES, NAIL_ROW_NAMES } from '#core/craft/looms/looms.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import type { Findings } from '#core/craft/reading/findings.ts';

/** A cord told by its thickness. */
export interface OwnCord {
  readonly diameterMm: number;
  readonly label?: string;
}

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
  /** Her own yarn for the warp. */
  readonly warpYarn?: Yarn;
  /** Her own yarn in a role of the pattern. */
  readonly yarns?: Readonly<Record<string, Yarn>>;
  /** Her own cord in a role of a knotted pattern. */
  readonly cords?: Readonly<Record<string, OwnCord>>;
  /** Her own rod's thickness, or her own ring's width. */
  readonly rod?: { readonly diameterMm: number };
  /** How the pattern is fitted to her loom. */
  readonly way?: FitWay;
}

/**
 * Refuses what is not made like a student's piece at all. Its measures go on as they are:
 * reckoning the piece tells what is wrong with them.
 */
export function checkMine(mine: unknown, findings: Findings): void {
  const fields = Fields.of(mine, '', 'What a student says of her piece', findings);
  const loom = fields.optionalGroup('loom', 'Loom');
  loom?.optionalChoice('kind', 'Kind of loom', LOOM_KIND_NAMES);
  loom?.optionalChoice('nailRows', 'Rows of nails', NAIL_ROW_NAMES);
  fields.take('widthMm');
  fields.take('endsTogether');
  fields.optionalGroup('warpYarn', 'Warp yarn');
  const yarns = fields.optionalGroup('yarns', 'The group of yarns');
  for (const [role] of yarns?.entries() ?? []) yarns?.group(role, 'Yarn');
  const cords = fields.optionalGroup('cords', 'The group of cords');
  for (const [role] of cords?.entries() ?? []) cords?.group(role, 'Cord');
  fields.optionalGroup('rod', 'What it hangs from');
  const way = fields.take('way');
  if (way !== undefined) readWay(way, fields);
  fields.end();
}
