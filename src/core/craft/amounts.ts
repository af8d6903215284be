/** Amounts a text or a gathering list can ask of a plan by name, each with the way it was got. */
import type { Amount } from '#core/craft/amounts/amount-types.ts';
import { BAND_AMOUNTS, plannedBand } from '#core/craft/amounts/band-amounts.ts';
import { FIXED_AMOUNTS, type PlannedPiece, type Reckoned } from '#core/craft/amounts/fixed-amounts.ts';
import { plannedYarn, rowsPerLoad, YARN_AMOUNTS, yarnLength } from '#core/craft/amounts/yarn-amounts.ts';
import type { Piece } from '#core/craft/piece.ts';
import type { Plan } from '#core/craft/plan-types.ts';
import { fail, succeed, type Outcome } from '#core/outcome.ts';

export type * from '#core/craft/amounts/amount-types.ts';

/** Every key, with `<role>` and `<name>` standing for a yarn role and a band's name. */
export const AMOUNT_KEYS = [
  'ends',
  'nails',
  'spacing',
  'width',
  'height',
  'wound-width',
  'loom.width',
  'loom.height',
  'warp',
  'warp.mass',
  'warp.balls',
  'yarn.<role>',
  'yarn.<role>.mass',
  'yarn.<role>.balls',
  'band.<name>.height',
  'band.<name>.rows',
  'band.<name>.knots',
  'band.<name>.stitches',
  'band.<name>.strands',
  'band.<name>.cut',
  'band.<name>.yarn',
  'spacer.width',
  'spacer.height',
  'dowel.length',
  'dowel.diameter',
  'cord',
  'hours',
  'mass',
  'pick',
  'rows-per-load',
] as const;

const hasKey = <T extends object>(table: T, key: PropertyKey): key is keyof T => Object.hasOwn(table, key);

function yarnAmount(of: PlannedPiece, role: string, what?: string): Reckoned | string {
  const planned = plannedYarn(of, role);
  if (planned === undefined) return `This piece has no yarn in the role “${role}”.`;
  if (what === undefined) return yarnLength(planned);
  if (!hasKey(YARN_AMOUNTS, what)) return `A yarn has no “${what}”. It has mass and balls.`;
  return YARN_AMOUNTS[what](planned) ?? `How long a ball of “${role}” is has not been said.`;
}

function bandAmount(of: PlannedPiece, name: string, what: string): Reckoned | string {
  const planned = plannedBand(of, name);
  if (planned === undefined) return `This piece has no band called “${name}”.`;
  if (!hasKey(BAND_AMOUNTS, what)) return `A band has no “${what}”. It has ${Object.keys(BAND_AMOUNTS).join(', ')}.`;
  return BAND_AMOUNTS[what](planned) ?? `A band of ${planned.band.technique} has no ${what}.`;
}

function reckon(key: string, of: PlannedPiece): Reckoned | string {
  if (hasKey(FIXED_AMOUNTS, key)) return FIXED_AMOUNTS[key](of) ?? `This piece does not tell “${key}”.`;
  if (key === 'rows-per-load') return rowsPerLoad(of) ?? 'This piece has no rows of tabby.';
  const [subject, name, what, ...more] = key.split('.');
  if (name !== undefined && more.length === 0) {
    if (subject === 'yarn') return yarnAmount(of, name, what);
    if (subject === 'band' && what !== undefined) return bandAmount(of, name, what);
  }
  return `No amount is called “${key}”.`;
}

/**
 * The amount a key names for this piece and its plan. Lengths and masses of yarn are
 * those to have in hand, with margin. A key this piece does not tell is `E_ENUM`, with
 * the reason.
 */
export function amountOf(key: string, piece: Piece, plan: Plan): Outcome<Amount> {
  const reckoned = reckon(key, { piece, plan });
  if (typeof reckoned === 'string') return fail([{ code: 'E_ENUM', path: '', message: reckoned }]);
  return succeed({ key, label: reckoned.label, ...reckoned.quantity, howReckoned: reckoned.how });
}

/** Every key this piece tells, written out with its roles and band names. */
export function amountKeysOf(piece: Piece, plan: Plan): readonly string[] {
  const names = piece.bands.flatMap(({ name }) => (name === undefined ? [] : [name]));
  return AMOUNT_KEYS.flatMap((key) => {
    if (key.includes('<role>')) return Object.keys(piece.yarns).map((role) => key.replace('<role>', role));
    return key.includes('<name>') ? names.map((name) => key.replace('<name>', name)) : [key];
  }).filter((key) => amountOf(key, piece, plan).ok);
}
