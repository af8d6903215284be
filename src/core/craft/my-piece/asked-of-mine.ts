/** What a student is asked about her own making. What she leaves empty stays as in the pattern. */
import { option, type Asked } from '#core/craft/piece-form/asked.ts';
import { LOOM_KIND as KIND_OF_PIECE, NAIL_ROWS as ROWS_OF_PIECE } from '#core/craft/piece-form/asked-of-piece.ts';
import { BALL, BY, COLOUR, LABEL, STRANDS, WRAPS } from '#core/craft/piece-form/asked-of-yarn.ts';
import type { Units } from '#core/units/units.ts';

/** What is plausible for a frame with nails, in mm for each family of units, with round numbers in both. */
export interface Plausible {
  readonly least: Readonly<Record<Units, number>>;
  readonly most: Readonly<Record<Units, number>>;
  readonly below: string;
  readonly above: string;
}

export type AskedLength = Asked & { readonly kind: 'length' | 'fine' } & { readonly plausible: Plausible };

export const INSIDE_WIDTH: AskedLength = {
  key: 'insideWidthMm', kind: 'length', label: 'Inside width', hint: 'From one upright to the other.',
  plausible: { least: { cm: 50, in: 50.8 }, most: { cm: 3_000, in: 3_048 }, below: 'Too narrow for a frame.', above: 'Too wide for a frame.' },
};
export const INSIDE_HEIGHT: AskedLength = {
  key: 'insideHeightMm', kind: 'length', label: 'Inside height', hint: 'From the lower nails to the upper ones.',
  plausible: { least: { cm: 100, in: 101.6 }, most: { cm: 3_000, in: 3_048 }, below: 'Too low for a frame.', above: 'Too high for a frame.' },
};
export const NAIL_PITCH: AskedLength = {
  key: 'nailPitchMm', kind: 'fine', label: 'Nail spacing', hint: 'Measure over ten gaps and divide by ten.',
  plausible: { least: { cm: 2, in: 25.4 / 16 }, most: { cm: 25, in: 25.4 }, below: 'Too close for nails.', above: 'Too far apart to weave on.' },
};
export const WIDTH: AskedLength = {
  key: 'widthMm', kind: 'length', label: 'Width of your piece', hint: 'Narrower or wider than the pattern, as you like it.',
  plausible: { least: { cm: 40, in: 38.1 }, most: { cm: 3_000, in: 3_048 }, below: 'Too narrow to weave.', above: 'Too wide to weave.' },
};
export const LENGTHS: readonly AskedLength[] = [INSIDE_WIDTH, INSIDE_HEIGHT, NAIL_PITCH, WIDTH];

/** The same kinds as a teacher's form has. */
export const LOOM_KIND: Asked = { ...KIND_OF_PIECE, key: 'kind', label: 'Your loom has' };
export const NAIL_ROWS: Asked = { ...ROWS_OF_PIECE, key: 'nailRows' };

export const WARPING: Asked = {
  key: 'warping', kind: 'choice', label: 'How you wind',
  options: [option('zigzag', 'Zigzag round every nail'), option('two-nail', 'Along two nails at a time')],
};
export const ENDS: Asked = {
  key: 'endsTogether', kind: 'choice', label: 'Ends',
  options: [{ text: '1', value: 1, label: 'Single' }, { text: '2', value: 2, label: 'Doubled' }],
};

export const CHOICES: readonly Asked[] = [LOOM_KIND, NAIL_ROWS, WARPING, ENDS];

/** How the pattern is fitted to a loom that is not like its own. */
export const WAY_KEY = 'way';
/** Fields of bands she would rather leave out: `leaveOut.<key of the band>`. */
export const LEAVE_OUT = 'leaveOut.';

/** Her yarn is said in any way a label may say it, or by wraps where there is none. */
export const AS_PATTERN = 'pattern';
export const YARN_BY = [{ text: AS_PATTERN, label: 'As in the pattern' }, ...(BY.kind === 'choice' ? BY.options : [])] as const;

/** Fields of her own warp yarn: `warp.yarn.<key>`; those of the others are `yarns.<role>.<key>`. */
export const WARP_YARN = 'warp.yarn.';

/** Besides the way and its number. */
export const YARN_TEXTS: readonly Asked[] = [WRAPS, STRANDS, COLOUR, LABEL, ...BALL];
export const YARN_KEYS: readonly string[] = ['by', 'grist', ...YARN_TEXTS.map(({ key }) => key)];
