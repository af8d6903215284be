import { beforeEach, describe, expect, test } from 'vitest';
import { statementListeners } from '#server/db/sequelize.ts';
import { PatternPiece, Series, User, Workroom, WorkroomHelper } from '#server/models/index.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { shopAddress, shopWishesOf, type ShopWishes } from '#contracts/shop.ts';
import { SHOP_PAGE_LENGTH, shopSeries } from '#server/queries/shop/shop-series.ts';
import { teacherPage } from '#server/queries/shop/teacher-page.ts';
import { buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

async function described(series: Series, widthMm = 400): Promise<Series> {
  const { dowel: _dowel, ...pattern } = await lowTide();
  const bands = pattern.bands.map((band) => (band.technique === 'tabby' ? { ...band, shapes: [] } : band));
  await PatternPiece.create({ seriesId: series.id, data: { ...pattern, bands, size: { ...pattern.size, widthMm }, loom: { ...pattern.loom, insideWidthMm: widthMm + 100 } } });
  return series;
}

async function statementsOf(work: () => Promise<unknown>): Promise<number> {
  let count = 0;
  const listener = (): void => { count += 1; };
  statementListeners.add(listener);
  try {
    await work();
  } finally {
    statementListeners.delete(listener);
  }
  return count;
}

const slugs = async (wishes: ShopWishes): Promise<string[]> => (await shopSeries(wishes)).series.map(({ slug }) => slug);

describe('what hangs at the shop front', () => {
  test('the published series, newest first, with teacher, parts and figures; drafts stay away', async () => {
    const old = await described(await buildSeries({ slug: 'old', publishedAt: new Date('2026-10-01T00:00:00Z') }));
    const fresh = await buildSeries({ slug: 'fresh' });
    await buildSeries({ slug: 'draft', state: 'draft' });
    await buildLesson({ seriesId: old.id, title: 'Gather', minutes: 60 });
    await buildLesson({ seriesId: old.id, title: 'Not yet', publishedVersionId: null });
    const shop = await shopSeries({});
    expect(shop.series.map(({ slug }) => slug)).toEqual(['fresh', 'old']);
    expect(shop.series[1]).toMatchObject({ parts: ['Gather'], minutes: 60, piece: { figures: { loomInsideMm: 450 }, cloth: { title: 'Low Tide' } } });
    expect(shop.series[0]?.piece).toBeNull();
    expect(shop).toMatchObject({ total: 2, page: 1, pages: 1, choices: { open: 2, currency: 'EUR' } });
    expect(fresh.state).toBe('published');
  });

  test('a piece that changes is reckoned anew', async () => {
    const series = await described(await buildSeries(), 400);
    expect((await shopSeries({})).series[0]?.piece?.figures.loomInsideMm).toBe(450);
    const piece = await PatternPiece.findByPk(series.id, { rejectOnEmpty: true });
    const data = piece.data as FrameLoomPiece;
    await piece.update({ data: { ...data, size: { ...data.size, widthMm: 300 } }, revision: 1 });
    expect((await shopSeries({})).series[0]?.piece?.figures.loomInsideMm).toBeLessThan(360);
  });

  test('a piece that cannot be woven hangs without a picture, and breaks nothing', async () => {
    const series = await buildSeries();
    const piece = await lowTide();
    await PatternPiece.create({ seriesId: series.id, data: { ...piece, size: { widthMm: -1, heightMm: 0 } } });
    expect((await shopSeries({})).series).toMatchObject([{ piece: null }]);
  });

  test('comes in pages; one beyond the last is the last', async () => {
    for (let count = 0; count <= SHOP_PAGE_LENGTH; count += 1) await buildSeries();
    expect(await shopSeries({}, 2)).toMatchObject({ page: 2, pages: 2, total: SHOP_PAGE_LENGTH + 1 });
    expect((await shopSeries({}, 99)).series).toHaveLength(1);
  });

  test.each([['without a wish', {}], ['with every wish', { q: 'tide', craft: 'frame-loom', technique: 'rya', loom: '60', hours: '40', level: 'beginner', price: '100' }]] as const)('asks the database at most four times %s', async (_words, wishes) => {
    for (let count = 0; count < 6; count += 1) await described(await buildSeries({ techniques: ['rya'] }));
    expect(await statementsOf(() => shopSeries(wishes))).toBeLessThanOrEqual(4);
    expect(await statementsOf(() => shopSeries(wishes))).toBeLessThanOrEqual(3);
  });
});

describe('finding a series', () => {
  beforeEach(async () => {
    const ilse = await buildWorkroom({ ownerId: (await buildUser({ name: 'Ilse Marrow' })).id, name: 'Saltmarsh Loom Room' });
    await described(await buildSeries({ workroomId: ilse.id, slug: 'low-tide', title: 'Low Tide', summary: 'A shore with 100 % wool', techniques: ['tabby', 'soumak'], priceMinor: 6_800, level: 'beginner', publishedAt: new Date('2026-11-03T00:00:00Z') }));
    await described(await buildSeries({ slug: 'first-cloth', title: 'First Cloth', techniques: ['tabby'], priceMinor: 0, level: 'some-practice', publishedAt: new Date('2026-11-02T00:00:00Z') }), 200);
    const first = await Series.findOne({ where: { slug: 'first-cloth' }, rejectOnEmpty: true });
    await buildLesson({ seriesId: first.id, publishedVersionId: null, isPreview: true });
    await buildLesson({ seriesId: first.id });
    await buildLesson({ seriesId: first.id, isPreview: true });
    await buildSeries({ workroomId: (await buildWorkroom({ name: 'Brandl Cordage' })).id, slug: 'cords', title: 'Three Knotted Cords', craft: 'macrame', techniques: ['square knot'], priceMinor: 2_500, currency: 'JPY', level: 'sure-hand', publishedAt: new Date('2026-11-01T00:00:00Z') });
  });

  test.each([
    [{ q: 'TIDE' }, ['low-tide']],
    [{ q: 'ilse soumak' }, ['low-tide']],
    [{ q: 'saltmarsh cords' }, []],
    [{ q: 'macrame' }, ['cords']],
    [{ q: '100 %' }, ['low-tide']],
    [{ q: '%' }, ['low-tide']],
    [{ q: '_' }, []],
    [{ q: 'soumack' }, ['low-tide']],
    [{ q: 'Brandel cordage' }, ['cords']],
    [{ q: 'knots' }, ['cords']],
    [{ q: 'a cloth with the tide' }, []],
    [{ q: 'tide or tabby' }, ['low-tide']],
    [{ q: 'tabby cloth' }, ['first-cloth']],
    [{ free: 'part' }, ['first-cloth']],
    [{ sort: 'title' }, ['first-cloth', 'low-tide', 'cords']],
    [{ sort: 'hours' }, ['cords', 'first-cloth', 'low-tide']],
    [{ loom: '29.5' }, ['first-cloth']],
    [{ q: "'; DROP TABLE series; --" }, []],
    [{ craft: 'macrame' }, ['cords']],
    [{ technique: 'tabby' }, ['low-tide', 'first-cloth']],
    [{ technique: 'tab' }, []],
    [{ level: 'sure-hand' }, ['cords']],
    [{ price: '0' }, ['first-cloth']],
    [{ price: '50' }, ['first-cloth']],
    [{ price: '100' }, ['low-tide', 'first-cloth']],
    [{ loom: 'none' }, ['cords']],
    [{ loom: '30' }, ['first-cloth']],
    [{ loom: '50' }, ['low-tide', 'first-cloth']],
    [{ hours: '5', craft: 'frame-loom' }, []],
    [{ hours: '20', technique: 'soumak' }, ['low-tide']],
    [{ technique: 'tabby', level: 'beginner', loom: '50' }, ['low-tide']],
  ] as const)('%j finds %j', async (wishes, found) => {
    expect(await slugs(wishes)).toEqual(found);
  });

  test('a word typed badly is taken for the one that was meant, and that is said', async () => {
    expect(await shopSeries({ q: 'soumack' })).toMatchObject({ total: 1, meant: 'soumak' });
    expect(await shopSeries({ q: 'soumak' })).toMatchObject({ total: 1, meant: null });
    expect(await shopSeries({ q: 'zeppelin' })).toMatchObject({ total: 0, meant: null });
  });

  test('words of a draft are no words to be meant', async () => {
    await buildSeries({ state: 'draft', title: 'Herringbone', slug: 'secret' });
    expect(await shopSeries({ q: 'heringbone' })).toMatchObject({ total: 0, meant: null, giveUp: [{ wish: 'q', total: 3 }] });
  });

  test('what has the word in its name comes before what only tells of it, unless another order is wished', async () => {
    await buildSeries({ slug: 'of-soumak', title: 'A soumak shore', publishedAt: new Date('2026-10-01T00:00:00Z') });
    expect(await slugs({ q: 'soumak' })).toEqual(['of-soumak', 'low-tide']);
    expect(await slugs({ q: 'soumak', sort: 'newest' })).toEqual(['low-tide', 'of-soumak']);
  });

  test('where nothing is found, it is told which one wish to give up', async () => {
    expect((await shopSeries({ technique: 'soumak', loom: '30', price: '100' })).giveUp).toEqual([{ wish: 'technique', total: 1 }, { wish: 'loom', total: 1 }]);
    expect((await shopSeries({ craft: 'macrame', level: 'beginner', hours: '40' })).giveUp).toEqual([{ wish: 'craft', total: 1 }, { wish: 'level', total: 1 }]);
    expect((await shopSeries({ technique: 'soumak' })).giveUp).toEqual([]);
    expect(await statementsOf(() => shopSeries({ q: 'zeppelin', craft: 'macrame', hours: '5' }))).toBeLessThanOrEqual(7);
  });

  test('the free part is told by the number a visitor meets it under', async () => {
    expect((await shopSeries({})).series.map(({ freePart }) => freePart)).toEqual([null, 2, null]);
  });

  test('what can be chosen is told whatever was wished', async () => {
    expect((await shopSeries({ q: 'nothing like it' })).choices).toEqual({
      open: 3, crafts: ['frame-loom', 'macrame'], techniques: ['soumak', 'square knot', 'tabby'], levels: ['beginner', 'some-practice', 'sure-hand'], currency: null,
    });
  });

  test('nonsense in an address is no wish', () => {
    expect(shopWishesOf(new URLSearchParams('q=&craft=pottery&loom=wide&hours=-1&level=&price=x&free=all&sort=price'))).toEqual({});
    expect(shopWishesOf(new URLSearchParams(`q=${'a'.repeat(300)}&craft=macrame`))).toEqual({ q: 'a'.repeat(80), craft: 'macrame' });
  });

  test('wishes are kept from page to page', () => {
    expect(shopAddress({ q: 'low tide', level: 'beginner' }, 2)).toBe('/series?q=low+tide&level=beginner&page=2');
    expect(shopAddress({})).toBe('/series');
  });
});

describe('a teacher', () => {
  test('is shown with who helps her and what is open in her workroom only', async () => {
    const workroom = await buildWorkroom({ ownerId: (await buildUser({ name: 'Ilse Marrow' })).id, handle: 'saltmarsh', about: 'At the edge of a marsh.' });
    await WorkroomHelper.create({ workroomId: workroom.id, userId: (await buildUser({ name: 'Wren Okafor' })).id });
    await buildSeries({ workroomId: workroom.id, slug: 'hers' });
    await buildSeries({ workroomId: workroom.id, state: 'draft' });
    await buildSeries();
    const page = await teacherPage('saltmarsh');
    expect(page).toMatchObject({ teacherName: 'Ilse Marrow', about: 'At the edge of a marsh.', helpers: ['Wren Okafor'], series: [{ slug: 'hers' }] });
    expect(await statementsOf(() => teacherPage('saltmarsh'))).toBeLessThanOrEqual(4);
  });

  test('nobody teaches under another handle', async () => {
    expect(await teacherPage('nobody')).toBeNull();
    expect([await User.count(), await Workroom.count()]).toEqual([0, 0]);
  });
});
