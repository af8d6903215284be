import type { SeriesDetailsInput } from '#contracts/workroom.ts';
import { isCurrency } from '#core/money/currency.ts';
import { parsePrice } from '#core/money/parse-price.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { fieldError } from '#server/errors.ts';
import { ownSeries, requireRevision, withSeriesLocked } from './_own-series.ts';

/** Keeps title, words and price of a series. A changed price holds for those who begin to buy from now on. */
export async function saveSeriesDetails(ctx: Context, input: SeriesDetailsInput): Promise<void> {
  const known = await ownSeries(ctx, input.series);
  const priceMinor = priceOf(input);
  await withSeriesLocked(known, async (series) => {
    requireRevision(series.revision, input.revision);
    if (priceMinor === null && series.state === 'published') throw fieldError('price', 'This series is open to buyers, so it needs a price. 0 makes it free.');
    const priceChanged = series.priceMinor !== priceMinor || series.currency !== input.currency;
    const { title, summary, story, level, techniques, currency } = input;
    await series.update({ title, summary, story, level, techniques, currency, priceMinor, revision: series.revision + 1 });
    if (priceChanged) await audit(ctx, 'change-price', { kind: 'series', id: series.publicId }, { priceMinor, currency });
  });
}

function priceOf({ price, currency }: SeriesDetailsInput): number | null {
  if (!isCurrency(currency)) throw fieldError('currency', 'This currency does not work here yet.');
  if (price === '') return null;
  const parsed = parsePrice(price, currency);
  if (!parsed.ok) throw fieldError('price', parsed.problems[0]?.message ?? 'This is no price. Write it like 68.00.');
  return parsed.value.amountMinor;
}
