/** The allowances of a piece with every default filled in. */
import { DEFAULT_ALLOWANCES } from '#core/craft/defaults.ts';
import type { Allowances } from '#core/craft/piece.ts';
import type { WeaveMode } from '#core/craft/weave.ts';
import type { RowBeat } from '#core/craft/picks.ts';

export type Settings = { readonly [K in keyof Allowances]-?: NonNullable<Allowances[K]> };

/** Draw-in goes by the kind of cloth, the margin of the weft by whether a swatch was counted. */
export function settingsOf(allowances: Allowances, mode: WeaveMode, beat: RowBeat | undefined): Settings {
  const { drawIn, marginWeft, ...fixed } = DEFAULT_ALLOWANCES;
  const counted = beat !== undefined && beat !== 'as-ends' && beat.picksPerCm !== undefined;
  return { ...fixed, drawIn: drawIn[mode], marginWeft: counted ? marginWeft.swatch : marginWeft.unmeasured, ...allowances };
}
