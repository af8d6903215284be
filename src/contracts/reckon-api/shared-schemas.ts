/** What plans of several crafts tell alike. */
import { closed, count, list, mm, ref, text, type Schema } from '#contracts/reckon-api/schema.ts';

export const BOUGHT = {
  netMm: mm('What the work takes.'),
  withMarginMm: mm('What to have in hand.'),
  massG: mm('Grams of the net length.'),
  balls: count('Whole balls; only where a ball was told.'),
} as const;

/** What every plan tells. */
export const EVERY_PLAN = {
  massG: mm('Grams of the finished thing.'),
  hours: closed('Of work, as hands differ.', { likely: mm('Likely.'), low: mm('Quick hands.'), high: mm('Slow hands.') }),
  warnings: ref('Warnings'),
} as const;

export const CAUTIONS = list('To be read before beginning.', ref('Caution'));

export const SHARED_SCHEMAS: Readonly<Record<string, Schema>> = {
  WarpPlan: closed('Yarn or cord of one role.', BOUGHT, ['balls']),
  Caution: closed('General information; local rules and qualified people go before it.', {
    title: text('What it is about.'),
    says: text('A few sentences.'),
    more: closed('Where there is more.', { href: text('Address.'), label: text('What stands there.') }),
  }, ['more']),
};
