/**
 * Between a value of the piece and the text of its field. Nothing is lost by looking at a piece: a length that has no
 * plain text in the person's units is written with a unit of its own, and every text reads back to the very same number.
 */
import type { ShapePoint } from '#core/craft/piece.ts';
import { MM_PER_INCH, inchesText, toInches } from '#core/units/inches.ts';
import { parseLength, type LengthUnit } from '#core/units/parse-length.ts';
import { GRAMS_PER_OUNCE, parseMass } from '#core/units/parse-mass.ts';
import type { Units } from '#core/units/units.ts';
import type { Asked, AskedMeasure } from './asked.ts';

export type ReadText = { readonly ok: true; readonly value: string | number | boolean | readonly ShapePoint[] } | { readonly ok: false; readonly says: string };
/** Of a measure. */
export type ReadNumber = { readonly ok: true; readonly value: number } | { readonly ok: false; readonly says: string };
const no = (says: string): ReadText & { readonly ok: false } => ({ ok: false, says });

type LengthKind = 'length' | 'fine' | 'yarn' | 'lean';

const UNIT_OF: Readonly<Record<LengthKind, Readonly<Record<Units, LengthUnit>>>> = {
  length: { cm: 'cm', in: 'in' },
  lean: { cm: 'cm', in: 'in' },
  fine: { cm: 'mm', in: 'in' },
  yarn: { cm: 'm', in: 'yd' },
};

const MASS_UNIT_OF = { cm: 'g', in: 'oz' } as const satisfies Readonly<Record<Units, string>>;

/** The unit that stands in the field's box; undefined for words. */
export function fieldUnit(asked: Asked, units: Units): string | undefined {
  switch (asked.kind) {
    case 'length':
    case 'lean':
    case 'fine':
    case 'yarn':
      return UNIT_OF[asked.kind][units];
    case 'mass':
      return MASS_UNIT_OF[units];
    case 'points':
      return UNIT_OF.lean[units];
    case 'share':
      return '%';
    case 'number':
      return asked.unit;
    default:
      return undefined;
  }
}

const MM_IN: Readonly<Partial<Record<LengthUnit, number>>> = { mm: 1, cm: 10, m: 1000 };

/** `mm` ≥ 0, as short as it can be said exactly: in `unit` if it comes out even there, else with a unit of its own behind it. */
function lengthFieldText(mm: number, unit: LengthUnit): string {
  const says = (text: string): boolean => {
    const read = parseLength(text, unit);
    return read.ok && read.mm === mm;
  };
  const inches = inchesText(toInches(mm / MM_PER_INCH, 64, 'nearest'));
  const plain = unit === 'in' ? inches : decimalText(mm / (MM_IN[unit] ?? 914.4));
  const ways = [plain, ...(unit === 'in' || unit === 'yd' ? [`${decimalText(mm / 10)} cm`] : [`${inches} in`])];
  return ways.find(says) ?? `${String(mm)} mm`;
}

/** A length that may be below 0. */
const leanText = (mm: number, units: Units): string => `${mm < 0 ? '−' : ''}${lengthFieldText(Math.abs(mm), UNIT_OF.lean[units])}`;

/** As short as it can be said exactly: ounces that do not come out even are written as grams. */
function massText(grams: number, units: Units): string {
  if (units === 'cm') return String(grams);
  const ounces = decimalText(grams / GRAMS_PER_OUNCE);
  const read = parseMass(ounces, 'oz');
  return read.ok && read.grams === grams ? ounces : `${String(grams)} g`;
}

/** Without the tail of nines or noughts that a division leaves. */
const decimalText = (value: number): string => String(Number(value.toPrecision(12)));

/** Moves the point of a plain decimal text; per cent and share differ by nothing else. */
export function shiftPoint(text: string, places: number): string {
  const [whole = '', part = ''] = text.split('.');
  const at = whole.length + places;
  const digits = `${whole}${part}`;
  const padded = at < 1 ? digits.padStart(digits.length + 1 - at, '0') : digits.padEnd(at, '0');
  const point = Math.max(1, at);
  const shifted = `${padded.slice(0, point)}.${padded.slice(point)}`;
  return shifted.replace(/^0+(?=\d)/, '').replace(/\.?0*$/, '');
}

/** The text of a field for a value of the piece; '' for none, and for one of a kind that the field does not take. */
export function fieldText(value: unknown, asked: Asked, units: Units): string {
  if (asked.kind === 'choice') return asked.options.find((option) => option.value === value)?.text ?? '';
  if (typeof value === 'string') return asked.kind === 'text' ? value : '';
  if (Array.isArray(value)) return asked.kind === 'points' ? value.map((point: ShapePoint) => `${leanText(point.xMm, units)} : ${leanText(point.yMm, units)}`).join('; ') : '';
  if (typeof value !== 'number') return '';
  switch (asked.kind) {
    case 'length':
    case 'fine':
    case 'yarn':
      return lengthFieldText(value, UNIT_OF[asked.kind][units]);
    case 'lean':
      return leanText(value, units);
    case 'mass':
      return massText(value, units);
    case 'share':
      return shiftPoint(String(value), 2);
    default:
      return String(value);
  }
}

const NUMBER = /^[-−]?(?:\d+(?:[.,]\d+)?|[.,]\d+)(?:e[+-]?\d+)?$/i;

function readNumber(text: string): number | undefined {
  return NUMBER.test(text) ? Number(text.replace('−', '-').replace(',', '.')) : undefined;
}

const noNumber = (text: string, like: string): ReadText => no(`“${text.slice(0, 40)}” is no number. Write it like ${like}.`);

function readShare(text: string): ReadText {
  const plain = text.replace(/\s*%$/, '').replace(',', '.').replace('−', '-');
  if (!/^-?(?:\d+\.?\d*|\.\d+)$/.test(plain)) return noNumber(text, '2 or 2.5');
  const size = Number(shiftPoint(plain.replace('-', ''), -2));
  return { ok: true, value: plain.startsWith('-') ? -size : size };
}

function readLength(text: string, kind: LengthKind, units: Units): ReadNumber {
  const below = kind === 'lean' && /^[-−]/.test(text);
  const read = parseLength(below ? text.slice(1).trimStart() : text, UNIT_OF[kind][units]);
  if (!read.ok) return { ok: false, says: read.reason };
  return { ok: true, value: below && read.mm !== 0 ? -read.mm : read.mm };
}

function readMass(text: string, units: Units): ReadText {
  const read = parseMass(text, MASS_UNIT_OF[units]);
  return read.ok ? { ok: true, value: read.grams } : no(read.reason);
}

function readPoints(text: string, units: Units): ReadText {
  const points: ShapePoint[] = [];
  for (const pair of text.split(';').map((part) => part.trim()).filter((part) => part !== '')) {
    const [across = '', up = '', ...more] = pair.split(':').map((part) => part.trim());
    if (across === '' || up === '' || more.length > 0) return no(`“${pair.slice(0, 40)}” is no point. Write how far across, a colon, how far up: 12 : 4.5.`);
    const [x, y] = [readLength(across, 'lean', units), readLength(up, 'lean', units)];
    if (!x.ok) return x;
    if (!y.ok) return y;
    points.push({ xMm: x.value, yMm: y.value });
  }
  return { ok: true, value: points };
}

/** Reads a text that is not empty. The sentence, when it cannot be read, is for the person who typed it. */
export function readText(typed: string, asked: AskedMeasure, units: Units): ReadNumber;
export function readText(typed: string, asked: Asked, units: Units): ReadText;
export function readText(typed: string, asked: Asked, units: Units): ReadText {
  const text = typed.trim();
  switch (asked.kind) {
    case 'length':
    case 'fine':
    case 'yarn':
    case 'lean':
      return readLength(text, asked.kind, units);
    case 'mass':
      return readMass(text, units);
    case 'points':
      return readPoints(text, units);
    case 'share':
      return readShare(text);
    case 'number': {
      const value = readNumber(text);
      return value === undefined ? noNumber(text, '12 or 12.5') : { ok: true, value };
    }
    case 'choice': {
      const chosen = asked.options.find((option) => option.text === text);
      return chosen === undefined ? no('Choose one from the list.') : { ok: true, value: chosen.value };
    }
    case 'text':
    case 'role':
      return { ok: true, value: text };
  }
}

/** What to say of a needed field that is empty. */
export function missingSays(asked: Asked, units: Units): string {
  const name = asked.called ?? asked.label;
  switch (asked.kind) {
    case 'length':
    case 'fine':
    case 'yarn':
    case 'lean':
      return `${name} is missing. Type it in ${UNIT_OF[asked.kind][units]}.`;
    case 'mass':
      return `${name} is missing. Type it in ${MASS_UNIT_OF[units]}.`;
    case 'role':
      return `${name} is missing. Choose one of your yarns.`;
    case 'choice':
      return `${name}: choose one.`;
    default:
      return `${name} is missing.`;
  }
}
