/** What a frame-loom piece tells by the keys of amounts. */
import type { Reckoned } from '#core/craft/amounts/amount-types.ts';
import { BAND_AMOUNTS, plannedBand } from '#core/craft/amounts/band-amounts.ts';
import { FIXED_AMOUNTS, type PlannedPiece } from '#core/craft/amounts/fixed-amounts.ts';
import { plannedYarn, rowsPerLoad, YARN_AMOUNTS, yarnLength } from '#core/craft/amounts/yarn-amounts.ts';
import type { KeyGroup } from '#core/craft/craft.ts';

/** In the order in which a loom is set up. */
export const AMOUNTS: readonly KeyGroup[] = [
  { title: 'Size and loom', keys: ['nails', 'width', 'height', 'wound-width', 'loom.width', 'loom.height'] },
  { title: 'Warp', keys: ['ends', 'spacing', 'warp', 'warp.mass', 'warp.balls'] },
  { title: 'Yarns', keys: ['yarn.<role>', 'yarn.<role>.mass', 'yarn.<role>.balls'] },
  {
    title: 'Bands',
    keys: [
      'band.<name>.height', 'band.<name>.rows', 'band.<name>.knots', 'band.<name>.stitches', 'band.<name>.strands', 'band.<name>.cut', 'band.<name>.yarn',
    ],
  },
  { title: 'Tools and time', keys: ['spacer.width', 'spacer.height', 'dowel.length', 'dowel.diameter', 'cord', 'hours', 'mass', 'pick', 'rows-per-load'] },
];

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

/** The amount of a key, or a sentence why this piece has none. */
export function amountIn(key: string, of: PlannedPiece): Reckoned | string {
  if (hasKey(FIXED_AMOUNTS, key)) return FIXED_AMOUNTS[key](of) ?? `This piece does not tell “${key}”.`;
  if (key === 'rows-per-load') return rowsPerLoad(of) ?? 'This piece has no rows of tabby.';
  const [subject, name, what, ...more] = key.split('.');
  if (name !== undefined && more.length === 0) {
    if (subject === 'yarn') return yarnAmount(of, name, what);
    if (subject === 'band' && what !== undefined) return bandAmount(of, name, what);
  }
  return `No amount is called “${key}”.`;
}
