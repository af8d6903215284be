import { request } from 'node:http';
import { brotliDecompressSync, gunzipSync } from 'node:zlib';
import { afterEach, describe, expect, test } from 'vitest';
import { acceptedCoding, varyByEncoding } from '#server/web/front/accepted-encoding.ts';
import { startFront, type RunningFront, type Site } from '../../../support/front.ts';

let front: RunningFront | undefined;
afterEach(async () => { await front?.stop(); });

const TEXT = '<p>Weave one row, then another.</p>'.repeat(400);
const page = (headers: Record<string, string> = {}): Site => (_request, response) => {
  response.writeHead(200, { 'Content-Type': 'text/html', ...headers });
  for (let at = 0; at < TEXT.length; at += 500) response.write(TEXT.slice(at, at + 500));
  response.end();
};

describe('a page made on the way', () => {
  test.each([['br', brotliDecompressSync], ['gzip', gunzipSync]] as const)('arrives compressed by %s and whole', async (coding, unpack) => {
    front = await startFront({ site: page({ ETag: '"v1"', Vary: 'Cookie' }) });
    const { headers, bytes } = await front.ask('/', { headers: { 'Accept-Encoding': coding } });
    expect(headers['content-encoding']).toBe(coding);
    expect(headers.vary).toBe('Cookie, Accept-Encoding');
    expect(headers.etag).toBe('W/"v1"');
    expect(unpack(bytes).toString()).toBe(TEXT);
    expect(bytes.length).toBeLessThan(TEXT.length / 10);
  });

  test('arrives plain where nothing else is understood, and says that it varies', async () => {
    front = await startFront({ site: page() });
    const { headers, text } = await front.ask('/');
    expect([headers['content-encoding'], headers.vary, text]).toEqual([undefined, 'Accept-Encoding', TEXT]);
  });

  test('shows what it has while the rest is still being made', async () => {
    let finish = (): void => undefined;
    front = await startFront({
      site: (_request, response) => {
        response.writeHead(200, { 'Content-Type': 'text/html' });
        response.write('<p>first</p>');
        finish = () => { response.end('<p>last</p>'); };
      },
    });
    const { port } = front;
    const first = await new Promise<Buffer>((resolve, reject) => {
      request({ port, path: '/', headers: { Host: 'loom.example', 'Accept-Encoding': 'gzip' } }, (response) => {
        response.once('data', (chunk: Buffer) => { resolve(chunk); });
        response.once('error', reject);
        response.resume();
      }).end();
    });
    expect(first.length).toBeGreaterThan(0);
    finish();
  });

  test.each([
    ['a picture', { 'Content-Type': 'image/jpeg' }],
    ['a video', { 'Content-Type': 'video/mp4' }],
    ['what is compressed already', { 'Content-Encoding': 'gzip' }],
    ['what must not be touched', { 'Cache-Control': 'no-transform' }],
  ])('%s is left as it is', async (_what, headers) => {
    front = await startFront({ site: page(headers) });
    expect((await front.ask('/', { headers: { 'Accept-Encoding': 'br' } })).text).toBe(TEXT);
  });

  test('a small answer is not worth it', async () => {
    front = await startFront({ site: (_request, response) => { response.writeHead(200, { 'Content-Type': 'application/json', 'Content-Length': 2 }).end('{}'); } });
    const { headers, text } = await front.ask('/', { headers: { 'Accept-Encoding': 'br' } });
    expect([headers['content-encoding'], headers['content-length'], text]).toEqual([undefined, '2', '{}']);
  });
});

describe('which coding is chosen', () => {
  test.each([
    ['gzip, deflate, br, zstd', 'br'], ['gzip', 'gzip'], ['br;q=0.5, gzip', 'gzip'], ['*', 'br'], ['*;q=0', undefined],
    ['br;q=0, *', 'gzip'], ['identity', undefined], ['', undefined], [undefined, undefined], ['GZIP', 'gzip'], ['br;q=nonsense', undefined],
  ])('for "%s" it is %s', (header, coding) => {
    expect(acceptedCoding(header)).toBe(coding);
  });

  test('Vary keeps what it says and says it once', () => {
    expect(varyByEncoding(undefined)).toBe('Accept-Encoding');
    expect(varyByEncoding('Cookie, accept-encoding')).toBe('Cookie, accept-encoding');
    expect(varyByEncoding('*')).toBe('*');
  });
});

describe('the build\'s files', () => {
  test('are kept for ever when their name holds a hash, and come as they were compressed', async () => {
    front = await startFront({ site: page(), files: { '_astro/a.css': 'body{}', '_astro/a.css.br': 'BR', '_astro/a.css.gz': 'GZ', 'favicon.svg': '<svg/>', '404.html': 'x', 'about/index.html': '<p>about</p>' } });
    const br = await front.ask('/_astro/a.css', { headers: { 'Accept-Encoding': 'br, gzip' } });
    expect([br.text, br.headers['content-encoding'], br.headers['content-type'], br.headers.vary, br.headers['cache-control']])
      .toEqual(['BR', 'br', 'text/css; charset=utf-8', 'Accept-Encoding', 'public, max-age=31536000, immutable']);
    expect((await front.ask('/_astro/a.css', { headers: { 'Accept-Encoding': 'gzip' } })).text).toBe('GZ');
    expect((await front.ask('/_astro/a.css')).text).toBe('body{}');
    expect((await front.ask('/favicon.svg')).headers['cache-control']).toBe('public, max-age=3600');
    expect((await front.ask('/about')).text).toBe('<p>about</p>');
  });

  test('of the service worker is asked for anew each time, and reaches nothing but the house', async () => {
    front = await startFront({ site: page(), files: { 'service-worker.js': '// Build 1' } });
    const { headers } = await front.ask('/service-worker.js');
    expect([headers['cache-control'], headers['content-security-policy'], headers['content-type']]).toEqual(['no-cache', "default-src 'none'; connect-src 'self'", 'text/javascript; charset=utf-8']);
  });

  test('are nothing else: twins, error pages and ways out of the folder go to the site', async () => {
    front = await startFront({ site: (_request, response) => { response.writeHead(404).end('site'); }, files: { 'a.css': 'body{}', 'a.css.br': 'BR', '404.html': 'x' } });
    for (const target of ['/a.css.br', '/404.html', '/..%2Fuploads']) expect((await front.ask(target)).status).toBe(404);
  });

  test('are not posted to', async () => {
    front = await startFront({ site: (_request, response) => { response.writeHead(405).end(); }, files: { 'a.css': 'body{}' } });
    expect((await front.ask('/a.css', { method: 'POST' })).status).toBe(405);
  });
});
