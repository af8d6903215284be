import { afterEach, describe, expect, test } from 'vitest';
import { SECURITY_HEADERS } from '#server/web/front/security-headers.ts';
import { PUBLIC_HOST, startFront, type RunningFront, type Site } from '../../../support/front.ts';

let front: RunningFront | undefined;
afterEach(async () => { await front?.stop(); });

const page: Site = (_request, response) => {
  response.writeHead(200, { 'Content-Type': 'text/html' });
  response.end('<p>Warp</p>');
};

/** Answers with what the site was told, as JSON. */
const echo: Site = (request, response) => {
  response.writeHead(200, { 'Content-Type': 'application/json' });
  response.end(JSON.stringify({ url: request.url, headers: request.headers }));
};

describe('every answer carries the headers that protect people', () => {
  const site: Site = (request, response) => {
    if (request.url === '/broken') response.writeHead(500).end();
    else if (request.url === '/missing') response.writeHead(404, { 'Content-Type': 'text/html' }).end('<p>nothing</p>');
    else if (request.url === '/same') response.writeHead(304).end();
    else if (request.url === '/elsewhere') response.writeHead(303, { Location: '/' }).end();
    else page(request, response);
  };
  test.each([
    ['/', 200, {}], ['/broken', 500, {}], ['/missing', 404, {}], ['/same', 304, {}], ['/elsewhere', 303, {}],
    ['//twice', 308, {}], ['/%zz', 400, {}], ['/_astro/a.js', 200, {}], ['/healthz', 200, {}],
    ['/', 421, { headers: { Host: 'evil.example' } }],
    ['/', 405, { method: 'TRACE' }],
    ['/', 413, { method: 'POST', headers: { 'Content-Length': 9_999_999 } }],
  ] as const)('%s answered with %i', async (target, status, question) => {
    front = await startFront({ site, files: { '_astro/a.js': 'let a' } });
    const answer = await front.ask(target, question);
    expect(answer.status).toBe(status);
    for (const [name, value] of Object.entries(SECURITY_HEADERS)) expect(answer.headers[name.toLowerCase()]).toBe(value);
    expect(answer.headers['content-security-policy']).toContain("frame-ancestors 'none'");
  });

  test('a page says its alphabet, and its own policy is left alone', async () => {
    front = await startFront({
      site: (_request, response) => { response.writeHead(200, { 'Content-Type': 'text/html', 'Content-Security-Policy': "default-src 'self'" }).end('<p>Warp</p>'); },
    });
    const { headers } = await front.ask('/');
    expect(headers['content-type']).toBe('text/html; charset=utf-8');
    expect(headers['content-security-policy']).toBe("default-src 'self'");
  });
});

describe('the site is told only what can be relied on', () => {
  const told = async (headers: Record<string, string>, trustedProxies: readonly string[] = []): Promise<Record<string, string>> => {
    front = await startFront({ site: echo, settings: { trustedProxies } });
    const answer = await front.ask('/', { headers });
    return (JSON.parse(answer.text) as { headers: Record<string, string> }).headers;
  };

  test('a client cannot choose its address, host or scheme', async () => {
    const headers = await told({ 'X-Forwarded-For': '6.6.6.6', 'X-Forwarded-Host': 'evil.example', 'X-Forwarded-Proto': 'ftp', 'X-Forwarded-Port': '99', 'X-Real-IP': '6.6.6.6', Forwarded: 'for=6.6.6.6' });
    expect(headers).toMatchObject({ 'x-forwarded-for': '127.0.0.1', 'x-forwarded-proto': 'https' });
    expect(Object.keys(headers)).not.toContain('x-forwarded-host');
    expect(Object.keys(headers)).not.toContain('x-forwarded-port');
    expect(Object.keys(headers)).not.toContain('x-real-ip');
    expect(Object.keys(headers)).not.toContain('forwarded');
  });

  test('behind our proxy the nearest address that is not ours counts', async () => {
    const headers = await told({ 'X-Forwarded-For': '6.6.6.6, 203.0.113.9, 10.1.2.3' }, ['127.0.0.1', '10.0.0.0/8']);
    expect(headers['x-forwarded-for']).toBe('203.0.113.9');
  });

  test.each([
    [PUBLIC_HOST, 200], [`${PUBLIC_HOST}:443`, 200], ['LOOM.example', 200],
    ['localhost', 421], ['127.0.0.1', 421], ['evil.example', 421], [`${PUBLIC_HOST}.evil.example`, 421], [`${PUBLIC_HOST}:8080`, 421], ['', 421],
  ])('asked as "%s" it answers %i', async (host, status) => {
    front = await startFront({ site: page });
    expect((await front.ask('/', { headers: { Host: host } })).status).toBe(status);
  });

  test('in the demo this machine\'s own names work too', async () => {
    front = await startFront({ site: page, settings: { loopback: true } });
    for (const host of ['localhost:4321', '127.0.0.1', '[::1]:4321']) expect((await front.ask('/', { headers: { Host: host } })).status).toBe(200);
    expect((await front.ask('/', { headers: { Host: 'localhost.evil.example' } })).status).toBe(421);
  });
});

describe('a way round a guard is no way', () => {
  test.each(['//workroom', '/\\workroom', '///workroom', '/%77orkroom', '/x/../workroom', '/%5cworkroom'])('%s is sent to /workroom', async (target) => {
    front = await startFront({ site: page });
    const answer = await front.ask(target);
    expect(answer.status).toBe(308);
    expect(answer.headers.location).toBe('/workroom');
  });
});

describe('health', () => {
  test('is told under any name; readiness with its reasons', async () => {
    const faults = new Map([['database', 'does not answer']]);
    front = await startFront({
      site: page,
      settings: { readiness: [{ name: 'database', fault: () => Promise.resolve(faults.get('database')) }, { name: 'disk', fault: () => Promise.reject(new Error('secret')) }] },
    });
    expect(await front.ask('/healthz', { headers: { Host: '10.0.0.7' } })).toMatchObject({ status: 200 });
    const notReady = await front.ask('/readyz');
    expect(notReady.status).toBe(503);
    expect(notReady.text).toBe('database does not answer\ndisk does not answer\n');
    expect(notReady.text).not.toContain('secret');
  });

  test('a check that takes too long counts as failed', async () => {
    front = await startFront({ site: page, settings: { readiness: [{ name: 'database', fault: () => new Promise(() => undefined) }] } });
    expect((await front.ask('/readyz')).text).toBe('database answers too slowly\n');
  });

  test('a stopping process is alive but not ready', async () => {
    front = await startFront({ site: page, settings: { isStopping: () => true } });
    expect((await front.ask('/healthz')).status).toBe(200);
    expect((await front.ask('/readyz')).status).toBe(503);
  });
});
