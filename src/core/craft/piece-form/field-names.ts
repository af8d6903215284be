/**
 * Names of the form's fields, as a form sends them: `size.widthMm`, `warp.yarn.grist`, `yarns.0.role`,
 * `bands.2.heightMm`, `bands.2.shapes.0.baseMm`. Rows are counted in the order of the piece.
 */
import type { Units } from '#core/units/units.ts';
import type { Asked } from './asked.ts';
import { BAND_KEYS, bandFields, FILL_KEY, SHAPE_KEYS } from './asked-of-band.ts';
import { ASKED_ONCE, BEAT_FIELDS } from './asked-of-piece.ts';
import { YARN_KEYS } from './asked-of-yarn.ts';
import { fieldText } from './field-text.ts';
import { nextId, textOf, type Texts, type TypedBand, type TypedPiece, type TypedRow } from './typed-piece.ts';

/** Far more rows than a piece may have; what comes beyond is not read. */
const MOST_ROWS = 250;
const MOST_SHAPES = 50;

export const ONCE_KEYS: readonly string[] = [...ASKED_ONCE, ...BEAT_FIELDS].map(({ key }) => key);

/** The text a form sent under this name; undefined when it has no such field. */
export type Ask = (name: string) => string | undefined;

/** A whole form: the text of each field by its name. */
export type FormTexts = Readonly<Record<string, string>>;

function textsOf(ask: Ask, keys: readonly string[], prefix: string): Texts {
  return Object.fromEntries(keys.flatMap((key) => {
    const text = ask(`${prefix}${key}`);
    return text === undefined ? [] : [[key, text]];
  }));
}

/** Fields that were not in the form yet, since the technique was only now chosen, begin with what is usual, a further yarn with the band’s own. */
export function withStarters(texts: Texts, asked: readonly Asked[], units: Units): Texts {
  const started = asked.filter(({ key, kind, starter }) => (starter !== undefined || kind === 'role') && !Object.hasOwn(texts, key));
  return { ...Object.fromEntries(started.map((one) => [one.key, one.kind === 'role' ? textOf(texts, 'yarn') : fieldText(one.starter, one, units)])), ...texts };
}

function bandOf(ask: Ask, index: number, units: Units): TypedBand {
  const prefix = `bands.${String(index)}.`;
  const texts = textsOf(ask, BAND_KEYS, prefix);
  const shapes: TypedRow[] = [];
  for (let at = 0; at < MOST_SHAPES && ask(`${prefix}shapes.${String(at)}.shape`) !== undefined; at += 1) {
    shapes.push({ id: at + 1, texts: textsOf(ask, SHAPE_KEYS, `${prefix}shapes.${String(at)}.`) });
  }
  return { id: index + 1, texts: withStarters(texts, bandFields(textOf(texts, 'technique')), units), shapes };
}

function yarnsOf(ask: Ask): TypedRow[] {
  const yarns: TypedRow[] = [];
  for (let index = 0; index < MOST_ROWS; index += 1) {
    const id = ask(`yarns.${String(index)}.id`);
    if (id === undefined) return yarns;
    const known = Number(id);
    const fresh = Number.isSafeInteger(known) && known > 0 && yarns.every((yarn) => yarn.id !== known) ? known : nextId(yarns);
    yarns.push({ id: fresh, texts: textsOf(ask, YARN_KEYS, `yarns.${String(index)}.`) });
  }
  return yarns;
}

/** The form as it was sent. Never throws: whatever is missing or strange is an empty field or none. */
export function typedOfFields(ask: Ask): TypedPiece {
  const units: Units = ask('units') === 'in' ? 'in' : 'cm';
  const bands: TypedBand[] = [];
  for (let index = 0; index < MOST_ROWS && ask(`bands.${String(index)}.technique`) !== undefined; index += 1) bands.push(bandOf(ask, index, units));
  return { units, texts: textsOf(ask, ONCE_KEYS, ''), warpYarn: textsOf(ask, YARN_KEYS, 'warp.yarn.'), yarns: yarnsOf(ask), bands };
}

const named = (texts: Texts, prefix: string): [string, string][] => Object.entries(texts).map(([key, text]) => [`${prefix}${key}`, text]);

/** Every field with its text, as the form would send it. */
export function fieldsOfTyped({ units, texts, warpYarn, yarns, bands }: TypedPiece): ReadonlyMap<string, string> {
  return new Map([
    ['units', units],
    ...named(texts, ''),
    ...named(warpYarn, 'warp.yarn.'),
    ...yarns.flatMap((yarn, index) => [[`yarns.${String(index)}.id`, String(yarn.id)] as [string, string], ...named(yarn.texts, `yarns.${String(index)}.`)]),
    ...bands.flatMap((band, index) => [
      ...named(band.texts, `bands.${String(index)}.`),
      ...band.shapes.flatMap((shape, at) => named(shape.texts, `bands.${String(index)}.shapes.${String(at)}.`)),
    ]),
  ]);
}

/** The same as one plain object, to be kept or sent, and back. What the form does not ask is left out. */
export const textsOfTyped = (typed: TypedPiece): FormTexts => Object.fromEntries(fieldsOfTyped(typed));
export const typedOfTexts = (texts: FormTexts): TypedPiece => typedOfFields((name) => (Object.hasOwn(texts, name) ? texts[name] : undefined));

const WARP_YARN = 'warp.yarn';
/** What a piece calls the thickness of a yarn is one field of the form. */
const GRIST_KEYS: ReadonlySet<string> = new Set(['tex', 'metresPer100g', 'count', 'class']);

/**
 * The field that a place of the piece (JSON pointer) is typed in: the nearest there is. Bands and yarns as a whole are
 * `bands` and `yarns`; '' is the piece itself.
 */
export function fieldOfPlace(pointer: string, typed: TypedPiece): string {
  const segments = pointer.split('/').slice(1).map((segment) => segment.replaceAll('~1', '/').replaceAll('~0', '~'));
  const [first, role, ...rest] = segments;
  if (first === 'yarns' && role !== undefined) {
    const index = typed.yarns.findIndex(({ texts }) => textOf(texts, 'role').trim() === role);
    if (index < 0) return 'yarns';
    return yarnField(`yarns.${String(index)}`, rest);
  }
  if (first === 'warp' && role === 'yarn') return yarnField(WARP_YARN, rest);
  if (first === 'beat') return role === 'picksPerCm' || (role !== undefined && textOf(typed.texts, 'beat.by') === 'own') ? `beat.${role}` : 'beat.by';
  /* All corners of a shape are one field. */
  const name = segments.join('.').replace(/(\.shapes\.\d+\.points)\..*$/, '$1');
  return name.endsWith(`.${FILL_KEY}`) ? `${name.slice(0, -FILL_KEY.length)}heightMm` : name;
}

/** What is said of a yarn as a whole is about its role, or, for the warp that has none, about its thickness. */
function yarnField(prefix: string, [key, ...rest]: readonly string[]): string {
  if (key === undefined) return prefix === WARP_YARN ? `${prefix}.grist` : `${prefix}.role`;
  if (GRIST_KEYS.has(key)) return `${prefix}.grist`;
  return [prefix, key, ...(key === 'ball' && rest.length === 0 ? ['metres'] : rest)].join('.');
}
