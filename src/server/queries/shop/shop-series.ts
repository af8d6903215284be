/** The series that are open, as they hang at the shop front: found by what a visitor wishes, newest first unless she wishes else. */
import { QueryTypes } from 'sequelize';
import { CRAFT_NAMES, CRAFTS, type CraftName } from '#core/craft/crafts.ts';
import { CURRENCIES, isCurrency, minorDigits } from '#core/money/currency.ts';
import { meantBy, nearness, searchTerms } from '#core/series/search-words.ts';
import { wishesIn, type ShopWish, type ShopWishes } from '#contracts/shop.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { pieceFacts, type PieceFacts } from './piece-facts.ts';

export interface ShopSeries {
  readonly slug: string;
  readonly title: string;
  readonly summary: string;
  readonly craft: CraftName;
  readonly level: 'beginner' | 'some-practice' | 'sure-hand';
  readonly techniques: readonly string[];
  readonly priceMinor: number | null;
  readonly currency: string;
  readonly teacherName: string;
  readonly workroomName: string;
  readonly handle: string;
  /** Titles of the published parts, in order. */
  readonly parts: readonly string[];
  /** Number of the first part that can be read before paying; null where there is none. */
  readonly freePart: number | null;
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
  /** What was looked for in the place of words that no series has; null when it was what was typed. */
  readonly meant: string | null;
  /** Where nothing was found: which single wish to give up, and how many series that shows. */
  readonly giveUp: readonly { readonly wish: ShopWish; readonly total: number }[];
}

/** Two rails of five. */
export const SHOP_PAGE_LENGTH = 10;

interface Row extends Omit<ShopSeries, 'parts' | 'freePart' | 'piece'> { readonly id: number; readonly revision: number | null }
interface ChoiceRow { readonly craft: string; readonly level: string; readonly currency: string; readonly techniques: readonly string[] }
interface PartRow { readonly seriesId: number; readonly title: string; readonly isPreview: number }
interface Condition { readonly wish: ShopWish; readonly clause: string; readonly values: readonly unknown[] }

const PUBLISHED_PARTS = 'l.series_id = s.id AND l.taken_out_at IS NULL AND l.published_version_id IS NOT NULL';
const MINUTES = `(SELECT CAST(COALESCE(SUM(l.minutes), 0) AS SIGNED) FROM lessons l WHERE ${PUBLISHED_PARTS}) AS minutes`;
const COLUMNS = `s.id, s.slug, s.title, s.summary, s.craft, s.level, s.techniques, s.price_minor AS priceMinor, s.currency, u.name AS teacherName, w.name AS workroomName, w.handle, p.revision, ${MINUTES}`;
const OPEN = `
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

/** Four statements at most while something is found, seven where nothing is. `page` beyond the last gives the last. */
export async function shopSeries(wishes: ShopWishes, page = 1): Promise<ShopPage> {
  const asTyped = await matching(wishes);
  const meant = asTyped.length > 0 || wishes.q === undefined ? null : meantBy(wishes.q, await vocabulary());
  const as = meant === null ? wishes : { ...wishes, q: meant };
  const rows = meant === null ? asTyped : await matching(as);
  const found = await inOrder(rows, as);
  const pages = Math.max(1, Math.ceil(found.length / SHOP_PAGE_LENGTH));
  const at = Math.min(Math.max(1, page), pages);
  return {
    series: await present(found.slice((at - 1) * SHOP_PAGE_LENGTH, at * SHOP_PAGE_LENGTH)),
    total: found.length, page: at, pages, choices: await choices(),
    meant: found.length === 0 ? null : meant,
    giveUp: found.length === 0 ? await worthGivingUp(wishes) : [],
  };
}

/** All open series of one workroom. */
export async function workroomSeries(workroomId: number): Promise<readonly ShopSeries[]> {
  const rows = await sequelize.query<Row>(`SELECT ${COLUMNS}${OPEN} AND s.workroom_id = ?${ORDER} LIMIT 100`, { replacements: [workroomId], type: QueryTypes.SELECT });
  return present(rows);
}

/** One open series. @returns null for a draft or none */
export async function oneSeries(slug: string): Promise<ShopSeries | null> {
  const rows = await sequelize.query<Row>(`SELECT ${COLUMNS}${OPEN} AND s.slug = ?`, { replacements: [slug], type: QueryTypes.SELECT });
  return (await present(rows))[0] ?? null;
}

/** All open series that name one of `techniques`, which are written as their teachers write them; there is at least one. */
export async function seriesTeaching(techniques: readonly string[]): Promise<readonly ShopSeries[]> {
  const anyOf = techniques.map(() => 'JSON_CONTAINS(s.techniques, JSON_QUOTE(?))').join(' OR ');
  const rows = await sequelize.query<Row>(`SELECT ${COLUMNS}${OPEN} AND (${anyOf})${ORDER} LIMIT 100`, { replacements: [...techniques], type: QueryTypes.SELECT });
  return present(rows);
}

async function matching(wishes: ShopWishes): Promise<readonly Row[]> {
  const conditions = conditionsOf(wishes);
  const rows = await sequelize.query<Row>(`SELECT ${COLUMNS}${OPEN}${conditions.map(({ clause }) => ` AND ${clause}`).join('')}${ORDER}`, {
    replacements: conditions.flatMap(({ values }) => values), type: QueryTypes.SELECT,
  });
  const isFit = await fitting(rows, wishes);
  return rows.filter((row) => isFit(row, 'hours') && isFit(row, 'loom'));
}

/** What the database can judge, a clause for each wish. */
function conditionsOf({ q, craft, technique, level, price, free }: ShopWishes): readonly Condition[] {
  const terms = searchTerms(q ?? '');
  return [
    ...(terms.length === 0 ? [] : [{ wish: 'q' as const, clause: `(${terms.map(() => `${HAYSTACK} LIKE ?`).join(' AND ')})`, values: terms.map((term) => `%${term.replace(/[\\%_]/g, '\\$&')}%`) }]),
    ...(craft === undefined ? [] : [{ wish: 'craft' as const, clause: 's.craft = ?', values: [craft] }]),
    ...(technique === undefined ? [] : [{ wish: 'technique' as const, clause: 'JSON_CONTAINS(s.techniques, JSON_QUOTE(?))', values: [technique] }]),
    ...(level === undefined ? [] : [{ wish: 'level' as const, clause: 's.level = ?', values: [level] }]),
    ...(price === undefined ? [] : [{ wish: 'price' as const, clause: `COALESCE(s.price_minor <= ? * ${MINOR_UNITS}, 0)`, values: [Number(price)] }]),
    ...(free === undefined ? [] : [{ wish: 'free' as const, clause: `EXISTS (SELECT 1 FROM lessons l WHERE ${PUBLISHED_PARTS} AND l.is_preview = 1)`, values: [] }]),
  ];
}

type Figured = Pick<Row, 'id' | 'title' | 'revision' | 'craft' | 'minutes'>;
const needsFigures = ({ hours, loom, sort }: ShopWishes): boolean => hours !== undefined || loom !== undefined || sort === 'hours';

/** What only the plan knows: hours, and how wide a loom must be. A wish nobody has is fulfilled. */
async function fitting(rows: readonly Figured[], wishes: ShopWishes): Promise<(row: Figured, wish: 'hours' | 'loom') => boolean> {
  const facts = needsFigures(wishes) ? await pieceFacts(rows) : new Map<number, PieceFacts>();
  return (row, wish) => {
    const figures = facts.get(row.id)?.figures;
    if (wish === 'hours') return wishes.hours === undefined || hoursOf(row, facts) <= Number(wishes.hours);
    if (wishes.loom === undefined) return true;
    const insideMm = figures?.loomInsideMm;
    if (wishes.loom === 'none') return figures === undefined ? row.craft !== 'frame-loom' : insideMm === undefined;
    return insideMm !== undefined && insideMm <= Number(wishes.loom) * 10;
  };
}

const hoursOf = ({ id, minutes }: Figured, facts: ReadonlyMap<number, PieceFacts>): number => facts.get(id)?.figures.hours.likely ?? minutes / 60;

async function inOrder(rows: readonly Row[], { q, sort }: ShopWishes): Promise<readonly Row[]> {
  if (sort === 'title') return rows.toSorted((a, b) => a.title.localeCompare(b.title, 'en'));
  if (sort === 'hours') {
    const facts = await pieceFacts(rows);
    return rows.toSorted((a, b) => hoursOf(a, facts) - hoursOf(b, facts));
  }
  const terms = sort === 'newest' ? [] : searchTerms(q ?? '');
  return terms.length === 0 ? rows : rows.toSorted((a, b) => nearness(terms, b) - nearness(terms, a));
}

async function present(rows: readonly Row[]): Promise<readonly ShopSeries[]> {
  if (rows.length === 0) return [];
  const facts = await pieceFacts(rows);
  const parts = await sequelize.query<PartRow>(
    `SELECT l.series_id AS seriesId, l.title, l.is_preview AS isPreview FROM lessons l JOIN series s ON ${PUBLISHED_PARTS} WHERE s.id IN (:ids) ORDER BY l.position, l.id`,
    { replacements: { ids: rows.map(({ id }) => id) }, type: QueryTypes.SELECT },
  );
  return rows.map(({ id, revision: _revision, ...row }) => {
    const own = parts.filter(({ seriesId }) => seriesId === id);
    const free = own.findIndex(({ isPreview }) => isPreview === 1);
    return { ...row, parts: own.map(({ title }) => title), freePart: free === -1 ? null : free + 1, piece: facts.get(id) ?? null };
  });
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

/** The words a badly typed one may have been meant for. */
async function vocabulary(): Promise<readonly string[]> {
  const rows = await sequelize.query<{ words: string }>(`SELECT CONCAT_WS(' ', s.title, s.summary, s.techniques, u.name, w.name) AS words${OPEN}`, { type: QueryTypes.SELECT });
  return [...rows.map(({ words }) => words), ...CRAFT_NAMES.map((name) => CRAFTS[name].words.search)];
}

/** One statement judges every wish of every open series apart; a wish is worth giving up when all others are fulfilled. */
async function worthGivingUp(wishes: ShopWishes): Promise<ShopPage['giveUp']> {
  const conditions = conditionsOf(wishes);
  const judged = await sequelize.query<Figured & Readonly<Record<string, unknown>>>(
    `SELECT s.id, s.title, s.craft, p.revision, ${MINUTES}${conditions.map(({ wish, clause }) => `, ${clause} AS is_${wish}`).join('')}${OPEN}`,
    { replacements: conditions.flatMap(({ values }) => values), type: QueryTypes.SELECT },
  );
  const isFit = await fitting(judged, wishes);
  const isFulfilled = (row: (typeof judged)[number], wish: ShopWish): boolean => (wish === 'hours' || wish === 'loom' ? isFit(row, wish) : row[`is_${wish}`] === 1);
  const had = wishesIn(wishes);
  return had
    .map((wish) => ({ wish, total: judged.filter((row) => had.every((other) => other === wish || isFulfilled(row, other))).length }))
    .filter(({ total }) => total > 0);
}
