/** The piece whose workings are written down, with what several of them go on from. */
import type { PieceOnLoom } from '#core/craft/frame-loom/add-up.ts';
import type { Settings } from '#core/craft/frame-loom/settings.ts';
import { given, standing, type Notebook, type Standing } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS } from '#core/craft/show-how/sources.ts';
import type { WorkingInput } from '#core/craft/show-how/working.ts';

export interface OnLoom {
  readonly book: Notebook;
  readonly piece: PieceOnLoom;
}

type Weight = Pick<WorkingInput, 'weighs'>;

const UNITS = {
  drawIn: 'share', relaxation: 'share', wetShrinkage: 'share', topMm: 'mm', bottomMm: 'mm', tailMm: 'mm', loadMm: 'mm', marginWeft: 'share', marginWarp: 'share',
} as const satisfies Record<keyof Settings, 'share' | 'mm'>;

const NAMES: Readonly<Record<keyof Settings, string>> = {
  drawIn: 'draw-in',
  relaxation: 'relaxation',
  wetShrinkage: 'wet shrinkage',
  topMm: 'unwoven warp asked for at the top',
  bottomMm: 'unwoven warp asked for at the bottom',
  tailMm: 'one tail',
  loadMm: 'yarn on one shuttle',
  marginWeft: 'margin of the weft',
  marginWarp: 'margin of the warp',
};

/** An allowance: the person's own, else the default with where it comes from. */
export function setting({ piece }: OnLoom, symbol: string, key: keyof Settings, weight: Weight = {}): WorkingInput {
  const number = { symbol, name: NAMES[key], value: piece.settings[key], unit: UNITS[key] };
  const own = piece.parts.allowances?.[key] !== undefined;
  return own ? given(number, `/allowances/${key}`, 'measured', weight) : standing(number, DEFAULTS[key], weight);
}

type Number = Parameters<typeof given>[0];

/** What stands at `path` where the person gave it, else its default. */
export function givenOr(number: Number, path: string, isGiven: boolean, fallback: Standing, weight: Weight = {}): WorkingInput {
  return isGiven ? given(number, path, 'measured', weight) : standing(number, fallback, weight);
}
