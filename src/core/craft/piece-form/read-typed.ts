/** From the texts of a form to a piece, and what in them cannot be read. */
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { texFromWraps } from '#core/craft/yarn/diameter.ts';
import type { Units } from '#core/units/units.ts';
import type { Asked } from './asked.ts';
import { BAND_NAME, bandFields, FILL_KEY, SHAPE, shapeFields, TECHNIQUE } from './asked-of-band.ts';
import { ASKED_ONCE, askedOfMode, BEAT_BY, FIRMNESS, FIXING, FRINGE, fringeAsked, HANGING, hasTwoRows, NAIL_ROWS, OF_MODE, OWN_BEAT, SWATCH_BEAT } from './asked-of-piece.ts';
import { ASHENHURST, BALL, BY, gristAsked, ROLE, WRAPS, YARN_TRAITS } from './asked-of-yarn.ts';
import { missingSays, readText, type ReadText } from './field-text.ts';
import { textOf, type Texts, type TypedBand, type TypedPiece, type TypedRow } from './typed-piece.ts';

/** What cannot be read of a field, by the name of the field (`field-names.ts`). */
export interface Fault {
  readonly says: string;
  /** Nothing was typed where something must stand; or something that cannot be read. */
  readonly kind: 'missing' | 'unreadable';
}

export interface ReadTyped {
  /** To be planned as it is: it may have gaps where `faults` says why. */
  readonly piece: unknown;
  readonly faults: ReadonlyMap<string, Fault>;
}

type Group = Record<string, unknown>;

/** Reading goes on after a slip, so that all of them are told at once. */
class Reading {
  readonly faults = new Map<string, Fault>();

  constructor(readonly units: Units) {}

  slip(field: string, says: string, kind: Fault['kind'] = 'unreadable'): void {
    if (!this.faults.has(field)) this.faults.set(field, { says, kind });
  }

  value(texts: Texts, asked: Asked, prefix: string): (ReadText & { readonly ok: true })['value'] | undefined {
    const text = textOf(texts, asked.key);
    const field = `${prefix}${asked.key}`;
    if (text.trim() === '') {
      if (asked.needed === true) this.slip(field, missingSays(asked, this.units), 'missing');
      return undefined;
    }
    const read = readText(text, asked, this.units);
    if (read.ok) return read.value;
    this.slip(field, read.says);
    return undefined;
  }

  /** Puts what is asked into `group`, each at its dotted key; what is empty stays away. */
  fill(group: Group, texts: Texts, asked: readonly Asked[], prefix: string): Group {
    for (const one of asked) {
      const value = this.value(texts, one, prefix);
      if (value !== undefined) putAt(group, one.key, value);
    }
    return group;
  }
}

/** Values that belong together: once one is given, those of `keys` are needed. */
function together(texts: Texts, asked: readonly Asked[], ...keys: readonly string[]): readonly Asked[] {
  if (asked.every(({ key }) => textOf(texts, key).trim() === '')) return asked;
  return asked.map((one) => (keys.includes(one.key) ? { ...one, needed: true } : one));
}

function putAt(group: Group, key: string, value: unknown): void {
  const dot = key.indexOf('.');
  if (dot < 0) {
    group[key] = value;
    return;
  }
  const inner: Group = {};
  const name = key.slice(0, dot);
  const there = group[name];
  if (typeof there === 'object' && there !== null) Object.assign(inner, there);
  putAt(inner, key.slice(dot + 1), value);
  group[name] = inner;
}

/** Wraps alone tell the weight roughly: no more figures than they are worth. */
const texOfWraps = (wraps: number, k: number): number => Number(texFromWraps(wraps, k).toPrecision(3));

function readGrist(reading: Reading, texts: Texts, prefix: string, usualK: number): Group {
  const by = reading.value(texts, BY, prefix);
  if (typeof by !== 'string') return {};
  if (by === 'wraps') {
    const wraps = reading.value(texts, { ...WRAPS, needed: true }, prefix);
    const k = reading.value(texts, ASHENHURST, prefix);
    if (typeof wraps !== 'number' || wraps <= 0) return {};
    return { tex: texOfWraps(wraps, typeof k === 'number' && k > 0 ? k : usualK) };
  }
  const grist = reading.value(texts, gristAsked(by), prefix);
  if (grist === undefined) return {};
  return by === 'tex' || by === 'metresPer100g' || by === 'class' ? { [by]: grist } : { count: { text: grist, system: by } };
}

function readYarn(reading: Reading, texts: Texts, prefix: string, usualK: number): Group {
  const traits = [...YARN_TRAITS, ...together(texts, BALL, 'ball.metres', 'ball.grams')];
  return { ...reading.fill({}, texts, traits, prefix), ...readGrist(reading, texts, prefix, usualK) };
}

/** Roles by id of their yarn, each role once. */
function readYarns(reading: Reading, rows: readonly TypedRow[]): { readonly yarns: Group; readonly roleOf: ReadonlyMap<string, string> } {
  const yarns = new Map<string, Group>();
  const roleOf = new Map<string, string>();
  rows.forEach(({ id, texts }, index) => {
    const prefix = `yarns.${String(index)}.`;
    const role = reading.value(texts, ROLE, prefix);
    const yarn = readYarn(reading, texts, prefix, ASHENHURST_K.weft);
    if (typeof role !== 'string') return;
    if (yarns.has(role)) reading.slip(`${prefix}role`, `Another yarn is called ${role} already.`);
    yarns.set(role, yarn);
    roleOf.set(String(id), role);
  });
  return { yarns: Object.fromEntries(yarns), roleOf };
}

type RoleOf = ReadonlyMap<string, string>;

/** Ids of yarns become roles; one that is not there any more was not chosen. */
function withRoles(reading: Reading, group: Group, asked: readonly Asked[], roleOf: RoleOf, prefix: string): Group {
  for (const one of asked) {
    if (one.kind !== 'role' || group[one.key] === undefined) continue;
    const role = roleOf.get(String(group[one.key]));
    if (role === undefined) reading.slip(`${prefix}${one.key}`, missingSays(one, reading.units), 'missing');
    group[one.key] = role;
  }
  return group;
}

function readShape(reading: Reading, texts: Texts, prefix: string, roleOf: RoleOf): Group {
  const asked = [SHAPE, ...shapeFields(textOf(texts, 'shape'))];
  return withRoles(reading, reading.fill({}, texts, asked, prefix), asked, roleOf, prefix);
}

function readBand(reading: Reading, { texts, shapes }: TypedBand, prefix: string, roleOf: RoleOf): Group {
  const technique = textOf(texts, 'technique');
  const fills = technique === 'tabby' && textOf(texts, FILL_KEY) !== '';
  const asked = [TECHNIQUE, BAND_NAME, ...bandFields(technique).filter(({ key }) => !(fills && key === 'heightMm'))];
  const band = withRoles(reading, reading.fill({}, texts, asked, prefix), asked, roleOf, prefix);
  if (fills) band[FILL_KEY] = true;
  if (technique === 'loop-pile' && band['rodMm'] === undefined && band['loopMm'] === undefined) {
    reading.slip(`${prefix}rodMm`, 'Say how thick the rod is, or how high loops are drawn by hand.', 'missing');
  }
  if (technique === 'tabby' && shapes.length > 0) {
    band['shapes'] = shapes.map((shape, index) => readShape(reading, shape.texts, `${prefix}shapes.${String(index)}.`, roleOf));
  }
  return band;
}

/** Undefined for rows as close as the ends, which a piece says by having no beat. */
function readBeat(reading: Reading, texts: Texts): Group | undefined {
  const by = reading.value(texts, BEAT_BY, '');
  if (by === 'ends') return undefined;
  if (by === undefined) return {};
  if (by === 'comb' || by === 'firm' || by === 'rug') return { picksPerWeftDiameter: FIRMNESS[by] };
  const asked = by === 'swatch' ? SWATCH_BEAT : OWN_BEAT;
  const picks = reading.value(texts, asked, '');
  return picks === undefined ? {} : { [by === 'swatch' ? 'picksPerCm' : 'picksPerWeftDiameter']: picks };
}

/** Some fields belong to a choice that is made in others. */
function isAsked(asked: Asked, texts: Texts): boolean {
  if (asked === NAIL_ROWS) return hasTwoRows(texts);
  if (asked === FIXING) return textOf(texts, 'dowel.diameterMm').trim() !== '';
  if (OF_MODE.includes(asked)) return askedOfMode(texts).includes(asked);
  return !FRINGE.includes(asked) || fringeAsked(texts).includes(asked);
}

/** The piece these texts describe. What is empty and not needed is left to the reckoning's own defaults. */
export function readTyped({ units, texts, warpYarn, yarns: rows, bands }: TypedPiece): ReadTyped {
  const reading = new Reading(units);
  const piece: Group = { craft: 'frame-loom', size: {}, loom: {}, warp: {} };
  const askedOnce = ASKED_ONCE.filter((asked) => isAsked(asked, texts));
  reading.fill(piece, texts, [...askedOnce, ...together(texts, HANGING, 'dowel.diameterMm')], '');
  putAt(piece, 'warp.yarn', readYarn(reading, warpYarn, 'warp.yarn.', ASHENHURST_K.warp));
  const beat = readBeat(reading, texts);
  if (beat !== undefined) piece['beat'] = beat;
  const { yarns, roleOf } = readYarns(reading, rows);
  piece['yarns'] = yarns;
  piece['bands'] = bands.map((band, index) => readBand(reading, band, `bands.${String(index)}.`, roleOf));
  return { piece, faults: reading.faults };
}
