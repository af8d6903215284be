/** A working in words and signs, as it is shown below an answer. Numbers stay in the units they were reckoned in. */
import type { Working, WorkingInput, WorkingUnit } from '#core/craft/show-how/working.ts';
import type { Trust } from '#core/craft/trust.ts';
import { FIELD_LABELS } from '#core/reckoner/field-labels.ts';
import { fieldOfPath, fieldOfYarn, ROD_KEYS, RYA_KEYS, SHAPE_KEYS, SOUMAK_KEYS, type FieldsOfKeys } from '#core/reckoner/field-of-path.ts';
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';

const UNITS: Readonly<Record<WorkingUnit, string>> = {
  mm: 'mm', mm2: 'mm²', 'per-mm': 'to the mm', 'per-cm': 'to the cm', 'per-inch': 'to the inch', m: 'm', 'm-per-100g': 'm in 100 g', 'yd-per-lb': 'yd in a pound',
  tex: 'tex', g: 'g', l: 'l', 'l-per-kg': 'l for a kilogram', 'cm3-per-g': 'cm³ to the gram', percent: '%', rad: 'rad', s: 's', h: 'h', 'per-hour': 'an hour', N: 'N', Pa: 'Pa', share: '', ratio: '', count: '',
};

const MOST_LISTED = 12;
const figure = (value: number): string => String(Number(value.toPrecision(7))).replace('-', '−');

/** A number to seven figures with its unit; of a long list the first ones. */
export function stepValue(value: WorkingInput['value'], unit: WorkingUnit): string {
  const figures = typeof value === 'number' ? figure(value) : [...value.slice(0, MOST_LISTED).map(figure), ...(value.length > MOST_LISTED ? ['…'] : [])].join(', ');
  return UNITS[unit] === '' ? figures : `${figures} ${UNITS[unit]}`;
}

const GREEK: Readonly<Record<string, string>> = { delta: 'δ', lambda: 'λ', sigma: 'σ', theta: 'θ', beta: 'β', alpha: 'α', pi: 'π', sqrt: '√' };

/** As a person would write it. */
export function stepFormula(formula: string): string {
  return formula
    .replaceAll(/\b(?:delta|lambda|sigma|theta|beta|alpha|pi|sqrt)\b/gu, (word) => GREEK[word] ?? word)
    .replaceAll(' * ', ' × ')
    .replaceAll(' / ', ' ÷ ')
    .replaceAll(' - ', ' − ');
}

export const stepSymbol = (symbol: string): string => GREEK[symbol] ?? symbol;

export const TRUST_SENTENCES: Readonly<Record<Trust, string>> = {
  counted: 'Exact, as far as what went in is.',
  measured: 'Measured by you: as sure as it gets.',
  label: 'As sure as the label.',
  formula: 'Reckoned by a formula; a swatch of your own beats it.',
  class: 'From a table of classes, so roughly.',
  practice: 'What is commonly done, so roughly.',
};

export const marginSentence = ({ margin }: Working): string | undefined =>
  margin === undefined ? undefined : `With ${figure(Math.round(margin * 1000) / 10)} % on top it suffices in 95 of 100 pieces.`;

/** Where an input was given: a field of the page, or another part of it. */
export type GivenAt = { readonly field: ReckonerField; readonly label: string } | { readonly part: 'yarn' | 'sett' | 'cloth'; readonly label: string };

/** Places in the short questions that other parts answer. */
const FROM_PARTS: Readonly<Record<string, GivenAt>> = {
  '/spacingMm': { part: 'sett', label: 'Ends and spacing' },
  '/ends': { part: 'sett', label: 'Ends and spacing' },
  '/warpDiameterMm': { part: 'sett', label: 'Ends and spacing' },
  '/diameterSumMm': { part: 'yarn', label: 'One yarn' },
  '/strandLoftMm': { part: 'yarn', label: 'One yarn' },
  '/pickSpacingMm': { part: 'cloth', label: 'How much yarn' },
};

const KEYS_OF_PARTS = { rod: ROD_KEYS, rya: RYA_KEYS, shape: SHAPE_KEYS, soumak: SOUMAK_KEYS, piece: RYA_KEYS } as const;

function fieldAt(part: string, path: string): ReckonerField | undefined {
  if (part === 'yarn') return fieldOfYarn(path);
  const key = path.slice(path.lastIndexOf('/') + 1);
  const keys: FieldsOfKeys = part in KEYS_OF_PARTS ? KEYS_OF_PARTS[part as keyof typeof KEYS_OF_PARTS] : {};
  if (path.lastIndexOf('/') === 0 || path.startsWith('/bands/')) return keys[key];
  return key === 'picksPerWeftDiameter' ? 'beat' : fieldOfPath(path, keys);
}

/** `path` in what the part named `part` asked of the engine; undefined where no field stands for it. */
export function givenAt(part: string, path: string): GivenAt | undefined {
  const elsewhere = part === 'yarn' ? undefined : FROM_PARTS[path];
  if (elsewhere !== undefined) return elsewhere;
  const field = fieldAt(part, path);
  return field === undefined ? undefined : { field, label: FIELD_LABELS[field] };
}

/** The workings that gave these ones, and those that gave them, in the order of the reckoning; the first ones left out. */
export function stepsBetween(workings: readonly Working[], shown: ReadonlySet<string>): readonly Working[] {
  const byId = new Map(workings.map((working) => [working.id, working]));
  const needed = new Set<string>();
  const visit = (id: string): void => {
    for (const { from } of byId.get(id)?.inputs ?? []) {
      if (from === undefined || needed.has(from)) continue;
      needed.add(from);
      visit(from);
    }
  };
  for (const id of shown) visit(id);
  return workings.filter(({ id }) => needed.has(id) && !shown.has(id));
}
