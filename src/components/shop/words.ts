/** What a series at the shop front says of itself. */
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { CRAFT_NAMES, CRAFTS } from '#core/craft/crafts.ts';
import { isCurrency, type Currency } from '#core/money/currency.ts';
import { formatPrice } from '#core/money/format-price.ts';
import { likelyHours } from '#core/series/hours-words.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { LEVEL_WORDS } from '#components/series/words.ts';
import { HOURS, LEVELS, LOOMS, PRICES } from '#contracts/shop.ts';
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

/** The choices of each filter; what no open series has is not offered, but for what was chosen already. */
export function choicesOf(choices: ShopChoices, chosen: { readonly craft?: string | undefined; readonly technique?: string | undefined }): Record<'craft' | 'technique' | 'loom' | 'hours' | 'level' | 'price', readonly Choice[]> {
  const techniques = chosen.technique === undefined || choices.techniques.includes(chosen.technique) ? choices.techniques : [...choices.techniques, chosen.technique];
  return {
    craft: [any('Any craft'), ...CRAFT_NAMES.filter((value) => choices.crafts.includes(value) || value === chosen.craft).map((value) => ({ value, label: CRAFTS[value].words.label }))],
    technique: [any('Any'), ...techniques.map((value) => ({ value, label: value }))],
    loom: [any('Any loom'), ...LOOMS.map((value) => ({ value, label: value === 'none' ? 'No loom' : `${value}\u00a0cm inside` }))],
    hours: [any('Any'), ...HOURS.map((value) => ({ value, label: `Up to ${value}` }))],
    level: [any('Any level'), ...LEVELS.map((value) => ({ value, label: LEVEL_WORDS[value] }))],
    price: [any('Any price'), ...PRICES.map((value) => ({ value, label: priceChoice(value, choices.currency) }))],
  };
}

function priceChoice(value: string, currency: string | null): string {
  if (value === '0') return 'Free';
  return currency === null || !isCurrency(currency) ? `Up to ${value}` : `Up to ${inWholes(Number(value), currency)}`;
}

const inWholes = (amount: number, currency: Currency): string => formatPrice({ amountMinor: amount * 100, currency }).replace(/\.00$/, '');
