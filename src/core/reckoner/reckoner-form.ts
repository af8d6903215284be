/**
 * What is typed on the reckoner's page, kept as text: a slip is shown again as it was
 * typed, and an address carries the whole of it.
 */
import { MM_PER_INCH, inchesText, toInches } from '#core/units/inches.ts';
import { parseLength, type LengthUnit } from '#core/units/parse-length.ts';
import type { Units } from '#core/units/units.ts';

/** Every field with what stands in it at first: a small hanging that can be woven as it is. */
export const RECKONER_DEFAULTS = {
  units: 'cm',
  'yarn-by': 'metres',
  yarn: '180',
  'ball-metres': '',
  'ball-grams': '',
  wraps: '',
  strands: '1',
  hand: 'soft',
  width: '30',
  nails: '10',
  warping: 'zigzag',
  together: '1',
  parity: 'even',
  'warp-tex': '400',
  'draw-in': '2',
  height: '40',
  'frame-height': '55',
  'frame-width': '',
  beat: 'packed',
  swatch: '',
  fringe: 'none',
  pile: '15',
  'fringe-strands': '3',
  dowel: '12',
} as const satisfies Record<string, string>;

export type ReckonerField = keyof typeof RECKONER_DEFAULTS;
export type ReckonerForm = Readonly<Record<ReckonerField, string>>;

export const RECKONER_FIELDS = Object.keys(RECKONER_DEFAULTS).filter((name): name is ReckonerField => name in RECKONER_DEFAULTS);

/** Unit a length is typed in, by field; `fine` ones are small. */
const LENGTH_FIELDS = {
  width: 'large',
  height: 'large',
  'frame-height': 'large',
  'frame-width': 'large',
  pile: 'large',
  nails: 'fine',
  dowel: 'fine',
} as const satisfies Partial<Record<ReckonerField, 'large' | 'fine'>>;

export type LengthField = keyof typeof LENGTH_FIELDS;

export const isLengthField = (field: ReckonerField): field is LengthField => field in LENGTH_FIELDS;

export function unitOf(field: LengthField, units: Units): LengthUnit {
  if (units === 'in') return 'in';
  return LENGTH_FIELDS[field] === 'fine' ? 'mm' : 'cm';
}

export function unitsOf(form: Pick<ReckonerForm, 'units'>): Units {
  return form.units === 'in' ? 'in' : 'cm';
}

/** A length as it would be typed: a number with at most one decimal, or inches with a fraction. */
function typed(mm: number, unit: LengthUnit): string {
  if (unit === 'in') return inchesText(toInches(mm / MM_PER_INCH, 16, 'nearest'));
  return String(Math.round((unit === 'cm' ? mm / 10 : mm) * 10) / 10);
}

/** One value in the other units; what cannot be read stays as it was typed. */
function inOtherUnits(value: string, field: LengthField, from: Units, to: Units): string {
  if (from === to) return value;
  const parsed = parseLength(value, unitOf(field, from));
  return parsed.ok ? typed(parsed.mm, unitOf(field, to)) : value;
}

/** The same lengths in the other units. */
export function changeUnits(form: ReckonerForm, to: Units): ReckonerForm {
  const changed: Record<ReckonerField, string> = { ...form, units: to };
  for (const field of RECKONER_FIELDS.filter(isLengthField)) changed[field] = inOtherUnits(form[field], field, unitsOf(form), to);
  return changed;
}

/** One field changed by the hand. */
export function changeField(form: ReckonerForm, field: ReckonerField, value: string): ReckonerForm {
  return field === 'units' ? changeUnits(form, value === 'in' ? 'in' : 'cm') : { ...form, [field]: value };
}

/** Longer than anything that makes sense in a field. */
const LONGEST_VALUE = 60;

/**
 * The form an address describes; what it leaves out stands as at first. `shown` names the
 * units that stood beside the fields: without script a person chooses other units and
 * sends the form in one go, and what she typed belongs to what she saw.
 */
export function readReckonerForm(query: { get(name: string): string | null }): ReckonerForm {
  const units: Units = query.get('units') === 'in' ? 'in' : 'cm';
  const shown = query.get('shown');
  const typedIn: Units = shown === 'cm' || shown === 'in' ? shown : units;
  const form: Record<ReckonerField, string> = { ...changeUnits(RECKONER_DEFAULTS, units) };
  for (const field of RECKONER_FIELDS) {
    const value = query.get(field)?.slice(0, LONGEST_VALUE);
    if (value === undefined || field === 'units') continue;
    form[field] = isLengthField(field) ? inOtherUnits(value, field, typedIn, units) : value;
  }
  return form;
}

/** The address of a form, without what stands as at first. */
export function reckonerQuery(form: ReckonerForm): string {
  const atFirst: ReckonerForm = { ...changeUnits(RECKONER_DEFAULTS, unitsOf(form)), units: RECKONER_DEFAULTS.units };
  const changed = RECKONER_FIELDS.filter((field) => form[field] !== atFirst[field]);
  return new URLSearchParams(changed.map((field) => [field, form[field]])).toString();
}
