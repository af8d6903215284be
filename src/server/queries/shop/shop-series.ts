/** The series that are open, as they hang at the shop front: found by what a visitor wishes, newest first. */
import { QueryTypes } from 'sequelize';
import { CRAFT_NAMES, CRAFTS, type CraftName } from '#core/craft/crafts.ts';
import { CURRENCIES, isCurrency, minorDigits } from '#core/money/currency.ts';
import type { ShopWishes } from '#contracts/shop.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { pieceFacts, type PieceFacts } from './piece-facts.ts';

export interface ShopSeries {
  readonly slug: string;
  readonly title: string;
  readonly summary: string;
  readonly craft: CraftName;
  readonly level: 'beginner' | 'some-practice' | 'sure-hand';
  readonly priceMinor: number | null;
  readonly currency: string;
  readonly teacherName: string;
  readonly handle: string;
  /** Titles of the published parts, in order. */
  readonly parts: readonly string[];
  readonly minutes: number;
  /** Null while the piece is not described. */
  readonly piece: PieceFacts | null;
}

/** What there is to choose from among all open series. */
export interface ShopChoices {
  readonly open: number;
  readonly crafts: readonly string[];
  readonly techniques: readonly string[];
  readonly levels: readonly string[];
  /** When all prices are in one currency. */
  readonly currency: string | null;
}

export interface ShopPage {
  readonly series: readonly ShopSeries[];
  readonly total: number;
  readonly page: number;
  readonly pages: number;
  readonly choices: ShopChoices;
}

/** Two rails of five. */
export const SHOP_PAGE_LENGTH = 10;
const MOST_WORDS = 6;

interface Row extends Omit<ShopSeries, 'parts' | 'piece'> { readonly id: number; readonly revision: number | null }
interface ChoiceRow { readonly craft: string; readonly level: string; readonly currency: string; readonly techniques: readonly string[] }
interface PartRow { readonly seriesId: number; readonly title: string }

const ROWS = `
  SELECT s.id, s.slug, s.title, s.summary, s.craft, s.level, s.price_minor AS priceMinor, s.currency, u.name AS teacherName, w.handle, p.revision,
         (SELECT CAST(COALESCE(SUM(l.minutes), 0) AS SIGNED) FROM lessons l WHERE l.series_id = s.id AND l.taken_out_at IS NULL AND l.published_version_id IS NOT NULL) AS minutes
    FROM series s
    JOIN workrooms w ON w.id = s.workroom_id
    JOIN users u ON u.id = w.owner_id
    LEFT JOIN pieces p ON p.series_id = s.id
   WHERE s.state = 'published'`;
const ORDER = ' ORDER BY s.published_at DESC, s.id DESC';

/** Our own words, none of which holds a quote. */
const CRAFT_SEARCH = CRAFT_NAMES.map((name) => `WHEN '${name}' THEN '${CRAFTS[name].words.search}'`).join(' ');

/** What a word is looked for in, without regard to case and accents. */
const HAYSTACK = `CONVERT(CONCAT_WS(' ', s.title, s.summary, s.story, s.techniques, u.name, w.name,
  CASE s.craft ${CRAFT_SEARCH} ELSE '' END) USING utf8mb4) COLLATE utf8mb4_unicode_520_ci`;

/** Minor units in one unit of a row's own currency: all currencies of the house have two digits or none. */
const WHOLE = CURRENCIES.filter((currency) => minorDigits(currency) === 0).map((currency) => `'${currency}'`).join(',');
const MINOR_UNITS = `IF(s.currency IN (${WHOLE}), 1, 100)`;

/** Four statements at most, whatever is wished for. `page` beyond the last gives the last. */
export async function shopSeries(wishes: ShopWishes, page = 1): Promise<ShopPage> {
  const { where, values } = wished(wishes);
  const rows = await sequelize.query<Row>(`${ROWS}${where}${ORDER}`, { replacements: values, type: QueryTypes.SELECT });
  const matching = await byFigures(rows, wishes);
  const pages = Math.max(1, Math.ceil(matching.length / SHOP_PAGE_LENGTH));
  const at = Math.min(Math.max(1, page), pages);
  const shown = await present(matching.slice((at - 1) * SHOP_PAGE_LENGTH, at * SHOP_PAGE_LENGTH));
  return { series: shown, total: matching.length, page: at, pages, choices: await choices() };
}

/** All open series of one workroom. */
export async function workroomSeries(workroomId: number): Promise<readonly ShopSeries[]> {
  const rows = await sequelize.query<Row>(`${ROWS} AND s.workroom_id = ?${ORDER} LIMIT 100`, { replacements: [workroomId], type: QueryTypes.SELECT });
  return present(rows);
}

/** What the database can judge: words, craft, technique, level, price. */
function wished({ q, craft, technique, level, price }: ShopWishes): { where: string; values: unknown[] } {
  const words = (q ?? '').split(/\s+/u).filter((word) => word !== '').slice(0, MOST_WORDS);
  const clauses: [clause: string, value: unknown][] = words.map((word) => [`${HAYSTACK} LIKE ?`, `%${word.replace(/[\\%_]/g, '\\$&')}%`]);
  if (craft !== undefined) clauses.push(['s.craft = ?', craft]);
  if (technique !== undefined) clauses.push(['JSON_CONTAINS(s.techniques, JSON_QUOTE(?))', technique]);
  if (level !== undefined) clauses.push(['s.level = ?', level]);
  if (price !== undefined) clauses.push([`s.price_minor <= ? * ${MINOR_UNITS}`, Number(price)]);
  return { where: clauses.map(([clause]) => ` AND ${clause}`).join(''), values: clauses.map(([, value]) => value) };
}

/** What only the plan knows: hours, and how wide a loom must be. */
async function byFigures(rows: readonly Row[], { hours, loom }: ShopWishes): Promise<readonly Row[]> {
  if (hours === undefined && loom === undefined) return rows;
  const facts = await pieceFacts(rows);
  return rows.filter((row) => {
    const figures = facts.get(row.id)?.figures;
    const isShort = hours === undefined || (figures?.hours.likely ?? row.minutes / 60) <= Number(hours);
    if (loom === undefined) return isShort;
    const insideMm = figures?.loomInsideMm;
    if (loom === 'none') return isShort && (figures === undefined ? row.craft !== 'frame-loom' : insideMm === undefined);
    return isShort && insideMm !== undefined && insideMm <= Number(loom) * 10;
  });
}

async function present(rows: readonly Row[]): Promise<readonly ShopSeries[]> {
  if (rows.length === 0) return [];
  const facts = await pieceFacts(rows);
  const parts = await sequelize.query<PartRow>(
    'SELECT series_id AS seriesId, title FROM lessons WHERE series_id IN (:ids) AND taken_out_at IS NULL AND published_version_id IS NOT NULL ORDER BY position, id',
    { replacements: { ids: rows.map(({ id }) => id) }, type: QueryTypes.SELECT },
  );
  return rows.map(({ id, revision: _revision, ...row }) => ({
    ...row,
    parts: parts.filter(({ seriesId }) => seriesId === id).map(({ title }) => title),
    piece: facts.get(id) ?? null,
  }));
}

async function choices(): Promise<ShopChoices> {
  const rows = await sequelize.query<ChoiceRow>("SELECT craft, level, currency, techniques FROM series WHERE state = 'published'", { type: QueryTypes.SELECT });
  const all = (words: readonly string[]): string[] => [...new Set(words)].sort((a, b) => a.localeCompare(b, 'en'));
  const [currency, ...others] = all(rows.map((row) => row.currency));
  return {
    open: rows.length,
    crafts: all(rows.map(({ craft }) => craft)),
    techniques: all(rows.flatMap(({ techniques }) => techniques)),
    levels: all(rows.map(({ level }) => level)),
    currency: others.length === 0 && currency !== undefined && isCurrency(currency) ? currency : null,
  };
}
