/** What a student has of a yarn already, as she told it. */
import { amountText } from '#core/units/format-amount.ts';
import { lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import { parseLength } from '#core/units/parse-length.ts';
import { parseMass } from '#core/units/parse-mass.ts';
import { readTypedNumber } from '#core/units/typed-number.ts';
import type { Units } from '#core/units/units.ts';

/** Grams, millimetres, or balls of the put-up her list reckons with. */
export interface Stash {
  readonly amount: number;
  readonly unit: 'g' | 'mm' | 'balls';
}

export type ReadStash = { readonly ok: true; readonly stash: Stash | null } | { readonly ok: false; readonly reason: string };

const BALLS = /^(?<number>[\d.,/ -]+?) ?(?:balls?|skeins?|hanks?|cones?)$/i;
const HAS_LENGTH = /[\d ](?:mm|cm|m|metres?|meters?|yd|yds|yards?|ft|in)$/i;
/** More than anybody has at home, in each unit. */
const MOST: Readonly<Record<Stash['unit'], number>> = { g: 50_000, mm: 100_000_000, balls: 500 };
const HOW = 'Write what you have like 40 g, 120 m, 2 oz, 130 yd or 1.5 balls.';

/** Reads `40 g`, `120 m`, `2 oz`, `130 yd`, `1.5 balls`, `2 skeins`; nothing typed or none means that she has none. */
export function readStash(typed: string): ReadStash {
  const text = typed.trim().replace(/\s+/g, ' ');
  if (text === '') return { ok: true, stash: null };
  const stash = stashOf(text);
  if (typeof stash === 'string') return { ok: false, reason: stash };
  if (stash.amount > MOST[stash.unit]) return { ok: false, reason: 'That is more than can be counted here. Is the unit right?' };
  return { ok: true, stash: stash.amount === 0 ? null : stash };
}

function stashOf(text: string): Stash | string {
  const balls = BALLS.exec(text)?.groups?.['number'];
  if (balls !== undefined) {
    const amount = readTypedNumber(balls, HOW);
    return typeof amount === 'string' ? HOW : { amount, unit: 'balls' };
  }
  // A bare number says nothing: grams and metres are both usual.
  if (!/[a-z]$/i.test(text)) return HOW;
  if (HAS_LENGTH.test(text)) {
    const length = parseLength(text.replace(/(?:metres?|meters?)$/i, 'm').replace(/(?:yds|yards?)$/i, 'yd'), 'm');
    return length.ok ? { amount: length.mm, unit: 'mm' } : HOW;
  }
  const mass = parseMass(text.replace(/grams?$/i, 'g'), 'g');
  return mass.ok ? { amount: mass.grams, unit: 'g' } : HOW;
}

/** As she would type it: `120 m`, `1.5 balls`. */
export function stashWords({ amount, unit }: Stash, units: Units): string {
  if (unit === 'balls') return `${String(Math.round(amount * 100) / 100)} ${amount === 1 ? 'ball' : 'balls'}`;
  return amountText(unit === 'g' ? massOf(amount) : lengthOf(amount, 'yarn'), units).replaceAll('\u00a0', ' ');
}
