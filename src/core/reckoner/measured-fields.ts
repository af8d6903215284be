/** Fields that hold a length, a weight or a closeness of rows: their units, and how they are turned into other ones. */
import { MM_PER_INCH, inchesText, toInches } from '#core/units/inches.ts';
import { parseLength } from '#core/units/parse-length.ts';
import { GRAMS_PER_OUNCE, parseMass } from '#core/units/parse-mass.ts';
import type { Units } from '#core/units/units.ts';

const LARGE = { cm: 'cm', in: 'in' } as const;
const FINE = { cm: 'mm', in: 'in' } as const;
const YARN = { cm: 'm', in: 'yd' } as const;
const WEIGHT = { cm: 'g', in: 'oz' } as const;

const LENGTHS = {
  width: LARGE,
  height: LARGE,
  'frame-height': LARGE,
  'frame-width': LARGE,
  pile: LARGE,
  base: LARGE,
  'shape-height': LARGE,
  radius: LARGE,
  'rod-length': LARGE,
  rise: LARGE,
  nails: FINE,
  dowel: FINE,
  trim: FINE,
  card: FINE,
  'ball-length': YARN,
} as const;

const WEIGHTS = { 'ball-weight': WEIGHT, 'rod-load': WEIGHT } as const;

export type LengthField = keyof typeof LENGTHS;
export type WeightField = keyof typeof WEIGHTS;
export type MeasuredField = LengthField | WeightField | 'swatch';

export const isLength = (field: string): field is LengthField => Object.hasOwn(LENGTHS, field);
export const isWeight = (field: string): field is WeightField => Object.hasOwn(WEIGHTS, field);

export const lengthUnit = (field: LengthField, units: Units) => LENGTHS[field][units];
export const weightUnit = (field: WeightField, units: Units) => WEIGHTS[field][units];

/** The unit that stands in the field's box, if it holds anything measured. */
export function unitOf(field: string, units: Units): string | undefined {
  if (isLength(field)) return lengthUnit(field, units);
  if (isWeight(field)) return weightUnit(field, units);
  return field === 'swatch' ? (units === 'in' ? 'to the inch' : 'to the cm') : undefined;
}

const rounded = (value: number, decimals: number): string => String(Math.round(value * 10 ** decimals) / 10 ** decimals);

/** A length as it would be typed: inches with a fraction, else a number with at most one decimal. */
function typedLength(mm: number, unit: ReturnType<typeof lengthUnit>): string {
  switch (unit) {
    case 'in': return inchesText(toInches(mm / MM_PER_INCH, 16, 'nearest'));
    case 'mm': return rounded(mm, 1);
    case 'cm': return rounded(mm / 10, 1);
    case 'm': return rounded(mm / 1000, 1);
    case 'yd': return rounded(mm / 914.4, 1);
  }
}

function typedWeight(grams: number, unit: ReturnType<typeof weightUnit>): string {
  return unit === 'oz' ? rounded(grams / GRAMS_PER_OUNCE, 2) : rounded(grams, grams < 10 ? 1 : 0);
}

/** What was typed, in the other units; what cannot be read stays as it is. */
export function inOtherUnits(value: string, field: string, from: Units, to: Units): string {
  if (from === to) return value;
  if (isLength(field)) {
    const parsed = parseLength(value, lengthUnit(field, from));
    return parsed.ok ? typedLength(parsed.mm, lengthUnit(field, to)) : value;
  }
  if (isWeight(field)) {
    const parsed = parseMass(value, weightUnit(field, from));
    return parsed.ok ? typedWeight(parsed.grams, weightUnit(field, to)) : value;
  }
  const rows = Number(value.replace(',', '.'));
  if (field !== 'swatch' || value.trim() === '' || !Number.isFinite(rows)) return value;
  return rounded(to === 'in' ? rows * 2.54 : rows / 2.54, 2);
}
