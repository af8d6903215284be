/**
 * Amounts as text for the eye, in the units a person chose. Values inside stay
 * unrounded: what is shown is never reckoned on.
 *
 * Metric: centimetres with one decimal below ten and none above, millimetres for fine
 * things, yarn in metres, grams. Imperial: inches in sixteenths, yards and ounces to a
 * tenth. Least sizes are rounded up to a millimetre or a sixteenth, cut lengths to 5 mm
 * or an eighth.
 */
import type { Input, LengthUse, Quantity } from '#core/craft/amounts/amount-types.ts';
import { ceilSafe, roundHalfUp, roundUpTo } from '#core/craft/rounding.ts';
import { inchesText, MM_PER_INCH, toInches, type Inches } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';

export type { Units } from '#core/units/units.ts';

/**
 * A stretch of an amount's text. Markup sets `fraction` with the font's fractions;
 * joining all `text` gives the plain words, spaces included.
 */
export interface AmountPart {
  readonly kind: 'number' | 'fraction' | 'unit' | 'text';
  readonly text: string;
}

const NO_BREAK = '\u00a0';
const THIN = '\u2009';
const THIN_NO_BREAK = '\u202f';
const MINUS = '\u2212';

const MM_PER_YARD = 914.4;
const GRAMS_PER_OUNCE = 28.349523125;

const number = (text: string): AmountPart => ({ kind: 'number', text });
const words = (text: string): AmountPart => ({ kind: 'text', text });

function withUnit(value: readonly AmountPart[], unit: string): AmountPart[] {
  return [...value, words(NO_BREAK), { kind: 'unit', text: unit }];
}

/** Rounded to so many decimals, halves up; a minus is a minus sign and trailing zeros fall away. */
function decimal(value: number, decimals: number): string {
  const scale = 10 ** decimals;
  const rounded = roundHalfUp(Math.abs(value) * scale) / scale;
  return `${value < 0 && rounded > 0 ? MINUS : ''}${String(rounded)}`;
}

/** One decimal below ten, none from ten on: as fine as it can be read off a rule. */
function readable(value: number): string {
  return decimal(value, roundHalfUp(value * 10) / 10 < 10 ? 1 : 0);
}

function inchParts({ whole, fraction }: Inches): AmountPart[] {
  if (fraction === undefined) return [number(String(whole))];
  const part: AmountPart = { kind: 'fraction', text: `${String(fraction.numerator)}/${String(fraction.denominator)}` };
  return whole === 0 ? [part] : [number(String(whole)), words(THIN), part];
}

interface Shown {
  readonly parts: readonly AmountPart[];
  readonly unit: string;
}

function metricLength(mm: number, use: LengthUse): Shown {
  switch (use) {
    case 'size':
      return { parts: [number(readable(mm / 10))], unit: 'cm' };
    case 'fine':
      return { parts: [number(readable(mm))], unit: 'mm' };
    case 'least':
      return { parts: [number(decimal(ceilSafe(mm) / 10, 1))], unit: 'cm' };
    case 'fine-least':
      return { parts: [number(String(ceilSafe(mm)))], unit: 'mm' };
    case 'cut':
      return { parts: [number(decimal(roundUpTo(mm, 5) / 10, 1))], unit: 'cm' };
    case 'yarn':
      return { parts: [number(readable(mm / 1000))], unit: 'm' };
  }
}

function imperialLength(mm: number, use: LengthUse): Shown {
  const inches = mm / MM_PER_INCH;
  switch (use) {
    case 'size':
    case 'fine':
      return { parts: inchParts(toInches(inches, 16, 'nearest')), unit: 'in' };
    case 'least':
    case 'fine-least':
      return { parts: inchParts(toInches(inches, 16, 'up')), unit: 'in' };
    case 'cut':
      return { parts: inchParts(toInches(inches, 8, 'up')), unit: 'in' };
    case 'yarn':
      return { parts: [number(decimal(mm / MM_PER_YARD, 1))], unit: 'yd' };
  }
}

const showLength = (mm: number, use: LengthUse, units: Units): Shown => (units === 'in' ? imperialLength(mm, use) : metricLength(mm, use));

function massParts(grams: number, units: Units): AmountPart[] {
  if (units === 'in') return withUnit([number(decimal(grams / GRAMS_PER_OUNCE, 1))], 'oz');
  if (roundHalfUp(grams) >= 1000) return withUnit([number(decimal(grams / 1000, 1))], 'kg');
  return withUnit([number(decimal(grams, grams < 1 ? 1 : 0))], 'g');
}

/** The likely time by itself: minutes below an hour, hours and tens of minutes below five, half hours from there on. */
export function formatHours(hours: number): AmountPart[] {
  const minutes = roundUpTo(hours * 60, 10);
  if (minutes < 60) return withUnit([number(String(minutes))], 'min');
  if (minutes >= 300) {
    const halves = roundHalfUp(hours * 2);
    return withUnit([number(`${String(Math.floor(halves / 2))}${halves % 2 === 1 ? '½' : ''}`)], 'h');
  }
  const rest = minutes % 60;
  const whole = withUnit([number(String(Math.floor(minutes / 60)))], 'h');
  return rest === 0 ? whole : [...whole, words(NO_BREAK), number(String(rest))];
}

/** Whole hours between which most hands lie: `3 to 12`. */
export function hoursRange(low: number, high: number): string {
  return `${String(Math.floor(low))} to ${String(Math.ceil(high))}`.replaceAll(' ', NO_BREAK);
}

/** Hands differ: the likely time comes with its range. */
function timeParts({ hours, low, high }: Extract<Quantity, { kind: 'time' }>): AmountPart[] {
  return [...formatHours(hours), words(` (${hoursRange(low, high)})`)];
}

function sizeParts({ widthMm, heightMm, use }: Extract<Quantity, { kind: 'size' }>, units: Units): AmountPart[] {
  const width = showLength(widthMm, use, units);
  const height = showLength(heightMm, use, units);
  return withUnit([...width.parts, words(`${NO_BREAK}×${NO_BREAK}`), ...height.parts], height.unit);
}

/** An amount, or anything that went into one. */
export function formatAmount(amount: Input, units: Units): AmountPart[] {
  switch (amount.kind) {
    case 'length': {
      const { parts, unit } = showLength(amount.mm, amount.use, units);
      return withUnit(parts, unit);
    }
    case 'mass':
      return massParts(amount.grams, units);
    case 'count':
      return withUnit([number(String(amount.count))], amount.count === 1 ? amount.one : amount.many);
    case 'time':
      return timeParts(amount);
    case 'size':
      return sizeParts(amount, units);
    case 'number': {
      const value = [number(decimal(amount.value, 2))];
      return amount.unit === undefined ? value : withUnit(value, amount.unit);
    }
    case 'share':
      return [number(decimal(amount.share * 100, 1)), words(THIN_NO_BREAK), { kind: 'unit', text: '%' }];
  }
}

/** The same as one string. */
export function amountText(amount: Input, units: Units): string {
  return formatAmount(amount, units)
    .map(({ text }) => text)
    .join('');
}

/** A bare length without unit, as `POST /api/reckon` gives it: `5 7/16`, or whole millimetres. Needs `mm` ≥ 0. */
export function lengthText(mm: number, system: 'imperial' | 'metric', round: 'nearest' | 'up'): string {
  if (system === 'imperial') return inchesText(toInches(mm / MM_PER_INCH, 16, round));
  return String(round === 'up' ? ceilSafe(mm) : roundHalfUp(mm));
}
