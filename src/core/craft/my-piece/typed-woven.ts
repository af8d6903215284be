/** What is woven already as it stands in the fields of a form: nothing but text, like the rest of a student's form. */
import type { AskedMeasure } from '#core/craft/piece-form/asked.ts';
import { fieldText, readText } from '#core/craft/piece-form/field-text.ts';
import { textOf, type Texts } from '#core/craft/piece-form/typed-piece.ts';
import { isBegun, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { present } from '#core/craft/reading/present.ts';
import type { Units } from '#core/units/units.ts';
import { BANDS_DONE, HEIGHT, leftAsked, ROWS } from './asked-of-woven.ts';

interface WithYarns {
  readonly yarns: Readonly<Record<string, unknown>>;
}

interface WithTexts extends WithYarns {
  readonly units: Units;
  readonly texts: Texts;
}

/** Every field, for a pattern or a form with these yarn roles. */
export function wovenAsked({ yarns }: WithYarns): readonly AskedMeasure[] {
  return [BANDS_DONE, ROWS, HEIGHT, ...Object.keys(yarns).map(leftAsked)];
}

/** Only what is woven, of all that stands in the form. */
export function wovenTexts({ texts, yarns }: WithTexts): Texts {
  return Object.fromEntries(wovenAsked({ yarns }).map(({ key }) => [key, textOf(texts, key)]));
}

export function typeWoven({ bandsDone, rows, heightMm, leftG = {} }: WovenSoFar, { yarns }: WithYarns, units: Units): Texts {
  const left = Object.keys(yarns).map((role): [string, string] => {
    const asked = leftAsked(role);
    return [asked.key, fieldText(Object.hasOwn(leftG, role) ? leftG[role] : undefined, asked, units)];
  });
  return { [BANDS_DONE.key]: String(bandsDone), [ROWS.key]: fieldText(rows, ROWS, units), [HEIGHT.key]: fieldText(heightMm, HEIGHT, units), ...Object.fromEntries(left) };
}

const WEAVE_FIRST = 'Say above how far you are: which bands are finished, or how many rows are woven.';

/** What can be read of it; a sentence in `faults`, by field, for what cannot. Whether the piece has it is not asked here. */
export function readTypedWoven(typed: WithTexts, faults: Map<string, string>): WovenSoFar {
  const number = (asked: AskedMeasure): number | undefined => {
    const text = textOf(typed.texts, asked.key);
    if (text.trim() === '') return undefined;
    const read = readText(text, asked, typed.units);
    if (read.ok) return read.value;
    faults.set(asked.key, read.says);
    return undefined;
  };
  const left = Object.keys(typed.yarns).map((role) => [role, number(leftAsked(role))] as const).filter(([, grams]) => grams !== undefined);
  const woven: WovenSoFar = {
    bandsDone: number(BANDS_DONE) ?? 0,
    ...present({ rows: number(ROWS), heightMm: number(HEIGHT), leftG: left.length === 0 ? undefined : Object.fromEntries(left) as Readonly<Record<string, number>> }),
  };
  if ((woven.heightMm ?? 0) > 0 && !isBegun(woven) && !faults.has(ROWS.key)) faults.set(HEIGHT.key, WEAVE_FIRST);
  return woven;
}
