/** From what was typed to what the reckoning takes. */
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { LOOM_KIND_NAMES, LOOM_KINDS, NAIL_ROW_NAMES } from '#core/craft/looms/looms.ts';
import type { Beat, CountSystem, EndsTogether, Loom, Parity, Warp, Yarn } from '#core/craft/piece.ts';
import type { WeaveMode } from '#core/craft/weave.ts';
import { METRES_PER_YARD } from '#core/craft/yarn/count.ts';
import { YARN_CLASSES } from '#core/craft/yarn/classes.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import { GRAMS_PER_OUNCE } from '#core/units/parse-mass.ts';

const COUNT_WAYS = [
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
] as const satisfies readonly { value: CountSystem; label: string }[];

/** Ways to say how thick a yarn is, with the words for each. */
export const YARN_WAYS = [
  { value: 'metres', label: 'Metres in 100 g' },
  { value: 'yards', label: 'Yards in an ounce' },
  { value: 'yards-pound', label: 'Yards in a pound' },
  { value: 'tex', label: 'Tex' },
  ...COUNT_WAYS,
  { value: 'class', label: 'Shops’ class, 0 to 7' },
] as const;

/** Ways that take a plain number; the others a count as it stands on the label. */
export const isPlainNumber = (way: string): boolean => !COUNT_WAYS.some(({ value }) => value === way);

/** How firmly rows are beaten down, in picks to one thickness of the yarn. */
export const BEATS = [
  { value: 'packed', label: 'With a comb, as for a hanging', picks: 0.7 },
  { value: 'firm', label: 'Firm, as for tapestry', picks: 1.1 },
  { value: 'rug', label: 'Hard, as for a rug', picks: 1.45 },
  { value: 'swatch', label: 'I counted rows on a swatch', picks: 0 },
] as const;

function readPlain(reader: FormReader, way: string): { readonly tex: number } | { readonly metresPer100g: number } | { readonly class: (typeof YARN_CLASSES)[number]['number'] } | undefined {
  const value = reader.number('yarn', 'The yarn');
  if (value === undefined) return undefined;
  switch (way) {
    case 'tex': return { tex: value };
    case 'yards': return { metresPer100g: (value * METRES_PER_YARD * 100) / GRAMS_PER_OUNCE };
    case 'yards-pound': return { metresPer100g: (value * METRES_PER_YARD * 100) / (16 * GRAMS_PER_OUNCE) };
    case 'class': {
      const known = YARN_CLASSES.find(({ number }) => number === value);
      if (known !== undefined) return { class: known.number };
      reader.refuse('yarn', 'Shops’ classes go from 0, lace, to 7, jumbo.');
      return undefined;
    }
    default: return { metresPer100g: value };
  }
}

function readGrist(reader: FormReader) {
  const system = COUNT_WAYS.find(({ value }) => value === reader.form['yarn-by'])?.value;
  if (system === undefined) return readPlain(reader, reader.form['yarn-by']);
  const text = reader.text('yarn').replace(',', '.');
  if (text !== '') return { count: { text, system } };
  reader.refuse('yarn', 'The count is missing. Write it like 8/2.');
  return undefined;
}

function readBall(reader: FormReader): { readonly ball?: { readonly metres: number; readonly grams: number } } {
  const mm = reader.optionalLength('ball-length', 'Length of a ball');
  const grams = reader.isEmpty('ball-weight') ? undefined : reader.weight('ball-weight', 'Weight of a ball');
  if (reader.isEmpty('ball-length') && !reader.isEmpty('ball-weight')) reader.refuse('ball-length', 'How long is the yarn that weighs that? Type both, or neither.');
  if (reader.isEmpty('ball-weight') && !reader.isEmpty('ball-length')) reader.refuse('ball-weight', 'How much does that length weigh? Type both, or neither.');
  return mm === undefined || grams === undefined ? {} : { ball: { metres: mm / 1000, grams } };
}

/** Fields that describe the yarn. */
export const YARN_FIELDS = ['yarn', 'ball-length', 'ball-weight', 'wraps', 'strands'] as const satisfies readonly ReckonerField[];

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

/** Fields that decide the number of ends. */
export const SETT_FIELDS = ['width', 'nails', 'every', 'warp-tex', 'draw-in', 'together', 'parity'] as const satisfies readonly ReckonerField[];

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
  const everyNthNail = reader.number('every', 'Which nails');
  const tex = reader.number('warp-tex', 'Tex of the warp');
  const drawIn = reader.number('draw-in', 'Draw-in');
  if (widthMm === undefined || nailPitchMm === undefined || everyNthNail === undefined || tex === undefined || drawIn === undefined) return undefined;
  const kind = reader.choice('loom-kind', LOOM_KIND_NAMES);
  const endsTogether: EndsTogether = reader.choice('together', ['1', '2']) === '2' ? 2 : 1;
  const parity: Parity = reader.choice('parity', ['any', 'even', 'odd']);
  return {
    widthMm,
    loom: {
      kind,
      nailPitchMm,
      everyNthNail,
      warping: LOOM_KINDS[kind].warpings.length === 1 ? LOOM_KINDS[kind].warpings[0] : reader.choice('warping', ['zigzag', 'two-nail']),
      ...(LOOM_KINDS[kind].rows === 2 ? { nailRows: reader.choice('nail-rows', NAIL_ROW_NAMES) } : {}),
    },
    warp: { yarn: { tex }, endsTogether, parity },
    drawIn: drawIn / 100,
  };
}

/** Fields that decide how rows lie. */
export const ROW_FIELDS = ['height', 'swatch'] as const satisfies readonly ReckonerField[];

export interface TypedRows {
  readonly heightMm: number;
  readonly beat: Beat;
  readonly mode: WeaveMode;
}

/** How close rows lie: by the yarn, or as counted in a centimetre or an inch. */
function readBeat(reader: FormReader): Beat | undefined {
  const beat = BEATS.find(({ value }) => value === reader.form.beat) ?? BEATS[0];
  if (beat.value !== 'swatch') return { picksPerWeftDiameter: beat.picks };
  const rows = reader.number('swatch', reader.units === 'in' ? 'Rows in an inch' : 'Rows in a centimetre');
  if (rows === undefined) return undefined;
  return { picksPerCm: reader.units === 'in' ? (rows * 10) / MM_PER_INCH : rows };
}

/** Height, beat and which yarn bends. */
export function readTypedRows(reader: FormReader): TypedRows | undefined {
  const heightMm = reader.length('height', 'Height');
  const beat = readBeat(reader);
  if (heightMm === undefined || beat === undefined) return undefined;
  return { heightMm, beat, mode: reader.choice('weave', ['straight-warp', 'balanced']) };
}
