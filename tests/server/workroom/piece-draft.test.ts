import type { APIContext } from 'astro';
import { beforeEach, describe, expect, test } from 'vitest';
import { textsOfTyped, type FormTexts } from '#core/craft/piece-form/field-names.ts';
import { emptyForm, typePiece } from '#core/craft/piece-form/type-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { PatternPiece, PieceDraft, User, type Series } from '#server/models/index.ts';
import { patternPiece } from '#server/queries/workroom/pattern-piece.ts';
import { exchangePieceDraft } from '#server/use-cases/workroom/exchange-piece-draft.ts';
import { savePieceDraft } from '#server/use-cases/workroom/save-piece-draft.ts';
import { savePiece } from '#server/use-cases/workroom/save-piece.ts';
import { RATE_RULES } from '#server/web/rate-limit.ts';
import { POST as keep } from '../../../src/pages/api/workroom/piece-draft.ts';
import { actorOf, contextFor, type TestContext } from '../../support/context.ts';
import { buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

let teacher: User;
let series: Series;
let ctx: TestContext;
const EMPTY = textsOfTyped(emptyForm('cm'));
const wide = (widthCm: string): FormTexts => ({ ...EMPTY, 'size.widthMm': widthCm });

beforeEach(async () => {
  teacher = await buildUser({ name: 'Ilse Marrow', timeZone: 'Europe/Berlin' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
  ctx = await contextFor(teacher);
});

const draft = (texts: FormTexts, revision: number, over = false) => savePieceDraft(ctx, { series: series.slug, revision, texts, over });
const desk = async () => patternPiece(await actorOf(teacher), series.slug);

describe('the form of a piece being described', () => {
  test('is kept though it cannot be woven yet, and students’ piece stays', async () => {
    const piece = await lowTide();
    await savePiece(ctx, { series: series.slug, revision: 0, piece });
    expect((await draft(wide('12 1/'), 1)).revision).toBe(2);
    expect(await desk()).toMatchObject({ revision: 2, piece, draft: { texts: { 'size.widthMm': '12 1/' } } });
  });

  test('ends with the piece being saved', async () => {
    await draft(wide('41'), 0);
    await savePiece(ctx, { series: series.slug, revision: 1, piece: await lowTide() });
    expect(await desk()).toMatchObject({ revision: 2, draft: null, asideAt: null });
  });

  test('of a second window is refused, and set aside all the same', async () => {
    await draft(wide('41'), 0);
    await expect(draft(wide('52'), 0)).rejects.toMatchObject({ code: 'CONFLICT' });
    expect(await PieceDraft.findByPk(series.id)).toMatchObject({ revision: 1, texts: { 'size.widthMm': '41' }, setAside: { texts: { 'size.widthMm': '52' } } });
  });

  test('put over the other window’s sets that one aside', async () => {
    await draft(wide('41'), 0);
    await draft(wide('52'), 1, true);
    expect(await PieceDraft.findByPk(series.id)).toMatchObject({ revision: 2, texts: { 'size.widthMm': '52' }, setAside: { texts: { 'size.widthMm': '41' } } });
  });

  test('comes second to a piece that was saved meanwhile; saved over it, that piece is set aside', async () => {
    const piece = await lowTide();
    await savePiece(ctx, { series: series.slug, revision: 0, piece });
    await expect(draft(wide('52'), 0)).rejects.toMatchObject({ code: 'CONFLICT' });
    await savePiece(ctx, { series: series.slug, revision: 1, piece: { ...piece, seed: 99 }, over: true });
    expect((await PieceDraft.findByPk(series.id))?.setAside?.texts).toEqual(textsOfTyped(typePiece(piece, 'cm')));
  });

  test('that says the same in both windows is no quarrel', async () => {
    await draft(wide('41'), 0);
    expect((await draft(wide('41'), 0)).revision).toBe(1);
  });

  test('goes back to the saved piece and forth to what was set aside', async () => {
    await savePiece(ctx, { series: series.slug, revision: 0, piece: await lowTide() });
    await draft(wide('41'), 1);
    await exchangePieceDraft(ctx, { series: series.slug, revision: 2, texts: wide('42'), to: 'as-saved' });
    expect(await desk()).toMatchObject({ revision: 3, draft: null, asideAt: expect.any(Date) });
    await exchangePieceDraft(ctx, { series: series.slug, revision: 3, texts: wide('7'), to: 'set-aside' });
    expect(await PieceDraft.findByPk(series.id)).toMatchObject({ texts: { 'size.widthMm': '42' }, setAside: { texts: { 'size.widthMm': '7' } } });
    await expect(exchangePieceDraft(ctx, { series: series.slug, revision: 3, texts: EMPTY, to: 'as-saved' })).rejects.toMatchObject({ code: 'CONFLICT' });
  });

  test('holds nothing that the form does not ask', async () => {
    await draft({ ...wide('41'), 'loom.paint': 'blue', 'bands.999.technique': 'tabby' }, 0);
    expect(Object.keys((await PieceDraft.findByPk(series.id))?.texts ?? {}).filter((name) => /paint|999/.test(name))).toEqual([]);
  });
});

describe('keeping it from the page', () => {
  async function send(body: unknown, as = ctx): Promise<{ status: number; told: unknown }> {
    const request = new Request('http://127.0.0.1/api/workroom/piece-draft', { method: 'POST', body: JSON.stringify(body) });
    const answer = await keep({ request, locals: { ctx: as } } as unknown as APIContext);
    return { status: answer.status, told: await answer.json() };
  }
  const body = (texts: FormTexts) => ({ series: series.slug, revision: 0, texts });

  test('answers with the time on the teacher’s own clock', async () => {
    expect(await send(body(wide('41')))).toEqual({ status: 200, told: { revision: 1, savedAt: '11:00' } });
  });

  test('a second window gets the other’s texts, with the time they were written', async () => {
    await send(body(wide('41')));
    expect(await send(body(wide('52')))).toMatchObject({ status: 409, told: { behind: { revision: 1, texts: { 'size.widthMm': '41' }, by: null, at: '11:00' } } });
  });

  test.each([['no texts', {}], ['texts that are none', { revision: 0, texts: { a: 7 } }], ['a revision below nothing', { revision: -1, texts: EMPTY }], ['a field without end', { revision: 0, texts: { 'size.widthMm': 'x'.repeat(6_001) } }]])('%s is refused in words', async (_words, sent) => {
    expect(await send({ ...sent, series: series.slug })).toMatchObject({ status: 422, told: { title: expect.stringMatching(/\w/) } });
  });

  test('the richest piece fits', async () => {
    const piece = (await lowTide()) as FrameLoomPiece;
    const rich = textsOfTyped(typePiece({ ...piece, bands: Array.from({ length: 199 }, (_, at) => piece.bands[at % piece.bands.length] ?? piece.bands[0]).filter((band) => band !== undefined) }, 'cm'));
    expect((await send(body(rich))).status).toBe(200);
  });

  test('another teacher’s series is not there', async () => {
    const other = await contextFor(await User.findByPk((await buildWorkroom()).ownerId, { rejectOnEmpty: true }));
    expect((await send(body(EMPTY), other)).status).toBe(404);
    expect(await PatternPiece.count()).toBe(0);
  });

  test('is kept so often and no more', async () => {
    for (let count = 0; count < RATE_RULES.pieceDraft.limit; count += 1) await send({});
    expect((await send(body(EMPTY))).status).toBe(429);
  });
});
