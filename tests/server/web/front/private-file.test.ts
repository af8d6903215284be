import { statSync, utimesSync } from 'node:fs';
import { connect } from 'node:net';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { startFront, type RunningFront } from '../../../support/front.ts';

const BYTES = Buffer.from(Array.from({ length: 1_000 }, (_, at) => at % 251));
const KEY = 'photos/ab/0123.jpg';

let front: RunningFront;
/** What the endpoint answers with: its key and its status. */
let answerWith: { key: string; status: number; type: string };

beforeEach(async () => {
  answerWith = { key: KEY, status: 200, type: 'image/jpeg' };
  front = await startFront({
    uploads: { [KEY]: BYTES, '.secret': 'hidden', 'photos/.secret': 'hidden' },
    site: (_request, response) => {
      response.writeHead(answerWith.status, { 'X-Fellmark-Send': answerWith.key, 'Content-Type': answerWith.type, 'Cache-Control': 'private, max-age=3600', Vary: 'Cookie' });
      response.end();
    },
  });
});
afterEach(() => front.stop());

describe('a file of a person', () => {
  test('comes whole, with the endpoint\'s headers and in a sandbox', async () => {
    const { status, headers, bytes } = await front.ask('/media/x');
    expect(status).toBe(200);
    expect(bytes.equals(BYTES)).toBe(true);
    expect(headers).toMatchObject({ 'content-type': 'image/jpeg', 'cache-control': 'private, max-age=3600', 'content-length': '1000', 'accept-ranges': 'bytes', vary: 'Cookie' });
    expect(headers['content-security-policy']).toBe("sandbox; default-src 'none'");
    expect(headers['x-fellmark-send']).toBeUndefined();
    expect(headers['content-encoding']).toBeUndefined();
  });

  test('that is text, such as captions, comes as it lies on the disk to a browser that would take it compressed', async () => {
    answerWith.type = 'text/vtt; charset=utf-8';
    const { headers, bytes } = await front.ask('/media/x', { headers: { 'Accept-Encoding': 'gzip, br' } });
    expect([headers['content-encoding'], headers['content-length'], bytes.equals(BYTES)]).toEqual([undefined, '1000', true]);
  });

  test('is only described when only its head is asked for', async () => {
    const { status, headers, bytes } = await front.ask('/media/x', { method: 'HEAD' });
    expect([status, headers['content-length'], bytes.length]).toEqual([200, '1000', 0]);
  });

  // RFC 9110 sections 14.1.2, 14.2, 14.4, 15.3.7 and 15.5.17.
  test.each([
    ['bytes=0-', 206, 0, 999], ['bytes=0-0', 206, 0, 0], ['bytes=100-199', 206, 100, 199], ['bytes=999-', 206, 999, 999],
    ['bytes=-1', 206, 999, 999], ['bytes=-200', 206, 800, 999], ['bytes=-5000', 206, 0, 999], ['bytes=500-5000', 206, 500, 999],
    ['BYTES=1-2', 206, 1, 2], ['bytes=5-4', 200, 0, 999], ['bytes=a-b', 200, 0, 999], ['bytes=', 200, 0, 999], ['items=0-1', 200, 0, 999],
    ['bytes=0-1,5-6', 200, 0, 999],
  ])('asked for %s it answers %i with bytes %i to %i', async (range, status, first, last) => {
    const answer = await front.ask('/media/x', { headers: { Range: range } });
    expect(answer.status).toBe(status);
    expect(answer.bytes.equals(BYTES.subarray(first, last + 1))).toBe(true);
    expect(answer.headers['content-range']).toBe(status === 206 ? `bytes ${first}-${last}/1000` : undefined);
  });

  test.each(['bytes=1000-', 'bytes=5000-6000', 'bytes=-0'])('a part beyond its end (%s) is refused with its length', async (range) => {
    const { status, headers } = await front.ask('/media/x', { headers: { Range: range } });
    expect([status, headers['content-range']]).toEqual([416, 'bytes */1000']);
    expect(headers['content-type']).toBe('application/problem+json; charset=utf-8');
  });

  test('is not sent again to who has it', async () => {
    const { headers: { etag } } = await front.ask('/media/x');
    expect(etag).toMatch(/^"[^"]+"$/);
    const again = await front.ask('/media/x', { headers: { 'If-None-Match': String(etag) } });
    expect([again.status, again.bytes.length, again.headers['content-length']]).toEqual([304, 0, undefined]);
    expect(again.headers['cache-control']).toBe('private, max-age=3600');
  });

  test('a part is sent only while the file is the one the client has begun', async () => {
    const { headers: { etag } } = await front.ask('/media/x');
    const ask = (tag: string): Promise<{ status: number }> => front.ask('/media/x', { headers: { Range: 'bytes=0-9', 'If-Range': tag } });
    expect((await ask(String(etag))).status).toBe(206);
    expect((await ask('"another"')).status).toBe(200);
    // A weak tag may not vouch for bytes (RFC 9110 section 13.1.5).
    expect((await ask(`W/${String(etag)}`)).status).toBe(200);
  });

  test('has another tag when it changes', async () => {
    const before = (await front.ask('/media/x')).headers.etag;
    const file = path.join(front.folder, 'uploads', KEY);
    utimesSync(file, statSync(file).atime, new Date('2020-01-01T00:00:00Z'));
    expect((await front.ask('/media/x')).headers.etag).not.toBe(before);
  });

  test.each(['photos/none.jpg', 'photos', '../client/x', '/etc/passwd', 'photos/../.secret', '.secret', 'photos/.secret', 'photos\\ab', '', 'photos/%2e%2e/x', 'a\u0001b'.replace('\u0001', ' ')])(
    'a key that names no file of ours ("%s") finds nothing', async (key) => {
      answerWith = { ...answerWith, key };
      const { status, headers, text } = await front.ask('/media/x');
      expect(status).toBe(404);
      expect(headers['x-fellmark-send']).toBeUndefined();
      expect(text).not.toContain('hidden');
    });

  test('a refusal is never turned into the file, nor is its key told', async () => {
    answerWith = { ...answerWith, status: 403 };
    const { status, headers, bytes } = await front.ask('/media/x');
    expect([status, bytes.length, headers['x-fellmark-send']]).toEqual([403, 0, undefined]);
  });
});

test('a client that goes away in the middle is let go', async () => {
  await front.stop();
  let closed = false;
  front = await startFront({
    uploads: { 'videos/long.mp4': Buffer.alloc(64 * 1_024 * 1_024) },
    site: (_request, response) => {
      response.once('close', () => { closed = true; });
      response.writeHead(200, { 'X-Fellmark-Send': 'videos/long.mp4', 'Content-Type': 'video/mp4' });
      response.end();
    },
  });
  const before = process.memoryUsage().rss;
  const socket = connect(front.port, '127.0.0.1');
  socket.write('GET /media/x HTTP/1.1\r\nHost: loom.example\r\n\r\n');
  await new Promise((resolve) => { socket.once('data', resolve); });
  socket.pause();
  await new Promise((resolve) => { setTimeout(resolve, 300); });
  // Nobody reads, so nothing is piled up on this side.
  expect(process.memoryUsage().rss - before).toBeLessThan(40 * 1_024 * 1_024);
  expect(closed).toBe(false);
  socket.destroy();
  await expect.poll(() => closed).toBe(true);
});
