import { createServer, request } from 'node:http';
import { afterEach, describe, expect, test } from 'vitest';
import { chain } from '#server/web/front/handler.ts';
import { gracefulStop } from '#server/web/front/graceful-stop.ts';
import { createMetrics } from '#server/web/front/metrics.ts';
import { turnAwayOverload } from '#server/web/front/overload.ts';

const ending: (() => void)[] = [];
afterEach(() => { for (const end of ending.splice(0)) end(); });

async function listen(listener: Parameters<typeof createServer>[1]): Promise<{ server: ReturnType<typeof createServer>; url: string }> {
  const server = createServer(listener);
  await new Promise<void>((resolve) => { server.listen(0, '127.0.0.1', resolve); });
  ending.push(() => { server.closeAllConnections(); server.close(); });
  const address = server.address();
  return { server, url: `http://127.0.0.1:${typeof address === 'object' && address !== null ? address.port : 0}` };
}

describe('stopping', () => {
  test('goes on serving for a while, then takes nothing new and lets what has begun finish', async () => {
    const waiting: (() => void)[] = [];
    const { server, url } = await listen((_request, response) => { waiting.push(() => { response.end('woven'); }); });
    const ask = async (): Promise<string> => (await fetch(url)).text();
    const begun = ask();
    await expect.poll(() => waiting.length).toBe(1);
    const { stop, isStopping } = gracefulStop([server], { drainMs: 300, finishMs: 5_000 });
    expect(isStopping()).toBe(false);
    const stopped = stop();
    expect(isStopping()).toBe(true);
    const whileDraining = ask();
    await expect.poll(() => waiting.length).toBe(2);
    await expect.poll(() => server.listening).toBe(false);
    await expect(ask()).rejects.toThrow();
    for (const finish of waiting) finish();
    await expect(Promise.all([begun, whileDraining])).resolves.toEqual(['woven', 'woven']);
    await stopped;
  });

  test('cuts off what does not finish in time', async () => {
    const { server, url } = await listen(() => undefined);
    const never = fetch(url).catch(() => 'cut');
    await expect.poll(() => new Promise((resolve) => { server.getConnections((_error, count) => { resolve(count); }); })).toBe(1);
    await gracefulStop([server], { drainMs: 0, finishMs: 50 }).stop();
    await expect(never).resolves.toBe('cut');
  });

  test('a connection kept open without a request does not hold it up', async () => {
    const { server, url } = await listen((_request, response) => { response.end('x'); });
    await new Promise<void>((resolve) => {
      request(url, { headers: { Connection: 'keep-alive' } }, (response) => { response.resume().once('end', resolve); }).end();
    });
    const start = performance.now();
    await gracefulStop([server], { drainMs: 0, finishMs: 10_000 }).stop();
    expect(performance.now() - start).toBeLessThan(2_000);
  });
});

describe('too much at once', () => {
  test('what comes over the limit is told to come again, and gets in once there is room', async () => {
    const waiting: (() => void)[] = [];
    const front = turnAwayOverload({ maxInFlight: 2, answerWithinMs: 10_000 });
    const { url } = await listen((asked, response) => { front(asked, response, () => { waiting.push(() => { response.end('done'); }); }); });
    const first = [fetch(url), fetch(url)];
    await expect.poll(() => waiting.length).toBe(2);
    const third = await fetch(url);
    expect([third.status, third.headers.get('retry-after')]).toEqual([503, '5']);
    for (const finish of waiting.splice(0)) finish();
    await Promise.all(first.map(async (answer) => (await answer).text()));
    const fourth = fetch(url);
    await expect.poll(() => waiting.length).toBe(1);
    waiting[0]?.();
    expect((await fourth).status).toBe(200);
  });

  test('an answer that does not come in time is a refusal, and what comes later changes nothing', async () => {
    let late = (): void => undefined;
    const front = turnAwayOverload({ maxInFlight: 2, answerWithinMs: 50 });
    const { url } = await listen((asked, response) => { front(asked, response, () => { late = () => { response.writeHead(200, { 'X-Late': 'yes' }); response.end('late'); }; }); });
    const answer = await fetch(url);
    expect(answer.status).toBe(503);
    expect(late).not.toThrow();
    expect(answer.headers.has('x-late')).toBe(false);
  });
});

test('metrics count requests by kind, method and status, never by address', async () => {
  const metrics = createMetrics();
  const front = chain([metrics.count]);
  const { url } = await listen((asked, response) => { front(asked, response, () => { response.writeHead(asked.url === '/api/x' ? 422 : 200).end(); }); });
  await Promise.all(['/series/low-tide', '/series/another', '/api/x', '/media/abc/x.jpg'].map((path) => fetch(url + path)));
  await expect.poll(() => metrics.text()).toContain('fellmark_http_request_duration_seconds_count{kind="page",method="GET",status="200"} 2');
  const text = metrics.text();
  expect(text).toContain('fellmark_http_request_duration_seconds_count{kind="api",method="GET",status="422"} 1');
  expect(text).toContain('fellmark_http_request_duration_seconds_bucket{kind="media",method="GET",status="200",le="+Inf"} 1');
  expect(text).toContain('fellmark_http_requests_in_flight 0');
  expect(text).not.toContain('low-tide');
});
