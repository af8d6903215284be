/**
 * What is typed on the reckoner's page, kept as text: a slip is shown again as it was
 * typed, and an address carries the whole of it.
 */
import { inOtherUnits } from '#core/reckoner/measured-fields.ts';
import type { Units } from '#core/units/units.ts';

/** Every field with what stands in it at first: a small hanging that can be woven as it is. */
export const RECKONER_DEFAULTS = {
  units: 'cm',

  'yarn-by': 'metres',
  yarn: '180',
  'ball-length': '',
  'ball-weight': '',
  wraps: '',
  strands: '1',
  hand: 'soft',

  'loom-kind': 'nailed-frame',
  'nail-rows': 'both',
  width: '30',
  nails: '10',
  every: '1',
  warping: 'zigzag',
  together: '1',
  parity: 'even',
  'warp-tex': '400',
  'draw-in': '2',

  height: '40',
  weave: 'straight-warp',
  beat: 'packed',
  swatch: '',

  over: '4',
  back: '2',
  'soumak-rows': '4',
  between: '2',

  'leg-ends': '1',
  'knot-strands': '3',
  pile: '15',
  trim: '10',
  'rya-rows': '1',
  'edge-ends': '0',
  card: '2',

  shape: 'triangle',
  base: '15',
  'shape-height': '10',
  radius: '6',
  sides: 'alike',
  'step-ends': '2',
  'step-rows': '3',

  'rod-load': '600',
  'rod-length': '54',
  rise: '12',

  'frame-height': '55',
  'frame-width': '',
  fringe: 'none',
  dowel: '12',
} as const satisfies Record<string, string>;

export type ReckonerField = keyof typeof RECKONER_DEFAULTS;
export type ReckonerForm = Readonly<Record<ReckonerField, string>>;

export const RECKONER_FIELDS = Object.keys(RECKONER_DEFAULTS).filter((name): name is ReckonerField => name in RECKONER_DEFAULTS);

export function unitsOf(form: Pick<ReckonerForm, 'units'>): Units {
  return form.units === 'in' ? 'in' : 'cm';
}

/** The same measures in the other units. */
export function changeUnits(form: ReckonerForm, to: Units): ReckonerForm {
  const changed: Record<ReckonerField, string> = { ...form, units: to };
  for (const field of RECKONER_FIELDS) if (field !== 'units') changed[field] = inOtherUnits(form[field], field, unitsOf(form), to);
  return changed;
}

/** One field changed by the hand. */
export function changeField(form: ReckonerForm, field: ReckonerField, value: string): ReckonerForm {
  return field === 'units' ? changeUnits(form, value === 'in' ? 'in' : 'cm') : { ...form, [field]: value };
}

/** Longer than anything that makes sense in a field. */
const LONGEST_VALUE = 60;

const unitsNamed = (name: string | null): Units | undefined => (name === 'cm' || name === 'in' ? name : undefined);

/**
 * The form an address describes; what it leaves out stands as at first, in `own` units
 * where it names none. `shown` names the units that stood beside the fields: without
 * script a person chooses other units and sends the form in one go, and what she typed
 * belongs to what she saw.
 */
export function readReckonerForm(query: { get(name: string): string | null }, own: Units = 'cm'): ReckonerForm {
  const units = unitsNamed(query.get('units')) ?? own;
  const typedIn = unitsNamed(query.get('shown')) ?? units;
  const form: Record<ReckonerField, string> = { ...changeUnits(RECKONER_DEFAULTS, units) };
  for (const field of RECKONER_FIELDS) {
    const value = query.get(field)?.slice(0, LONGEST_VALUE);
    if (value !== undefined && field !== 'units') form[field] = inOtherUnits(value, field, typedIn, units);
  }
  return form;
}

/** The address of a form: its units, which are another person's own perhaps, and what does not stand as at first. */
export function reckonerQuery(form: ReckonerForm): string {
  const atFirst = changeUnits(RECKONER_DEFAULTS, unitsOf(form));
  const changed = RECKONER_FIELDS.filter((field) => field === 'units' || form[field] !== atFirst[field]);
  return new URLSearchParams(changed.map((field) => [field, form[field]])).toString();
}
