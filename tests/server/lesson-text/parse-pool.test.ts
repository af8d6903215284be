import { afterEach, describe, expect, test } from 'vitest';
import { ParsePool, readLessonText, type ParsePoolOptions } from '#server/lesson-text/parse-pool.ts';
import { threadEntry } from '#server/lesson-text/thread-entry.ts';

const pools: ParsePool[] = [];
const planted = new URL('./planted-thread.mjs', import.meta.url);

function pool(options: ParsePoolOptions = {}): ParsePool {
  const made = new ParsePool({ entry: planted, killAfterMs: 2_000, ...options });
  pools.push(made);
  return made;
}

afterEach(async () => {
  await Promise.all(pools.splice(0).map((each) => each.close()));
});

describe('parsing in threads', { timeout: 30_000 }, () => {
  test('gives what parsing gives', async () => {
    await expect(readLessonText('## Wind\n\nWords.')).resolves.toMatchObject({ ok: true, outline: [{ words: 'Wind' }] });
    await expect(readLessonText('{1+1}')).resolves.toMatchObject({ ok: false, problems: [{ code: 'code' }] });
  });

  test('a text that never ends is stopped and refused, while others are answered', async () => {
    const threads = pool({ killAfterMs: 8_000 });
    const began = performance.now();
    const endless = threads.parse('endless').then((result) => ({ result, afterMs: performance.now() - began }));
    const others = await Promise.all(Array.from({ length: 10 }, (_, n) => threads.parse(`Words ${String(n)}.`).then((result) => ({ result, afterMs: performance.now() - began }))));
    const { result, afterMs } = await endless;
    expect(result).toMatchObject({ ok: false, problems: [{ code: 'too-slow' }] });
    expect(others.every((other) => other.result.ok && other.afterMs < afterMs)).toBe(true);
    await expect(threads.parse('Words.')).resolves.toMatchObject({ ok: true });
  });

  test('when every thread has such a text, the next ones are answered by new threads', async () => {
    const threads = pool();
    const results = await Promise.all(['endless', 'endless', 'Words.', 'More.'].map((source) => threads.parse(source)));
    expect(results.map((result) => result.ok)).toEqual([false, false, true, true]);
  });

  test('a text that eats memory is refused, and the process lives on', async () => {
    const threads = pool({ memoryMb: 64, killAfterMs: 20_000 });
    await expect(threads.parse('greedy')).resolves.toMatchObject({ ok: false, problems: [{ code: 'too-slow' }] });
    await expect(threads.parse('Words.')).resolves.toMatchObject({ ok: true });
  });

  test('a parser that breaks is a mistake of ours and told as such, once', async () => {
    const threads = pool({ threads: 1 });
    await expect(threads.parse('broken')).rejects.toThrow('The parser broke.');
    await expect(threads.parse('Words.')).resolves.toMatchObject({ ok: true });
  });

  test('too many waiting texts are turned away with a word when to come again', async () => {
    const threads = pool({ threads: 1, queue: 3 });
    const taken = ['endless', 'a', 'b'].map((source) => threads.parse(source));
    await expect(threads.parse('c')).rejects.toMatchObject({ code: 'UNAVAILABLE', retryAfterSeconds: 2 });
    expect((await Promise.all(taken)).map((result) => result.ok)).toEqual([false, true, true]);
  });

  test('a thread that does not come up turns its text away instead of keeping it for ever', async () => {
    const missing = pool({ entry: new URL('./no-such-thread.mjs', import.meta.url) });
    const answers = await Promise.allSettled([missing.parse('a'), missing.parse('b')]);
    expect(answers).toMatchObject([{ status: 'rejected', reason: { code: 'UNAVAILABLE' } }, { status: 'rejected', reason: { code: 'UNAVAILABLE' } }]);
  });

  test('after closing, nothing is left hanging', async () => {
    const threads = pool({ killAfterMs: 60_000 });
    const hanging = threads.parse('endless');
    const outcome = expect(hanging).rejects.toMatchObject({ code: 'UNAVAILABLE' });
    await threads.close();
    await outcome;
    await expect(threads.parse('Words.')).rejects.toMatchObject({ code: 'UNAVAILABLE' });
  });

  test('a text of a length no lesson has is refused without a thread', async () => {
    const missing = pool({ entry: new URL('./no-such-thread.mjs', import.meta.url) });
    await expect(missing.parse('a'.repeat(1_000_000))).resolves.toMatchObject({ ok: false, problems: [{ code: 'too-long' }] });
  });
});

describe('the file of the thread', () => {
  test.each([
    ['file:///srv/fellmark/src/server/lesson-text/parse-pool.ts', 'file:///srv/fellmark/src/server/lesson-text/thread-from-source.mjs'],
    ['file:///srv/fellmark/src/server/lesson-text/thread-entry.ts?t=1', 'file:///srv/fellmark/src/server/lesson-text/thread-from-source.mjs'],
    ['file:///srv/fellmark/dist/processes/worker.mjs', 'file:///srv/fellmark/dist/processes/lesson-text-worker.mjs'],
    ['file:///srv/fellmark/dist/server/chunks/parse-pool_x.mjs', 'file:///srv/fellmark/dist/processes/lesson-text-worker.mjs'],
    ['file:///srv/src/server/dist/server/entry.mjs', 'file:///srv/src/server/dist/processes/lesson-text-worker.mjs'],
  ])('is found from %s', (here, entry) => {
    expect(threadEntry(here).href).toBe(entry);
  });
});
