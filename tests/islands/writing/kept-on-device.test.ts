import { afterEach, describe, expect, it, vi } from 'vitest';
import { readCopy, writeCopy } from '#islands/keeping/device-copy.ts';
import { statusWords } from '#islands/keeping/keeping.ts';
import { beginEditing, editingAfter } from '#islands/writing/editing.ts';
import { anchorAt } from '#islands/writing/preview-anchor.ts';
import { putIn } from '#islands/writing/put-in.ts';
import { Reader } from '#islands/writing/reader.ts';

afterEach(() => { localStorage.clear(); vi.unstubAllGlobals(); });

describe('what could not be sent', () => {
  it('is found again after a reload, and is gone once it was kept', () => {
    writeCopy('part', { revision: 4, source: 'Wind it.' });
    expect(readCopy('part')).toEqual({ revision: 4, source: 'Wind it.' });
    writeCopy('part', null);
    expect(readCopy('part')).toBeNull();
  });

  it.each(['{', '"words"', '{"revision":"4","source":"x"}', 'null'])('is nothing where the browser holds %s', (held) => {
    localStorage.setItem('fellmark-draft-part', held);
    expect(readCopy('part')).toBeNull();
  });

  it('says so where the browser keeps nothing', () => {
    vi.stubGlobal('localStorage', { setItem: () => { throw new Error('full'); }, clear: () => undefined });
    expect(writeCopy('part', { revision: 1, source: 'x' })).toBe(false);
  });

  it('goes on from the text it was written over, so that another window’s is noticed', () => {
    const state = editingAfter(beginEditing(9, { problems: [], warnings: [] }), { kind: 'brought-back', revision: 7 });
    expect([state.revision, statusWords(state)]).toEqual([7, 'Not saved yet.']);
  });
});

describe('the preview stands where one writes', () => {
  const text = '## One\n\nWords.\n\n<Step id="wind">Wind.</Step>\n\n## One\n\nMore.';
  it.each([['Words', 'h-one'], ['Wind', 'step-wind'], ['More', 'h-one-2'], ['## One', 'h-one']])('at %s', (words, anchor) => {
    expect(anchorAt(text, text.indexOf(words))).toBe(anchor);
  });
  it('or nowhere above the first heading', () => { expect(anchorAt('Words.', 3)).toBeNull(); });
});

describe('a picture that was put in', () => {
  it('says what it shows, quotes and all', () => {
    expect(putIn('', { from: 0, to: 0 }, { kind: 'picture', name: 'ridge', alt: 'The “first” ridge, 2" high & wide' }).text).toBe('<Picture name="ridge" alt="The “first” ridge, 2&quot; high &amp; wide"/>');
    expect(putIn('', { from: 0, to: 0 }, { kind: 'picture', name: 'ridge', alt: '' }).text).toBe('<Picture name="ridge" alt=""/>');
  });
});

describe('a reader', () => {
  /** Stands for the worker: answers when told to. */
  class SlowWorker {
    static made: SlowWorker[] = [];
    onmessage: ((event: { data: unknown }) => void) | null = null;
    asked: string[] = [];
    stopped = false;
    constructor() { SlowWorker.made.push(this); }
    postMessage(source: string) { this.asked.push(source); }
    terminate() { this.stopped = true; }
    answer() { this.onmessage?.({ data: { problems: [], warnings: [] } }); }
  }

  it('reads only the newest of what waits, and drops answers that came too late', async () => {
    SlowWorker.made = [];
    vi.stubGlobal('Worker', SlowWorker);
    const reader = new Reader();
    const [first, second, third] = [reader.read('a'), reader.read('ab'), reader.read('abc')];
    const [worker] = SlowWorker.made;
    worker?.answer();
    worker?.answer();
    expect(await Promise.all([first, second, third])).toEqual([null, null, { problems: [], warnings: [] }]);
    expect(worker?.asked).toEqual(['a', 'abc']);
  });

  it('that is closed answers nobody and stops its worker', async () => {
    SlowWorker.made = [];
    vi.stubGlobal('Worker', SlowWorker);
    const reader = new Reader();
    const asked = reader.read('a');
    reader.close();
    expect([await asked, SlowWorker.made[0]?.stopped]).toEqual([null, true]);
  });
});
