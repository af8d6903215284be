/** Letters about seats and money. */
import { DateTime } from 'luxon';
import { z } from 'astro/zod';
import { isCurrency } from '#core/money/currency.ts';
import { formatPrice } from '#core/money/format-price.ts';
import { defineTemplate } from '#server/mail/template.ts';

const GIVEN_UP = 'You asked that the parts open at once, and you know that by this you gave up the fourteen days in which you could have withdrawn.';
const MAY_WITHDRAW = 'You may withdraw within fourteen days and have your money back. Answer this letter, and say so.';

export const seatBought = defineTemplate({
  data: z.object({
    seriesTitle: z.string(),
    seriesSlug: z.string(),
    receiptNumber: z.number().int(),
    amountMinor: z.number().int(),
    currency: z.string(),
    paidAt: z.string(),
    timeZone: z.string(),
    withdrawalGivenUp: z.boolean(),
  }),
  write: (data, { publicUrl }) => ({
    subject: `Your seat in ${data.seriesTitle}`,
    blocks: [
      { kind: 'words', words: `Your seat in ${data.seriesTitle} is yours. Start with what to gather: every amount is reckoned for your own loom once you have told us its size.` },
      { kind: 'act', label: 'What to gather', href: `${publicUrl}/series/${data.seriesSlug}/gather` },
      {
        kind: 'rows',
        rows: [
          ['Receipt', String(data.receiptNumber)],
          ['For', `${data.seriesTitle}, one seat`],
          ['Paid, tax included', isCurrency(data.currency) ? formatPrice({ amountMinor: data.amountMinor, currency: data.currency }) : `${data.amountMinor} ${data.currency}`],
          ['When', DateTime.fromISO(data.paidAt, { zone: data.timeZone }).setLocale('en-GB').toFormat('d LLLL yyyy, HH:mm (z)')],
        ],
      },
      ...(data.amountMinor === 0 ? [] : [{ kind: 'words', words: data.withdrawalGivenUp ? GIVEN_UP : MAY_WITHDRAW } as const]),
    ],
  }),
});

export const seatRefused = defineTemplate({
  data: z.object({ seriesTitle: z.string(), seriesSlug: z.string() }),
  write: (data, { publicUrl }) => ({
    subject: `Your bank said no: ${data.seriesTitle}`,
    blocks: [
      { kind: 'words', words: `Your bank did not pay for your seat in ${data.seriesTitle}. Nothing was taken. Try another way of paying, or ask your bank.` },
      { kind: 'act', label: 'Take a seat', href: `${publicUrl}/series/${data.seriesSlug}` },
    ],
  }),
});
