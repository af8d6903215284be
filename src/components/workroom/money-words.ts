import { isCurrency } from '#core/money/currency.ts';
import { formatPrice } from '#core/money/format-price.ts';

/** An amount of the ledger; one whose currency the house no longer knows is shown as it was written. */
export const moneyWords = (amountMinor: number, currency: string): string => (isCurrency(currency) ? formatPrice({ amountMinor, currency }) : `${String(amountMinor)} ${currency}`);
