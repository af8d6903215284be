/** A gift card as somebody words it. It comes in an address and is kept nowhere; nonsense is an empty field. */
import { z } from 'astro/zod';

const words = (most: number) => z.string().trim().transform((text) => text.replace(/\s+/gu, ' ').slice(0, most)).catch('').default('');

const Gift = z.object({
  series: z.string().regex(/^[a-z0-9-]{1,64}$/).optional().catch(undefined),
  to: words(60),
  from: words(60),
  words: words(300),
});

export type GiftCard = z.output<typeof Gift>;

export const giftCardOf = (address: URLSearchParams): GiftCard => Gift.parse(Object.fromEntries(address));
