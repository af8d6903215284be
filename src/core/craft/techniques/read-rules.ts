/** Rules that the bands of several techniques share. */
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';

/** No piece is longer: twenty metres. */
export const LONGEST_MM = 20_000;

export const ROWS: NumberRule = { name: 'Rows', min: 1, max: 10_000, whole: true };
export const BAND_HEIGHT: NumberRule = { name: 'Height of the band', min: 'over-zero', max: LONGEST_MM, unit: 'mm' };

const BAND_NAME = /^[a-z0-9-]{1,40}$/;

/** The name lessons call the band by, if it has one. */
export function readName(fields: Fields): { readonly name?: string } {
  const name = fields.optionalText('name', { name: 'Name of the band', maxLength: 40 });
  if (name === undefined) return {};
  if (!BAND_NAME.test(name)) fields.reject('E_ENUM', 'name', 'A band’s name is made of small letters, figures and hyphens, such as sky or dune-2.');
  return { name };
}

/** A yarn role as a band names it. */
export function readRole(fields: Fields, key = 'yarn'): string {
  return fields.text(key, { name: 'Yarn role', maxLength: 40 });
}
