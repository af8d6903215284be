/** What a series at the shop front says of itself. */
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { CRAFT_NAMES, CRAFTS } from '#core/craft/crafts.ts';
import { isCurrency, type Currency } from '#core/money/currency.ts';
import { formatPrice } from '#core/money/format-price.ts';
import { likelyHours } from '#core/series/hours-words.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { LEVEL_WORDS } from '#components/series/words.ts';
import { HOURS, LEVELS, LOOMS, PRICES, type ShopWish, type ShopWishes } from '#contracts/shop.ts';
import type { NamedLoom } from '#core/craft/my-piece/own-loom.ts';
import type { ShopChoices, ShopSeries } from '#server/queries/shop/shop-series.ts';

/** `Frame loom from 45 cm`. */
export function needsWords({ craft, piece }: ShopSeries, units: Units): string {
  const { needs } = CRAFTS[craft].words;
  const insideMm = piece?.figures.loomInsideMm;
  return insideMm === undefined ? needs : `${needs} from ${amountText(lengthOf(insideMm, 'least'), units)} inside`;
}

/** `12½ h at the loom`; of a series without a plan, the length of its parts. */
export function hoursWords({ craft, piece, minutes }: ShopSeries): string {
  const hours = piece?.figures.hours ?? { likely: minutes / 60, low: minutes / 60, high: minutes / 60 };
  const text = likelyHours(hours).map((part) => part.text).join('');
  return `${text} ${CRAFTS[craft].words.hours}`;
}

export function priceWords({ priceMinor, currency }: ShopSeries): { price: string; after: string } {
  if (priceMinor === null || !isCurrency(currency)) return { price: 'No price yet', after: '' };
  if (priceMinor === 0) return { price: 'Free', after: 'a seat costs nothing' };
  return { price: formatPrice({ amountMinor: priceMinor, currency }), after: 'tax included' };
}

export interface Choice { readonly value: string; readonly label: string }

const any = (label: string): Choice => ({ value: '', label });

type Chooser = 'craft' | 'technique' | 'loom' | 'hours' | 'level' | 'price' | 'free' | 'sort';

/**
 * The choices of each filter; what no open series has is not offered, but for what was chosen already.
 * `looms` are a signed-in person's own, offered by their names before the usual widths.
 */
export function choicesOf(choices: ShopChoices, chosen: ShopWishes, { looms, units }: { readonly looms: readonly NamedLoom[]; readonly units: Units }): Record<Chooser, readonly Choice[]> {
  const techniques = chosen.technique === undefined || choices.techniques.includes(chosen.technique) ? choices.techniques : [...choices.techniques, chosen.technique];
  return {
    craft: [any('Any craft'), ...CRAFT_NAMES.filter((value) => choices.crafts.includes(value) || value === chosen.craft).map((value) => ({ value, label: CRAFTS[value].words.label }))],
    technique: [any('Any'), ...techniques.map((value) => ({ value, label: value }))],
    loom: loomChoices(chosen.loom, looms, units),
    hours: [any('Any'), ...HOURS.map((value) => ({ value, label: `Up to ${value}` }))],
    level: [any('Any level'), ...LEVELS.map((value) => ({ value, label: LEVEL_WORDS[value] }))],
    price: [any('Any price'), ...PRICES.map((value) => ({ value, label: priceChoice(value, choices.currency) }))],
    free: [any('All'), { value: 'part', label: 'A part is free to read' }],
    sort: [any((chosen.q ?? '') === '' ? 'Newest' : 'Nearest'), ...((chosen.q ?? '') === '' ? [] : [{ value: 'newest', label: 'Newest' }]), { value: 'title', label: 'By title' }, { value: 'hours', label: 'Shortest' }],
  };
}

const insideWords = (widthCm: number, units: Units): string => `${amountText(lengthOf(widthCm * 10, 'size'), units)} inside`;

/** Two looms of one width are one choice; a width that only the address names is offered too. */
function loomChoices(chosen: string | undefined, looms: readonly NamedLoom[], units: Units): readonly Choice[] {
  const widthOf = ({ loom }: NamedLoom): string => String(Math.round(loom.insideWidthMm) / 10);
  const widths = [...new Set(looms.map(widthOf))];
  const own = widths.map((value) => ({ value, label: `${looms.filter((loom) => widthOf(loom) === value).map(({ name }) => name).join(', ')}: ${insideWords(Number(value), units)}` }));
  const usual = LOOMS.filter((value) => !widths.includes(value)).map((value) => ({ value, label: value === 'none' ? 'No loom' : insideWords(Number(value), units) }));
  const known = [any('Any loom'), ...own, ...usual];
  return chosen === undefined || known.some(({ value }) => value === chosen) ? known : [...known, { value: chosen, label: insideWords(Number(chosen), units) }];
}

/** What giving up one wish is called, after `without`. */
export const WISH_WORDS = {
  q: 'the words', craft: 'the craft', technique: 'the technique', loom: 'your loom', hours: 'the hours', level: 'the level', price: 'the price', free: 'a part that is free to read',
} as const satisfies Record<ShopWish, string>;

function priceChoice(value: string, currency: string | null): string {
  if (value === '0') return 'Free';
  return currency === null || !isCurrency(currency) ? `Up to ${value}` : `Up to ${inWholes(Number(value), currency)}`;
}

const inWholes = (amount: number, currency: Currency): string => formatPrice({ amountMinor: amount * 100, currency }).replace(/\.00$/, '');
