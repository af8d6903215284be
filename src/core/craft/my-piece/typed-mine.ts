/**
 * A student's own making as it stands in the fields of a form: nothing but text, so that a slip is shown again as it
 * was typed. Fields are called `insideWidthMm`, `endsTogether`, `yarns.<role>.grist` …
 */
import type { MyPiece } from '#core/craft/fit.ts';
import { bandKey } from '#core/craft/fitting/way.ts';
import { WAY_IDS, wayIdOf, type WayId } from '#core/craft/fitting/ways-to-fit.ts';
import type { FrameLoomPiece, Yarn } from '#core/craft/piece.ts';
import { fieldText, readText } from '#core/craft/piece-form/field-text.ts';
import { DEFAULT_KIND } from '#core/craft/looms/looms.ts';
import { textOf, type Texts } from '#core/craft/piece-form/typed-piece.ts';
import { gristTexts, textsOf } from '#core/craft/piece-form/type-piece.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { tryOnLoom } from '#core/trial/try-on-loom.ts';
import type { TypedLoom } from '#core/trial/typed-loom.ts';
import type { Units } from '#core/units/units.ts';
import { AS_PATTERN, CHOICES, ENDS, LEAVE_OUT, LENGTHS, NAIL_PITCH, INSIDE_WIDTH, LOOM_KIND, NAIL_ROWS, WARP_YARN, WARPING, WAY_KEY, WIDTH, YARN_KEYS, YARN_TEXTS } from './asked-of-mine.ts';
import { LOOM_NAME, loomTexts, type OwnLoom } from './own-loom.ts';
import { typeWoven, wovenAsked, wovenTexts } from './typed-woven.ts';

export interface TypedMine {
  /** Those of lengths that name no unit themselves. */
  readonly units: Units;
  readonly texts: Texts;
  readonly warpYarn: Texts;
  /** By role of the pattern, in its order. */
  readonly yarns: Readonly<Record<string, Texts>>;
}

export const yarnOf = (typed: TypedMine, role: string): Texts => (Object.hasOwn(typed.yarns, role) ? (typed.yarns[role] ?? {}) : {});
export const isOwnYarn = (texts: Texts): boolean => !['', AS_PATTERN].includes(textOf(texts, 'by'));

/** Names of the fields in which bands are left out, in the order of the pattern's bands. */
export const leaveOutNames = (pattern: FrameLoomPiece): readonly string[] => pattern.bands.map((band, index) => `${LEAVE_OUT}${bandKey(band, index)}`);

/** The way she chose; the pattern as it is where she chose none. */
export function wayOf(typed: TypedMine): WayId {
  const text = textOf(typed.texts, WAY_KEY);
  return WAY_IDS.find((id) => id === text) ?? 'as-it-is';
}

/** Keys of the bands she ticked to be left out. */
export function leftOutBy(typed: TypedMine, pattern: FrameLoomPiece): readonly string[] {
  return leaveOutNames(pattern).filter((name) => textOf(typed.texts, name) === 'yes').map((name) => name.slice(LEAVE_OUT.length));
}

function wayTexts({ way }: MyPiece): Texts {
  const leftOut = way?.kind === 'fewer-bands' && way.from === undefined ? way.leaveOut : [];
  return { [WAY_KEY]: wayIdOf(way), ...Object.fromEntries(leftOut.map((key) => [`${LEAVE_OUT}${key}`, 'yes'])) };
}

function yarnTexts(own: Yarn | undefined, pattern: Yarn, units: Units): Texts {
  // Until she says otherwise, her yarn is as many strands of the same colour.
  if (own === undefined) return { by: AS_PATTERN, colour: pattern.colour ?? '', strands: pattern.strands === undefined ? '' : String(pattern.strands) };
  return { ...textsOf(own, YARN_TEXTS, units), ...gristTexts(own) };
}

/** What she kept, in the words and units of her form. */
export function typeMine(mine: MyPiece, pattern: FrameLoomPiece, units: Units, woven: WovenSoFar = NOTHING_WOVEN): TypedMine {
  const kept: Readonly<Record<string, unknown>> = { ...mine.loom, widthMm: mine.widthMm };
  return {
    units,
    texts: {
      ...Object.fromEntries(LENGTHS.map((asked) => [asked.key, fieldText(kept[asked.key], asked, units)])),
      // What is chosen is always one of the options; where she chose nothing it is the pattern's.
      kind: fieldText(mine.loom?.kind ?? pattern.loom.kind ?? DEFAULT_KIND, LOOM_KIND, units),
      nailRows: fieldText(mine.loom?.nailRows ?? pattern.loom.nailRows ?? 'both', NAIL_ROWS, units),
      warping: fieldText(mine.loom?.warping ?? pattern.loom.warping, WARPING, units),
      endsTogether: fieldText(mine.endsTogether ?? pattern.warp.endsTogether ?? 1, ENDS, units),
      ...wayTexts(mine),
      ...typeWoven(woven, pattern, units),
    },
    warpYarn: yarnTexts(mine.warpYarn, pattern.warp.yarn, units),
    yarns: Object.fromEntries(Object.entries(pattern.yarns).map(([role, yarn]) => [role, yarnTexts(mine.yarns?.[role], yarn, units)])),
  };
}

const MOST_TYPED = 200;

/** The form as it was sent; what is missing is empty. `ask` gives the text under a name. */
export function mineOfFields(ask: (name: string) => string | undefined, pattern: FrameLoomPiece): TypedMine {
  const text = (name: string): string => (ask(name) ?? '').slice(0, MOST_TYPED);
  const yarn = (prefix: string): Texts => Object.fromEntries(YARN_KEYS.map((key) => [key, text(`${prefix}${key}`)]));
  const typed: TypedMine = {
    units: ask('shown') === 'in' ? 'in' : 'cm',
    texts: Object.fromEntries([...[...LENGTHS, ...CHOICES].map(({ key }) => key), LOOM_NAME, WAY_KEY, ...leaveOutNames(pattern), ...wovenAsked(pattern).map(({ key }) => key)].map((key) => [key, text(key)])),
    warpYarn: yarn(WARP_YARN),
    yarns: Object.fromEntries(Object.keys(pattern.yarns).map((role) => [role, yarn(`yarns.${role}.`)])),
  };
  // Without script she chooses other units and sends the form in one go; what she typed belongs to what she saw.
  return inOtherUnits(typed, ask('units') === 'in' ? 'in' : 'cm');
}

/** The same measures typed in other units; what cannot be read stays as it was typed. */
export function inOtherUnits(typed: TypedMine, units: Units): TypedMine {
  if (typed.units === units) return typed;
  const measures = [...LENGTHS, ...wovenAsked(typed)];
  const texts = Object.fromEntries(measures.map((asked) => {
    const text = textOf(typed.texts, asked.key);
    const read = readText(text, asked, typed.units);
    return [asked.key, read.ok ? fieldText(read.value, asked, units) : text];
  }));
  return { ...typed, units, texts: { ...typed.texts, ...texts } };
}

/** With a loom of her list in its fields. */
export function withLoom(typed: TypedMine, loom: OwnLoom): TypedMine {
  return { ...typed, texts: { ...typed.texts, ...loomTexts(loom, typed.units) } };
}

/** With the loom she tried the pattern on before she had a seat. */
export function withTriedLoom(typed: TypedMine, loom: TypedLoom, pattern: FrameLoomPiece): TypedMine {
  const tried = tryOnLoom(pattern, '', loom);
  const narrower = loom.narrower && tried.ok && tried.fits ? tried.mine.widthMm : undefined;
  const texts = {
    ...typed.texts,
    [INSIDE_WIDTH.key]: loom.inside,
    [NAIL_PITCH.key]: loom.spacing,
    [ENDS.key]: String(loom.ends),
    ...(narrower === undefined ? {} : { [WIDTH.key]: fieldText(narrower, WIDTH, loom.units) }),
  };
  return { ...inOtherUnits(typed, loom.units), texts: { ...inOtherUnits(typed, loom.units).texts, ...texts } };
}

/** Everything as the pattern has it; what is woven stays woven. */
export function asPattern(typed: TypedMine, pattern: FrameLoomPiece): TypedMine {
  const { texts, ...plain } = typeMine({}, pattern, typed.units);
  return { ...plain, texts: { ...texts, ...wovenTexts(typed) } };
}
