import type { APIContext } from 'astro';
import { describe, expect, test } from 'vitest';
import { CRAFTS } from '#core/craft/crafts.ts';
import { ALL, POST } from '#pages/api/reckon.ts';
import { RATE_RULES } from '#server/web/rate-limit.ts';
import { contextOf } from '../../support/context.ts';

const ask = async (body: string, ip = '192.0.2.7'): Promise<Response> => {
  const ctx = { ...contextOf(null), ip };
  const context = { request: new Request('http://localhost/api/reckon', { method: 'POST', body }), locals: { ctx } };
  return POST(context as unknown as APIContext);
};
const askFor = (question: unknown): Promise<Response> => ask(JSON.stringify(question));

describe('POST /api/reckon', () => {
  test('answers with unrounded numbers that nobody keeps', async () => {
    const response = await askFor({ what: 'yarn', yarn: { count: { text: '8/2', system: 'ne-cotton' } } });
    expect(response.status).toBe(200);
    expect(response.headers.get('content-type')).toBe('application/json; charset=utf-8');
    expect(response.headers.get('cache-control')).toBe('no-store');
    expect(await response.json()).toMatchObject({ yardsPerPound: 3360, plies: 2, warnings: [] });
  });

  test('answers 422 with a code, a pointer and a sentence for each refused value', async () => {
    const response = await askFor({ what: 'soumak', over: 4, back: 4, spacingMm: -1, diameterSumMm: '4', ends: 62, colour: 'red' });
    expect(response.status).toBe(422);
    expect(response.headers.get('content-type')).toBe('application/problem+json; charset=utf-8');
    const { problems } = (await response.json()) as { problems: { code: string; path: string; message: string }[] };
    expect(problems.map(({ code, path }) => `${code} ${path}`)).toEqual(['E_RANGE /back', 'E_RANGE /spacingMm', 'E_NUM /diameterSumMm', 'E_ENUM /colour']);
    expect(problems.every(({ message }) => message.length > 10)).toBe(true);
  });

  test('hands out no plan of knotting without its cautions', async () => {
    const response = await askFor({ what: 'piece', piece: CRAFTS.macrame.example });
    expect(await response.json()).toMatchObject({ craft: 'macrame', cautions: CRAFTS.macrame.cautions });
  });

  test('points into the piece that was sent', async () => {
    const response = await askFor({ what: 'piece', piece: { craft: 'sculpture' } });
    expect(await response.json()).toMatchObject({ problems: [{ code: 'E_ENUM', path: '/piece/craft' }] });
  });

  test.each(['', '{', 'undefined', '{"what":NaN}', '['.repeat(30_000)])('answers 400 for what is no JSON: %.12s', async (body) => {
    expect((await ask(body)).status).toBe(400);
  });

  test.each(['null', '[]', '7', '"yarn"', `${'['.repeat(30_000)}${']'.repeat(30_000)}`, '{"what":"prices"}'])('answers 422 for what is no question: %.12s', async (body) => {
    expect((await ask(body)).status).toBe(422);
  });

  test('answers 413 beyond 64 KiB, counted in bytes', async () => {
    expect((await ask(JSON.stringify('ü'.repeat(32_767)))).status).toBe(422);
    expect((await ask(JSON.stringify('ü'.repeat(32_768)))).status).toBe(413);
  });

  test('answers other verbs 405 and names the one that works', async () => {
    const response = await ALL({} as unknown as APIContext);
    expect(response.status).toBe(405);
    expect(response.headers.get('allow')).toBe('POST');
  });

  test('asks one network to wait once it asked too often, and no other', async () => {
    const question = JSON.stringify({ what: 'length-text', mm: 25.4, system: 'imperial', round: 'nearest' });
    for (let use = 0; use < RATE_RULES.reckon.limit; use += 1) expect((await ask(question, '198.51.100.1')).status).toBe(200);
    const refused = await ask(question, '198.51.100.2');
    expect(refused.status).toBe(429);
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
    expect((await ask(question, '203.0.113.1')).status).toBe(200);
  });
});
