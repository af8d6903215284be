/** Lengths of time as people type them: `1 h 30`, `1:30`, `90 min`, `1,5`, `1 ½ h`. */
import { readTypedNumber, spellOut } from '#core/units/typed-number.ts';

export type ParsedTime = { readonly ok: true; readonly minutes: number } | { readonly ok: false; readonly reason: string };

const ONE_TIME = 'Write one time, like 1 h 30, 90 min or 1.5.';
const LONGEST_TEXT = 40;
const CLOCK = /^(?<hours>\d{1,4}) ?(?:h|:|hours?) ?(?<minutes>\d{1,2})(?: ?m(?:in(?:utes?)?)?)?$/i;
const ONE_UNIT = /^(?<number>[\d.,/ -]+?) ?(?<unit>[a-z]+)?\.?$/i;
const MINUTES_IN: Readonly<Record<string, number>> = { h: 60, hr: 60, hrs: 60, hour: 60, hours: 60, m: 1, min: 1, mins: 1, minute: 1, minutes: 1 };

const no = (reason: string): ParsedTime => ({ ok: false, reason });

/** Whole minutes; without a unit they are hours. The reason, when it cannot be read, is a sentence for who typed it. */
export function parseTime(typed: string): ParsedTime {
  const text = spellOut(typed);
  if (text === '') return no(`Type how long it was. ${ONE_TIME}`);
  if (text.length > LONGEST_TEXT) return no('That is too long for a time.');
  if (/^[-−–]/u.test(text)) return no('A time cannot be below 0.');
  const { hours, minutes } = CLOCK.exec(text)?.groups ?? {};
  if (hours !== undefined && minutes !== undefined) return Number(minutes) > 59 ? no('Between 0 and 59 minutes make up the rest of an hour.') : { ok: true, minutes: Number(hours) * 60 + Number(minutes) };
  const { number, unit = 'h' } = ONE_UNIT.exec(text)?.groups ?? {};
  if (number === undefined) return no(ONE_TIME);
  const perUnit = Object.hasOwn(MINUTES_IN, unit.toLowerCase()) ? MINUTES_IN[unit.toLowerCase()] : undefined;
  if (perUnit === undefined) return no(`“${unit}” is no unit we know. Write h or min.`);
  const value = readTypedNumber(number.trim(), ONE_TIME);
  return typeof value === 'string' ? no(value) : { ok: true, minutes: Math.round(value * perUnit) };
}
