/** What hands do to a form beside typing: rows are put in, copied, moved and taken out. The same with script and without. */
import { bandFields, FILL_KEY } from './asked-of-band.ts';
import { withStarters } from './field-names.ts';
import { splitBand } from './split-band.ts';
import { nextId, textOf, type Texts, type TypedBand, type TypedPiece, type TypedRow } from './typed-piece.ts';

/** Rows are counted from 0, bands in the order they are woven. */
export type Act =
  /** Nothing but to see the fields that belong to what was chosen. */
  | { readonly do: 'look' }
  /** `after` is the band woven before it; −1 weaves it first. */
  | { readonly do: 'add-band'; readonly after: number }
  | { readonly do: 'copy-band' | 'split-band' | 'take-out-band' | 'sooner' | 'later'; readonly band: number }
  /** To be the band of that place. */
  | { readonly do: 'move-band'; readonly band: number; readonly to: number }
  | { readonly do: 'add-shape'; readonly band: number }
  | { readonly do: 'take-out-shape'; readonly band: number; readonly shape: number }
  | { readonly do: 'add-yarn' }
  | { readonly do: 'take-out-yarn'; readonly yarn: number };

const numbered = (text: string): number[] => text.split(':').slice(1).map(Number);
const isCount = (value: number | undefined): value is number => value !== undefined && Number.isInteger(value) && value >= -1 && value < 1000;

/** As a button sends it: `take-out-shape:2:0`. Null for anything else. */
export function readAct(text: string): Act | null {
  const name = text.split(':', 1)[0];
  const [first, second] = numbered(text);
  if (name === 'look' || name === 'add-yarn') return { do: name };
  if (!isCount(first)) return null;
  switch (name) {
    case 'add-band':
      return { do: name, after: first };
    case 'copy-band':
    case 'split-band':
    case 'take-out-band':
    case 'sooner':
    case 'later':
    case 'add-shape':
      return { do: name, band: first };
    case 'move-band':
      return isCount(second) ? { do: name, band: first, to: second } : null;
    case 'take-out-shape':
      return isCount(second) ? { do: name, band: first, shape: second } : null;
    case 'take-out-yarn':
      return { do: name, yarn: first };
    default:
      return null;
  }
}

export function actText(act: Act): string {
  switch (act.do) {
    case 'look':
    case 'add-yarn':
      return act.do;
    case 'add-band':
      return `${act.do}:${String(act.after)}`;
    case 'take-out-shape':
      return `${act.do}:${String(act.band)}:${String(act.shape)}`;
    case 'move-band':
      return `${act.do}:${String(act.band)}:${String(act.to)}`;
    case 'take-out-yarn':
      return `${act.do}:${String(act.yarn)}`;
    default:
      return `${act.do}:${String(act.band)}`;
  }
}

/** Colours of invented yarns that new ones take in turn. */
const DYES = ['#2f5366', '#cdbb94', '#7d854f', '#e6e4d8', '#93a8a6', '#a4553f'] as const;

function without<T>(rows: readonly T[], index: number): readonly T[] {
  return rows.filter((_, at) => at !== index);
}

function putAt<T>(rows: readonly T[], index: number, row: T): readonly T[] {
  return [...rows.slice(0, index), row, ...rows.slice(index)];
}

function moved<T>(rows: readonly T[], from: number, to: number): readonly T[] {
  const row = rows[from];
  return row === undefined || to < 0 || to >= rows.length ? rows : putAt(without(rows, from), to, row);
}

function changeBand(bands: readonly TypedBand[], index: number, change: (band: TypedBand) => TypedBand): readonly TypedBand[] {
  return bands.map((band, at) => (at === index ? change(band) : band));
}

/** A new band goes on with the yarn of the one before it. */
function addBand({ bands, yarns }: TypedPiece, after: number): readonly TypedBand[] {
  const near = bands[after] ?? bands[after + 1];
  const yarn = near === undefined ? String(yarns[0]?.id ?? '') : textOf(near.texts, 'yarn');
  return putAt(bands, Math.min(bands.length, Math.max(0, after + 1)), { id: nextId(bands), texts: { technique: 'tabby', yarn }, shapes: [] });
}

/** A copy has no name: texts must know which of the two they mean. Nor can two bands fill what is left. */
function copyBand(bands: readonly TypedBand[], index: number): readonly TypedBand[] {
  const band = bands[index];
  if (band === undefined) return bands;
  return putAt(bands, index + 1, { ...band, id: nextId(bands), texts: { ...band.texts, name: '', [FILL_KEY]: '' } });
}

function addShape({ yarns }: TypedPiece, band: TypedBand): TypedBand {
  const ground = textOf(band.texts, 'yarn');
  const other = yarns.find(({ id }) => String(id) !== ground) ?? yarns[0];
  const texts = { shape: 'triangle', yarn: String(other?.id ?? ground) };
  return { ...band, shapes: [...band.shapes, { id: nextId(band.shapes), texts }] };
}

function addYarn(yarns: readonly TypedRow[]): readonly TypedRow[] {
  const last = yarns.at(-1);
  const by = last === undefined ? 'metresPer100g' : textOf(last.texts, 'by');
  return [...yarns, { id: nextId(yarns), texts: { role: '', by, colour: DYES[(yarns.length + DYES.length - 1) % DYES.length] ?? DYES[0] } }];
}

/** Place of the band that hands go on with after the act; null where it is about none. */
export function bandInHand(act: Act): number | null {
  switch (act.do) {
    case 'add-band':
      return act.after + 1;
    case 'copy-band':
    case 'later':
      return act.band + 1;
    case 'sooner':
      return Math.max(0, act.band - 1);
    case 'split-band':
    case 'add-shape':
    case 'take-out-shape':
      return act.band;
    case 'move-band':
      return act.to;
    default:
      return null;
  }
}

/** The form after the act; one that names a row that is not there changes nothing. */
export function changeTyped(typed: TypedPiece, act: Act): TypedPiece {
  const { bands, yarns } = typed;
  switch (act.do) {
    case 'look':
      return typed;
    case 'add-band':
      return { ...typed, bands: addBand(typed, act.after) };
    case 'copy-band':
      return { ...typed, bands: copyBand(bands, act.band) };
    case 'split-band': {
      const split = splitBand(typed, act.band);
      return split.ok ? split.typed : typed;
    }
    case 'take-out-band':
      return { ...typed, bands: without(bands, act.band) };
    case 'sooner':
      return { ...typed, bands: moved(bands, act.band, act.band - 1) };
    case 'later':
      return { ...typed, bands: moved(bands, act.band, act.band + 1) };
    case 'move-band':
      return act.to === act.band ? typed : { ...typed, bands: moved(bands, act.band, act.to) };
    case 'add-shape':
      return { ...typed, bands: changeBand(bands, act.band, (band) => addShape(typed, band)) };
    case 'take-out-shape':
      return { ...typed, bands: changeBand(bands, act.band, (band) => ({ ...band, shapes: without(band.shapes, act.shape) })) };
    case 'add-yarn':
      return { ...typed, yarns: addYarn(yarns) };
    case 'take-out-yarn':
      return { ...typed, yarns: without(yarns, act.yarn) };
  }
}

const BAND = /^bands\.(\d+)\.(?:shapes\.(\d+)\.)?(.+)$/;
const YARN = /^yarns\.(\d+)\.(.+)$/;
const WARP_YARN = 'warp.yarn.';

function typeRow<R extends TypedRow>(rows: readonly R[], index: number, key: string, text: string): readonly R[] {
  return rows.map((row, at) => (at === index ? { ...row, texts: { ...row.texts, [key]: text } } : row));
}

/** What a band of another technique wants to know begins with what is usual; what was typed for the old one is kept. */
function typeInBand(band: TypedBand, key: string, text: string, units: TypedPiece['units']): TypedBand {
  const texts: Texts = { ...band.texts, [key]: text };
  return { ...band, texts: key === 'technique' ? withStarters(texts, bandFields(text), units) : texts };
}

/** The form after `text` was typed into the field of this name. */
export function typeIn(typed: TypedPiece, field: string, text: string): TypedPiece {
  const [, band, shape, bandKey] = BAND.exec(field) ?? [];
  if (band !== undefined && bandKey !== undefined) {
    const change = (own: TypedBand): TypedBand =>
      shape === undefined ? typeInBand(own, bandKey, text, typed.units) : { ...own, shapes: typeRow(own.shapes, Number(shape), bandKey, text) };
    return { ...typed, bands: changeBand(typed.bands, Number(band), change) };
  }
  const [, yarn, yarnKey] = YARN.exec(field) ?? [];
  if (yarn !== undefined && yarnKey !== undefined) return { ...typed, yarns: typeRow(typed.yarns, Number(yarn), yarnKey, text) };
  if (field.startsWith(WARP_YARN)) return { ...typed, warpYarn: { ...typed.warpYarn, [field.slice(WARP_YARN.length)]: text } };
  return { ...typed, texts: { ...typed.texts, [field]: text } };
}
