/** From a piece to the texts of its form. */
import type { Band, Beat, FrameLoomPiece, Shape, Yarn } from '#core/craft/piece.ts';
import type { Units } from '#core/units/units.ts';
import type { Asked } from './asked.ts';
import { BAND_NAME, bandFields, FILL_KEY, SHAPE, shapeFields, TECHNIQUE } from './asked-of-band.ts';
import { ASKED_ONCE, BEAT_FIELDS, FIRMNESS, OWN_BEAT, SWATCH_BEAT } from './asked-of-piece.ts';
import { gristAsked, YARN_TRAITS } from './asked-of-yarn.ts';
import { fieldText } from './field-text.ts';
import type { Texts, TypedBand, TypedPiece, TypedRow } from './typed-piece.ts';

/** The value below `owner` at a dotted key. */
function valueAt(owner: unknown, key: string): unknown {
  return key.split('.').reduce<unknown>((value, name) => (typeof value === 'object' && value !== null && Object.hasOwn(value, name) ? Reflect.get(value, name) : undefined), owner);
}

/** By the key of each, which may be dotted. */
export function textsOf(owner: unknown, asked: readonly Asked[], units: Units): Record<string, string> {
  return Object.fromEntries(asked.map((one) => [one.key, fieldText(valueAt(owner, one.key), one, units)]));
}

function beatTexts(beat: Beat | undefined, units: Units): Texts {
  const texts = textsOf({ beat }, BEAT_FIELDS, units);
  if (beat === undefined) return { ...texts, 'beat.by': 'ends' };
  if (beat.picksPerCm !== undefined) return { ...texts, 'beat.by': 'swatch', [SWATCH_BEAT.key]: String(beat.picksPerCm) };
  const word = Object.entries(FIRMNESS).find(([, picks]) => picks === beat.picksPerWeftDiameter)?.[0];
  return word === undefined ? { ...texts, 'beat.by': 'own' } : { ...texts, 'beat.by': word, [OWN_BEAT.key]: '' };
}

/** How thick the yarn is, in the two fields that ask for it. */
export function gristTexts(yarn: Yarn): Texts {
  if (yarn.count !== undefined) return { by: yarn.count.system, grist: yarn.count.text };
  const by = yarn.tex !== undefined ? 'tex' : yarn.class !== undefined ? 'class' : 'metresPer100g';
  return { by, grist: fieldText(yarn[by], gristAsked(by), 'cm') };
}

const yarnTexts = (yarn: Yarn, units: Units): Texts => ({ ...textsOf(yarn, YARN_TRAITS, units), ...gristTexts(yarn) });

/** A role as a band names it, by the id of the yarn that plays it. */
type IdOf = (role: unknown) => string;

function rolesAsIds(owner: Band | Shape, asked: readonly Asked[], idOf: IdOf): Texts {
  return Object.fromEntries(asked.filter(({ kind }) => kind === 'role').map(({ key }) => [key, idOf(valueAt(owner, key))]));
}

function typeShape(shape: Shape, id: number, units: Units, idOf: IdOf): TypedRow {
  const asked = [SHAPE, ...shapeFields(shape.shape)];
  return { id, texts: { ...textsOf(shape, asked, units), ...rolesAsIds(shape, asked, idOf) } };
}

function typeBand(band: Band, id: number, units: Units, idOf: IdOf): TypedBand {
  const asked = [TECHNIQUE, BAND_NAME, ...bandFields(band.technique)];
  const fills = band.technique === 'tabby' && band.fill === true;
  const shapes = band.technique === 'tabby' ? (band.shapes ?? []) : [];
  return {
    id,
    texts: { ...textsOf(band, asked, units), ...rolesAsIds(band, asked, idOf), [FILL_KEY]: fills ? 'yes' : '' },
    shapes: shapes.map((shape, index) => typeShape(shape, index + 1, units, idOf)),
  };
}

/** The piece in the words and units of a person's form. Reading it back gives the same piece, number for number. */
export function typePiece(piece: FrameLoomPiece, units: Units): TypedPiece {
  const roles = Object.keys(piece.yarns);
  const idOf: IdOf = (role) => {
    const index = roles.findIndex((known) => known === role);
    return index < 0 ? '' : String(index + 1);
  };
  return {
    units,
    texts: { ...textsOf(piece, ASKED_ONCE, units), ...beatTexts(piece.beat, units) },
    warpYarn: yarnTexts(piece.warp.yarn, units),
    yarns: Object.entries(piece.yarns).map(([role, yarn], index) => ({ id: index + 1, texts: { ...yarnTexts(yarn, units), role } })),
    bands: piece.bands.map((band, index) => typeBand(band, index + 1, units, idOf)),
  };
}

/** What a form begins with when there is no piece yet: one yarn, and one band of tabby that fills the height. */
export function emptyForm(units: Units): TypedPiece {
  return {
    units,
    texts: { 'loom.warping': 'zigzag', 'beat.by': 'comb' },
    warpYarn: { by: 'tex', colour: '#d8d2c1' },
    yarns: [{ id: 1, texts: { role: 'ground', by: 'metresPer100g', colour: '#93a8a6' } }],
    bands: [{ id: 1, texts: { technique: 'tabby', yarn: '1', [FILL_KEY]: 'yes' }, shapes: [] }],
  };
}
