/** From what was typed to what the reckoning takes. Errors are kept by field, the first one of each. */
import type { Beat, EndsTogether, Loom, Parity, Warp, Yarn } from '#core/craft/piece.ts';
import type { FieldErrors } from '#core/reckoner/answer-line.ts';
import { unitOf, unitsOf, type LengthField, type ReckonerField, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import { METRES_PER_YARD } from '#core/craft/yarn/count.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import { parseLength } from '#core/units/parse-length.ts';
import type { Units } from '#core/units/units.ts';
import { ASHENHURST_K } from '#core/craft/defaults.ts';

/** Ways to say how thick a yarn is, with the words for each. */
export const YARN_WAYS = [
  { value: 'metres', label: 'Metres in 100 g' },
  { value: 'yards', label: 'Yards in an ounce' },
  { value: 'tex', label: 'Tex' },
  { value: 'nm', label: 'Nm' },
  { value: 'ne-cotton', label: 'Cotton count' },
  { value: 'spun-silk', label: 'Spun silk' },
  { value: 'ne-worsted', label: 'Worsted count' },
  { value: 'lea', label: 'Linen lea' },
  { value: 'run', label: 'Woollen run' },
  { value: 'yorkshire', label: 'Yorkshire skein' },
  { value: 'jute', label: 'Jute pounds' },
  { value: 'grain', label: 'American grain' },
  { value: 'denier', label: 'Denier' },
  { value: 'dtex', label: 'Decitex' },
] as const;

export type YarnWay = (typeof YARN_WAYS)[number]['value'];

/** How firmly rows are beaten down, in picks to one thickness of the yarn. */
export const BEATS = [
  { value: 'packed', label: 'With a comb, as for a hanging', picks: 0.7 },
  { value: 'firm', label: 'Firm, as for tapestry', picks: 1.1 },
  { value: 'rug', label: 'Hard, as for a rug', picks: 1.45 },
  { value: 'swatch', label: 'I counted rows on a swatch', picks: 0 },
] as const;

const GRAMS_PER_OUNCE = 28.349523125;

export class FormReader {
  readonly errors: FieldErrors = {};
  readonly units: Units;

  constructor(readonly form: ReckonerForm) {
    this.units = unitsOf(form);
  }

  /** Keeps what is wrong with a field: the first thing found. */
  refuse(field: ReckonerField, says: string): void {
    this.errors[field] ??= says;
  }

  isSound(...fields: readonly ReckonerField[]): boolean {
    return fields.every((field) => this.errors[field] === undefined);
  }

  text(field: ReckonerField): string {
    return this.form[field].trim();
  }

  /** A length in mm; undefined if it cannot be read, and then the field says why. */
  length(field: LengthField, name: string): number | undefined {
    const unit = unitOf(field, this.units);
    const parsed = parseLength(this.form[field], unit);
    if (parsed.ok) return parsed.mm;
    this.refuse(field, this.text(field) === '' ? `${name} is missing. Type it in ${unit}.` : parsed.reason);
    return undefined;
  }

  optionalLength(field: LengthField, name: string): number | undefined {
    return this.text(field) === '' ? undefined : this.length(field, name);
  }

  /** A plain number; comma and point are both decimal marks. */
  number(field: ReckonerField, name: string): number | undefined {
    const typed = this.text(field);
    if (/^\d{1,9}(?:[.,]\d{1,9})?$/u.test(typed)) return Number(typed.replace(',', '.'));
    this.refuse(field, typed === '' ? `${name} is missing. Type a number.` : `${name} is not a number. Type it like 12 or 12.5.`);
    return undefined;
  }

  optionalNumber(field: ReckonerField, name: string): number | undefined {
    return this.text(field) === '' ? undefined : this.number(field, name);
  }

  choice<const T extends string>(field: ReckonerField, options: readonly [T, ...T[]]): T {
    return options.find((option) => option === this.form[field]) ?? options[0];
  }
}

type Grist = { readonly tex: number } | { readonly metresPer100g: number } | { readonly count: { readonly text: string; readonly system: Exclude<YarnWay, 'metres' | 'yards' | 'tex'> } };

function readGrist(reader: FormReader): Grist | undefined {
  const way = YARN_WAYS.find(({ value }) => value === reader.form['yarn-by'])?.value ?? 'metres';
  if (way === 'metres' || way === 'yards' || way === 'tex') {
    const value = reader.number('yarn', 'The yarn');
    if (value === undefined) return undefined;
    if (way === 'tex') return { tex: value };
    return { metresPer100g: way === 'metres' ? value : (value * METRES_PER_YARD * 100) / GRAMS_PER_OUNCE };
  }
  const text = reader.text('yarn').replace(',', '.');
  if (text !== '') return { count: { text, system: way } };
  reader.refuse('yarn', 'The count is missing. Write it like 8/2.');
  return undefined;
}

function readBall(reader: FormReader): { readonly ball?: { readonly metres: number; readonly grams: number } } {
  const metres = reader.optionalNumber('ball-metres', 'Metres in a ball');
  const grams = reader.optionalNumber('ball-grams', 'Grams of a ball');
  if (reader.text('ball-metres') === '' && reader.text('ball-grams') !== '') reader.refuse('ball-metres', 'How many metres weigh that? Type both, or neither.');
  if (reader.text('ball-grams') === '' && reader.text('ball-metres') !== '') reader.refuse('ball-grams', 'How much do those metres weigh? Type both, or neither.');
  return metres === undefined || grams === undefined ? {} : { ball: { metres, grams } };
}

/** Fields that describe the yarn. */
export const YARN_FIELDS = ['yarn', 'ball-metres', 'ball-grams', 'wraps', 'strands'] as const satisfies readonly ReckonerField[];

/**
 * The yarn, as far as its fields can be read; the reckoning itself tells what of it is
 * impossible. Only its thickness must be there.
 */
export function readTypedYarn(reader: FormReader): Yarn | undefined {
  const grist = readGrist(reader);
  const wraps = reader.optionalNumber('wraps', 'Wraps in an inch');
  const strands = reader.number('strands', 'Strands together');
  const ball = readBall(reader);
  if (grist === undefined) return undefined;
  return {
    ...grist,
    ...ball,
    strands: strands ?? 1,
    ashenhurstK: reader.choice('hand', ['soft', 'firm']) === 'soft' ? ASHENHURST_K.weft : ASHENHURST_K.warp,
    ...(wraps === undefined ? {} : { wrapsPerInch: wraps }),
  };
}

export interface TypedLoom {
  readonly widthMm: number;
  readonly loom: Omit<Loom, 'insideHeightMm'>;
  readonly warp: Warp;
  readonly drawIn: number;
}

/** Width, nails and warp. */
export function readTypedLoom(reader: FormReader): TypedLoom | undefined {
  const widthMm = reader.length('width', 'Width');
  const nailPitchMm = reader.length('nails', 'Nail spacing');
  const tex = reader.number('warp-tex', 'Tex of the warp');
  const drawIn = reader.number('draw-in', 'Draw-in');
  const insideWidthMm = reader.optionalLength('frame-width', 'Inside width of the frame');
  if (widthMm === undefined || nailPitchMm === undefined || tex === undefined || drawIn === undefined) return undefined;
  const endsTogether: EndsTogether = reader.choice('together', ['1', '2']) === '2' ? 2 : 1;
  const parity: Parity = reader.choice('parity', ['any', 'even', 'odd']);
  return {
    widthMm,
    loom: { nailPitchMm, warping: reader.choice('warping', ['zigzag', 'two-nail']), ...(insideWidthMm === undefined ? {} : { insideWidthMm }) },
    warp: { yarn: { tex }, endsTogether, parity },
    drawIn: drawIn / 100,
  };
}

/** How close rows lie: by the yarn, or as counted in a centimetre or an inch. */
export function readTypedBeat(reader: FormReader): Beat | undefined {
  const beat = BEATS.find(({ value }) => value === reader.form.beat) ?? BEATS[0];
  if (beat.value !== 'swatch') return { picksPerWeftDiameter: beat.picks };
  const rows = reader.number('swatch', reader.units === 'in' ? 'Rows in an inch' : 'Rows in a centimetre');
  if (rows === undefined) return undefined;
  return { picksPerCm: reader.units === 'in' ? (rows * 10) / MM_PER_INCH : rows };
}
