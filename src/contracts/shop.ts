/** What a visitor wishes for at the shop front. It comes in an address that anybody may type, so nonsense is no wish. */
import { z } from 'astro/zod';
import { CRAFT_NAMES } from '#core/craft/crafts.ts';

export const LEVELS = ['beginner', 'some-practice', 'sure-hand'] as const;
/** Inside widths of a frame, in centimetres; `none` is for who has no loom. */
export const LOOMS = ['none', '30', '40', '50', '60', '80'] as const;
/** At the loom, at most. */
export const HOURS = ['5', '10', '20', '40'] as const;
/** In whole units of the series' own currency, at most. */
export const PRICES = ['0', '25', '50', '100'] as const;

const among = <const T extends readonly [string, ...string[]]>(words: T) => z.enum(words).optional().catch(undefined);

const Wishes = z.object({
  q: z.string().trim().transform((words) => words.slice(0, 80)).optional().catch(undefined),
  craft: among(CRAFT_NAMES),
  technique: z.string().trim().max(60).optional().catch(undefined),
  loom: among(LOOMS),
  hours: among(HOURS),
  level: among(LEVELS),
  price: among(PRICES),
});

export type ShopWishes = z.output<typeof Wishes>;

/** Wishes of an address, the empty ones left out. */
export function shopWishesOf(address: URLSearchParams): ShopWishes {
  return Wishes.parse(Object.fromEntries([...address].filter(([, value]) => value.trim() !== '')));
}

/** The address of the same wishes at page `page`. */
export function shopAddress(wishes: ShopWishes, page = 1): string {
  const fields = Object.entries(wishes).filter((field): field is [string, string] => typeof field[1] === 'string' && field[1] !== '');
  const query = new URLSearchParams(page > 1 ? [...fields, ['page', String(page)]] : fields).toString();
  return query === '' ? '/series' : `/series?${query}`;
}
