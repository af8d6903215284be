/**
 * What a person types of her loom before she has told us anything else. Kept as text, so that a slip is shown again as
 * it was typed, and carried in an address: `?inside=36&spacing=8&ends=2&units=cm`.
 */
import { parseLength } from '#core/units/parse-length.ts';
import { lengthText } from '#core/units/format-amount.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';
import type { EndsTogether } from '#core/craft/piece.ts';
import type { Units } from '#core/units/units.ts';

export interface TypedLoom {
  /** Between the inner edges of the frame: centimetres or inches unless it says another unit. */
  readonly inside: string;
  /** From nail to nail: millimetres or inches unless it says another unit. */
  readonly spacing: string;
  readonly ends: EndsTogether;
  readonly units: Units;
  /** Where the pattern is too wide for the loom: as wide as the loom allows. */
  readonly narrower: boolean;
}

export interface TriedLoom {
  readonly insideWidthMm: number;
  readonly nailPitchMm: number;
}

/** A sentence for each field that cannot be used. */
export interface LoomFaults {
  readonly inside?: string;
  readonly spacing?: string;
}

export type LoomReading = { readonly ok: true; readonly loom: TriedLoom } | { readonly ok: false; readonly fields: LoomFaults };

interface Measure {
  readonly name: string;
  readonly unit: 'mm' | 'cm' | 'in';
  readonly leastMm: number;
  readonly mostMm: number;
  readonly works: string;
  readonly below: string;
  readonly above: string;
}

const NARROW = { name: 'Inside width', below: 'Too narrow for a frame.', above: 'Too wide for a frame.' };
const CLOSE = { name: 'Nail spacing', below: 'Too close for nails.', above: 'Too far apart to weave on.' };

/** What is plausible for a frame with nails, in the units the person thinks in. */
const MEASURES = {
  cm: {
    inside: { ...NARROW, unit: 'cm', leastMm: 50, mostMm: 3_000, works: 'Between 5 and 300 cm works.' },
    spacing: { ...CLOSE, unit: 'mm', leastMm: 2, mostMm: 25, works: 'Between 2 and 25 mm works.' },
  },
  in: {
    inside: { ...NARROW, unit: 'in', leastMm: 50.8, mostMm: 3_048, works: 'Between 2 and 120 in works.' },
    spacing: { ...CLOSE, unit: 'in', leastMm: 25.4 / 16, mostMm: 25.4, works: 'Between 1/16 and 1 in works.' },
  },
} as const satisfies Record<Units, Record<'inside' | 'spacing', Measure>>;

/** The unit that stands beside each field. */
export function loomFieldUnits(units: Units): { readonly inside: 'cm' | 'in'; readonly spacing: 'mm' | 'in' } {
  return { inside: MEASURES[units].inside.unit, spacing: MEASURES[units].spacing.unit };
}

function readMeasure(typed: string, measure: Measure): number | string {
  if (typed.trim() === '') return `${measure.name} is missing. Type it in ${measure.unit}.`;
  const read = parseLength(typed, measure.unit);
  if (!read.ok) return read.reason;
  if (read.mm < measure.leastMm) return `${measure.below} ${measure.works}`;
  return read.mm > measure.mostMm ? `${measure.above} ${measure.works}` : read.mm;
}

export function readTypedLoom({ inside, spacing, units }: TypedLoom): LoomReading {
  const width = readMeasure(inside, MEASURES[units].inside);
  const pitch = readMeasure(spacing, MEASURES[units].spacing);
  if (typeof width === 'number' && typeof pitch === 'number') return { ok: true, loom: { insideWidthMm: width, nailPitchMm: pitch } };
  return { ok: false, fields: { ...(typeof width === 'string' ? { inside: width } : {}), ...(typeof pitch === 'string' ? { spacing: pitch } : {}) } };
}

const decimalText = (value: number): string => String(roundHalfUp(value * 10) / 10);

/** A loom as it would be typed in `units`: tenths of a centimetre or millimetre, sixteenths of an inch. */
export function loomTexts({ insideWidthMm, nailPitchMm }: TriedLoom, units: Units): Pick<TypedLoom, 'inside' | 'spacing'> {
  return units === 'in'
    ? { inside: lengthText(insideWidthMm, 'imperial', 'nearest'), spacing: lengthText(nailPitchMm, 'imperial', 'nearest') }
    : { inside: decimalText(insideWidthMm / 10), spacing: decimalText(nailPitchMm) };
}

const LONGEST = 40;

/**
 * Reads the fields by name, as they stand in an address or a form; null when none of them was typed. `shown` is the
 * units that stood beside the fields, where they may differ from those now chosen: without script a person chooses
 * other units and sends the form in one go, and what she typed belongs to what she saw.
 */
export function typedLoomOf(ask: (name: string) => string | null | undefined): TypedLoom | null {
  const [inside, spacing] = [ask('inside'), ask('spacing')];
  if (typeof inside !== 'string' && typeof spacing !== 'string') return null;
  const units: Units = ask('units') === 'in' ? 'in' : 'cm';
  const shown = ask('shown');
  const typed: TypedLoom = {
    inside: (inside ?? '').slice(0, LONGEST),
    spacing: (spacing ?? '').slice(0, LONGEST),
    ends: ask('ends') === '2' ? 2 : 1,
    units,
    narrower: ask('wide') === 'most',
  };
  return shown === 'cm' || shown === 'in' ? inOtherUnits({ ...typed, units: shown }, units) : typed;
}

/** The same loom typed in other units; what cannot be read stays as it was typed. */
export function inOtherUnits(typed: TypedLoom, units: Units): TypedLoom {
  if (typed.units === units) return typed;
  const read = readTypedLoom(typed);
  return read.ok ? { ...typed, ...loomTexts(read.loom, units), units } : { ...typed, units };
}

/** Fields and values in their order, for an address or for hidden fields of a form. */
export function loomFields(typed: TypedLoom): readonly (readonly [name: string, value: string])[] {
  const fields = [['inside', typed.inside], ['spacing', typed.spacing], ['ends', String(typed.ends)], ['units', typed.units]] as const;
  return typed.narrower ? [...fields, ['wide', 'most']] : fields;
}
