/** What a visitor wishes for at the shop front. It comes in an address that anybody may type, so nonsense is no wish. */
import { z } from 'astro/zod';
import { CRAFT_NAMES } from '#core/craft/crafts.ts';

export const LEVELS = ['beginner', 'some-practice', 'sure-hand'] as const;
/** Inside widths of a frame to choose from, in centimetres; `none` is for who has no loom. An address may name any other width. */
export const LOOMS = ['none', '30', '40', '50', '60', '80'] as const;
/** At the loom, at most. */
export const HOURS = ['5', '10', '20', '40'] as const;
/** In whole units of the series' own currency, at most. */
export const PRICES = ['0', '25', '50', '100'] as const;
/** The nearest to the words come first where nothing else is wished, else the newest. */
export const SORTS = ['newest', 'title', 'hours'] as const;

const among = <const T extends readonly [string, ...string[]]>(words: T) => z.enum(words).optional().catch(undefined);

const Wishes = z.object({
  q: z.string().trim().transform((words) => words.slice(0, 80)).optional().catch(undefined),
  craft: among(CRAFT_NAMES),
  technique: z.string().trim().max(60).optional().catch(undefined),
  loom: z.string().regex(/^(?:none|[1-9]\d{1,2}(?:\.\d)?)$/).optional().catch(undefined),
  hours: among(HOURS),
  level: among(LEVELS),
  price: among(PRICES),
  /** With a part that can be read before paying. */
  free: among(['part']),
  sort: among(SORTS),
});

export type ShopWishes = z.output<typeof Wishes>;
/** A wish that leaves series out; the order is none. */
export type ShopWish = Exclude<keyof ShopWishes, 'sort'>;

/** The wishes somebody has, as the form names them. */
export function wishesIn(wishes: ShopWishes): ShopWish[] {
  const { sort: _sort, ...limiting } = wishes;
  return (Object.keys(limiting) as ShopWish[]).filter((name) => limiting[name] !== undefined && limiting[name] !== '');
}

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
