import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { APIContext } from 'astro';
import { onRequest } from '../../../src/middleware.ts';
import { PAGE_OF_HEADER, SAID_ONCE_HEADER, TO_KEEP_HEADER } from '#contracts/kept-pages.ts';
import { beginSession } from '#server/auth/sessions.ts';
import { statementListeners } from '#server/db/sequelize.ts';
import { AppError } from '#server/errors.ts';
import type { User } from '#server/models/index.ts';
import type { FormAnswer } from '#server/web/form.ts';
import { resultOf, sendForm } from '../../support/astro-actions.ts';
import { buildUser, buildWorkroom } from '../../support/factories.ts';

interface Ask {
  readonly route: string;
  readonly path?: string;
  readonly method?: string;
  readonly headers?: Record<string, string>;
  readonly cookies?: Record<string, string>;
  /** What the form's action answers. */
  readonly form?: () => Promise<unknown>;
  /** What the page does when it is drawn. */
  readonly page?: () => Response;
}

const SAME = { 'sec-fetch-site': 'same-origin' };

/** One request through the middleware, as Astro would send it. */
async function ask({ route, path = route, method = 'GET', headers = {}, cookies = {}, form, page = () => new Response('the page') }: Ask) {
  const jar = new Map(Object.entries(cookies));
  const url = new URL(path, 'http://127.0.0.1:4321');
  const drawn = vi.fn(async () => page());
  const rewritten = vi.fn(async (request: Request) => new Response(`refused at ${new URL(request.url).pathname}`));
  const context = {
    isPrerendered: false,
    request: new Request(url, { method, headers: { ...(method === 'GET' ? {} : SAME), ...headers } }),
    url,
    routePattern: route,
    clientAddress: '192.0.2.1',
    locals: {} as App.Locals,
    cookies: {
      get: (name: string) => (jar.has(name) ? { value: jar.get(name) } : undefined),
      set: (name: string, value: string) => { jar.set(name, value); },
      delete: (name: string) => { jar.delete(name); },
    },
    redirect: (to: string, status: number) => new Response(null, { status, headers: { location: to } }),
    rewrite: rewritten,
  };
  if (form !== undefined) sendForm(context, { action: { calledFrom: 'form', name: 'people.signIn', handler: form } });
  const response = await onRequest(context as unknown as APIContext, drawn);
  if (!(response instanceof Response)) throw new Error('no response');
  return { response, context, drawn, rewritten, jar, text: await response.text() };
}

const answered = (data: FormAnswer) => async (): Promise<unknown> => ({ data, error: undefined });
const failedBefore = (code: string) => async (): Promise<unknown> => ({ data: undefined, error: { code } });

async function cookiesOf(user: User): Promise<Record<string, string>> {
  return { s: (await beginSession(user.id, 'student', '', new Date())).token };
}

const logged = vi.spyOn(console, 'error');
beforeEach(() => { logged.mockReset(); });
afterEach(() => { statementListeners.clear(); });

describe('a request', () => {
  test('of a visitor to an open page is let in as nobody', async () => {
    const { text, context } = await ask({ route: '/sign-in' });
    expect(text).toBe('the page');
    expect(context.locals).toMatchObject({ person: null, ctx: { actor: null, ip: '192.0.2.1' } });
  });

  test('with the cookie of a session is her own', async () => {
    const maud = await buildUser({ name: 'Maud Ellery', scheme: 'dark' });
    const { context } = await ask({ route: '/account', cookies: await cookiesOf(maud) });
    expect(context.locals.ctx.actor).toMatchObject({ userId: maud.id });
    expect(context.locals.person).toMatchObject({ name: 'Maud Ellery', scheme: 'dark', roles: ['student'] });
  });

  test('with a made-up cookie is a visitor’s', async () => {
    expect((await ask({ route: '/sign-in', cookies: { s: 'A'.repeat(43) } })).context.locals.ctx.actor).toBeNull();
  });

  test('of a visitor to a page of signed-in people leads to the door and back', async () => {
    const { response, drawn } = await ask({ route: '/account', path: '/account?tab=1&x=2' });
    expect([response.status, response.headers.get('location')]).toEqual([303, '/sign-in?to=%2Faccount%3Ftab%3D1%26x%3D2']);
    expect(drawn).not.toHaveBeenCalled();
  });

  test('of a visitor with a form leads back to the form’s page, not to its act', async () => {
    const { response } = await ask({ route: '/account', path: '/account?_action=people.updateAccount', method: 'POST', form: answered({ ok: true, to: '/x' }) });
    expect(response.headers.get('location')).toBe('/sign-in?to=%2Faccount');
  });

  test('of a student to a workroom is refused, in words', async () => {
    const { response, context } = await ask({ route: '/workroom/bench', cookies: await cookiesOf(await buildUser()) });
    expect(response.status).toBe(403);
    expect(context.locals.refusal?.says).toBe('This page belongs to another workroom.');
  });

  test('to a route in no table, and to the office by anybody but the steward, finds nothing', async () => {
    const student = await cookiesOf(await buildUser());
    for (const given of [{ route: '/no-such-route' }, { route: '/office', cookies: student }]) {
      const { response, drawn, text } = await ask(given);
      expect([response.status, text]).toEqual([404, '']);
      expect(drawn).not.toHaveBeenCalled();
    }
    expect((await ask({ route: '/office', cookies: await cookiesOf(await buildUser({ isSteward: true })) })).response.status).toBe(200);
  });

  test('asks who it is once, and a machine’s not at all', async () => {
    const teacher = await buildUser();
    await buildWorkroom({ ownerId: teacher.id });
    const cookies = await cookiesOf(teacher);
    const statements: string[] = [];
    statementListeners.add((sql) => { statements.push(sql); });
    await ask({ route: '/api/payments/events', method: 'POST', headers: { 'sec-fetch-site': 'cross-site' }, cookies });
    expect(statements).toEqual([]);
    await ask({ route: '/account', cookies });
    expect(statements.filter((sql) => sql.includes('SELECT'))).toHaveLength(1);
  });
});

describe('something that changes things', () => {
  test.each(['cross-site', 'same-site'])('from a page that is %s is refused before it is looked at', async (site) => {
    const form = vi.fn(answered({ ok: true, to: '/x' }));
    const { response, drawn, context } = await ask({ route: '/sign-in', method: 'POST', headers: { 'sec-fetch-site': site }, form });
    expect(response.status).toBe(403);
    expect(form).not.toHaveBeenCalled();
    expect(drawn).not.toHaveBeenCalled();
    expect(context.locals.refusal?.says).toMatch(/another site/);
  });

  test('from nowhere at all is refused; with a program’s own proof at a machine’s route it is let in', async () => {
    expect((await ask({ route: '/sign-out', method: 'POST', headers: { 'sec-fetch-site': 'none', origin: 'null' } })).response.status).toBe(200);
    const bare = { 'sec-fetch-site': '' };
    expect((await ask({ route: '/sign-out', method: 'POST', headers: bare })).response.status).toBe(403);
    expect((await ask({ route: '/api/payments/events', method: 'POST', headers: bare })).response.status).toBe(200);
  });

  test.each(['same-origin', 'none', 'same-site', 'cross-site'])('at the link of a letter is let in from %s, as a mail program posts there from nowhere', async (site) => {
    const maud = await cookiesOf(await buildUser());
    const { response, context } = await ask({ route: '/leave/[key]', path: '/leave/x', method: 'POST', headers: { 'sec-fetch-site': site, origin: 'null' }, cookies: maud });
    expect([response.status, context.locals.ctx.actor]).toEqual([200, null]);
  });

  test('at an address of the API is refused as a problem document', async () => {
    const { response, text } = await ask({ route: '/api/ticks', method: 'POST' });
    expect([response.status, response.headers.get('content-type')]).toEqual([401, 'application/problem+json; charset=utf-8']);
    expect(JSON.parse(text)).toMatchObject({ code: 'UNAUTHENTICATED', status: 401 });
  });
});

describe('a form', () => {
  const sendTo = (form: Ask['form'], more: Partial<Ask> = {}) => ask({ route: '/sign-in', path: '/sign-in?_action=people.signIn', method: 'POST', ...(form && { form }), ...more });

  test('that went through leads on, and what was done is said once, on the next page', async () => {
    const { response, jar, drawn } = await sendTo(answered({ ok: true, to: '/loom', said: 'Saved.' }));
    expect([response.status, response.headers.get('location')]).toEqual([303, '/loom']);
    expect(drawn).not.toHaveBeenCalled();
    const next = await ask({ route: '/sign-in', cookies: Object.fromEntries(jar) });
    expect(next.context.locals.said).toBe('Saved.');
    expect((await ask({ route: '/sign-in', cookies: Object.fromEntries(next.jar) })).context.locals.said).toBeNull();
  });

  test.each([
    [422, {}],
    [429, { retryAfterSeconds: 8 }],
    [409, {}],
  ])('that did not go through is drawn again with its status %i and what was typed', async (status, more) => {
    const answer: FormAnswer = { ok: false, status, summary: 'Not yet.', fields: {}, values: { email: 'maud@' }, ...more };
    const { response, text, context } = await sendTo(answered(answer));
    expect([response.status, text]).toEqual([status, 'the page']);
    expect(response.headers.get('retry-after')).toBe(status === 429 ? '8' : null);
    expect(resultOf(context)).toMatchObject({ name: 'people.signIn', result: { data: answer } });
  });

  test('that needs the password once more leads to where it is typed, and back', async () => {
    const { response } = await sendTo(answered({ ok: 'refused', code: 'PROOF_NEEDED', says: '' }), { path: '/office/people/x?_action=office.letIn' });
    expect(response.headers.get('location')).toBe('/prove?to=%2Foffice%2Fpeople%2Fx');
  });

  test('about something that is not hers finds nothing', async () => {
    expect((await sendTo(answered({ ok: 'refused', code: 'NOT_FOUND', says: '' }))).response.status).toBe(404);
    expect((await sendTo(answered({ ok: 'refused', code: 'FORBIDDEN', says: '' }))).response.status).toBe(403);
  });

  test.each([['NOT_FOUND', 404], ['UNSUPPORTED_MEDIA_TYPE', 415], ['CONTENT_TOO_LARGE', 413]])('that Astro refuses as %s is answered %i, and nothing is logged', async (code, status) => {
    expect((await sendTo(failedBefore(code))).response.status).toBe(status);
    expect(logged).not.toHaveBeenCalled();
  });

  test('that breaks is answered 500 and logged once, with the request’s code and without what was typed', async () => {
    logged.mockImplementation(() => undefined);
    const { response, context, text } = await sendTo(async () => { throw new TypeError('cannot read the hidden thing'); });
    expect(response.status).toBe(500);
    expect(text).not.toContain('hidden');
    expect(logged).toHaveBeenCalledTimes(1);
    expect(String(logged.mock.calls[0]?.[0])).toContain(context.locals.refusal?.requestId);
  });
});

describe('a page', () => {
  const html = (): Response => new Response('the page', { headers: { 'content-type': 'text/html' } });

  test('says whose it is, so that a device keeps it for nobody else, and whether its words are said once', async () => {
    const maud = await buildUser();
    const cookies = await cookiesOf(maud);
    expect((await ask({ route: '/sign-in', page: html })).response.headers.get(PAGE_OF_HEADER)).toBe('nobody');
    const own = await ask({ route: '/loom', page: html, cookies });
    expect([own.response.headers.get(PAGE_OF_HEADER), own.response.headers.has(SAID_ONCE_HEADER)]).toEqual([maud.publicId, false]);
    expect((await ask({ route: '/loom', page: html, cookies: { ...cookies, said: 'Saved.' } })).response.headers.has(SAID_ONCE_HEADER)).toBe(true);
  });

  test('that is only kept leaves what is said once to the next one that is read', async () => {
    const { jar, context } = await ask({ route: '/loom', page: html, cookies: { said: 'Saved.' }, headers: { [TO_KEEP_HEADER]: 'yes' } });
    expect([context.locals.said, jar.get('said')]).toEqual([null, 'Saved.']);
  });

  test('that breaks tells a code to find it by, and no more', async () => {
    logged.mockImplementation(() => undefined);
    const { response, context, text } = await ask({ route: '/sign-in', page: () => { throw new Error('secret of the house'); } });
    expect([response.status, text]).toEqual([500, 'refused at /refused']);
    expect(context.locals.refusal).toMatchObject({ status: 500, again: '/sign-in', requestId: expect.stringMatching(/^[0-9a-f-]{36}$/) });
    expect(context.locals.refusal?.says).not.toContain('secret');
  });

  test('that must wait says so, and that of a refusal is let through without asking again', async () => {
    const { response, context } = await ask({ route: '/sign-in', page: () => { throw new AppError('UNAVAILABLE', { retryAfterSeconds: 5 }); } });
    expect([response.status, response.headers.get('retry-after')]).toEqual([503, '5']);
    expect(logged).not.toHaveBeenCalled();
    const again = await onRequest({ ...context, routePattern: '/refused' } as unknown as APIContext, async () => new Response('why'));
    expect(again instanceof Response && (await again.text())).toBe('why');
  });

  test('of a signed-in person is kept by no cache; another one is asked for anew', async () => {
    const mine = await ask({ route: '/account', cookies: await cookiesOf(await buildUser()) });
    expect(mine.response.headers.get('cache-control')).toBe('private, no-store');
    expect((await ask({ route: '/sign-in' })).response.headers.get('cache-control')).toBe('private, no-cache');
    const own = await ask({ route: '/sign-in', page: () => new Response('x', { headers: { 'cache-control': 'public, max-age=60' } }) });
    expect(own.response.headers.get('cache-control')).toBe('public, max-age=60');
  });
});
