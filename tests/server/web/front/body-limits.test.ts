import { connect } from 'node:net';
import { request, type IncomingMessage } from 'node:http';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { startFront, type RunningFront } from '../../../support/front.ts';

let front: RunningFront;
/** What the site read: a whole body, or the reason why it has none. */
let read: Promise<number | string>;

async function bodyOf(request: IncomingMessage): Promise<number | string> {
  let bytes = 0;
  try {
    for await (const chunk of request) bytes += (chunk as Buffer).length;
    return bytes;
  } catch {
    return 'cut off';
  }
}

beforeEach(async () => {
  read = Promise.resolve('never asked');
  front = await startFront({
    site: (asked, response) => {
      read = bodyOf(asked);
      void read.then((bytes) => {
        response.writeHead(200, { 'Content-Type': 'text/plain' });
        response.end(String(bytes));
      });
    },
  });
});
afterEach(() => front.stop());

const MIB = 1_024 * 1_024;

describe('a body', () => {
  test.each([
    ['/workroom', MIB, 200], ['/workroom', MIB + 1, 413],
    ['/sign-in', 4_096, 200], ['/sign-in', 4_097, 413],
    ['/api/reckon', 65_536, 200], ['/api/reckon', 65_537, 413],
    ['/api/photos', 60 * MIB, 200],
    ['/api/photos/pieces/abc', 30 * MIB, 200], ['/api/photos/pieces/abc', 30 * MIB + 1, 413],
  ])('to %s of %i bytes is answered with %i, whether its length is told or not', async (path, bytes, status) => {
    const body = Buffer.alloc(bytes);
    const told = await front.ask(path, { method: 'POST', body });
    expect(told.status).toBe(status);
    const counted = await front.ask(path, { method: 'POST', body, chunked: true });
    expect(counted.status).toBe(status);
    if (status === 200) expect(counted.text).toBe(String(bytes));
    else expect(JSON.parse(counted.text)).toMatchObject({ status: 413, detail: expect.stringContaining('larger than') as unknown });
  });

  test('of photos beyond what a form may carry is refused with a page for a browser, and in JSON for a program', async () => {
    const refused = async (accept: string): Promise<{ type: string | undefined; text: string }> => new Promise((resolve, reject) => {
      // The browser goes on sending while the answer is on its way, and must get it all the same.
      const asking = request({ port: front.port, host: '127.0.0.1', path: '/api/photos', method: 'POST', headers: { Host: 'loom.example', Accept: accept, 'Content-Type': 'multipart/form-data; boundary=x', 'Content-Length': String(152 * MIB) } }, (answer) => {
        let text = '';
        answer.setEncoding('utf8').on('data', (words: string) => { text += words; }).on('end', () => { resolve({ type: answer.headers['content-type'], text }); });
      });
      asking.once('error', reject);
      for (let sent = 0; sent < 8; sent += 1) asking.write(Buffer.alloc(MIB));
    });
    const page = await refused('text/html,application/xhtml+xml,*/*;q=0.8');
    expect(page.type).toBe('text/html; charset=utf-8');
    expect(page.text).toContain('<p>This is larger than 151 MB, the most that is taken here.</p><p>Go back, choose less');
    const problem = await refused('*/*');
    expect(problem.type).toBe('application/problem+json; charset=utf-8');
    expect(JSON.parse(problem.text)).toMatchObject({ status: 413 });
    expect(await read).toBe('never asked');
  });

  test('over the limit is never taken in part', async () => {
    await front.ask('/sign-in', { method: 'POST', body: Buffer.alloc(10_000), chunked: true });
    expect(await read).toBe('cut off');
  });

  test('whose length says too much is refused before the client sends it', async () => {
    const answer = await new Promise<string>((resolve) => {
      const socket = connect(front.port, '127.0.0.1');
      socket.write('POST /sign-in HTTP/1.1\r\nHost: loom.example\r\nContent-Length: 100000\r\nExpect: 100-continue\r\n\r\n');
      socket.once('data', (words) => {
        socket.destroy();
        resolve(words.toString());
      });
    });
    expect(answer).toMatch(/^HTTP\/1\.1 413 /);
    expect(await read).toBe('never asked');
  });

  test('that may come is asked for, when the client waits for that', async () => {
    const answer = await new Promise<string>((resolve) => {
      let said = '';
      const socket = connect(front.port, '127.0.0.1');
      socket.write('POST /sign-in HTTP/1.1\r\nHost: loom.example\r\nContent-Length: 3\r\nExpect: 100-continue\r\nConnection: close\r\n\r\n');
      socket.on('data', (words) => {
        if (said === '') socket.write('abc');
        said += words.toString();
      });
      socket.once('close', () => { resolve(said); });
    });
    expect(answer).toMatch(/^HTTP\/1\.1 100 Continue\r\n\r\nHTTP\/1\.1 200 OK/);
  });

  test('people get a page that says so, programs a problem document', async () => {
    const forPeople = await front.ask('/sign-in', { method: 'POST', body: Buffer.alloc(10_000), headers: { Accept: 'text/html' } });
    expect(forPeople.headers['content-type']).toBe('text/html; charset=utf-8');
    expect(forPeople.text).toContain('This is larger than 4 KB');
    const forPrograms = await front.ask('/api/reckon', { method: 'POST', body: Buffer.alloc(70_000), headers: { Accept: 'text/html' } });
    expect(forPrograms.headers['content-type']).toBe('application/problem+json; charset=utf-8');
  });
});
