import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { answerAfter, newAnswer, MOST_PINS, type Answer } from '#islands/bench/answer.ts';
import { BENCH_KEYS, benchKeyOf } from '#islands/bench/bench-keys.ts';
import { closer, CLOSEST, kept, moved, onPhoto, scaleOf, stepOnPhoto, turned, WHOLE, type View } from '#islands/bench/view.ts';

const LANDSCAPE = 3 / 2;

describe('looking at a photo', () => {
  test('the whole of it lies as it is pressed', () => {
    expect(onPhoto(WHOLE, LANDSCAPE, { x: 0, y: 0 })).toEqual({ xPermille: 500, yPermille: 500 });
    expect(onPhoto(WHOLE, LANDSCAPE, { x: -0.25, y: 0.5 })).toEqual({ xPermille: 250, yPermille: 1_000 });
  });

  test('turned by a quarter, its upper left corner lies at the upper right', () => {
    const view = turned(WHOLE);
    const scale = scaleOf(view, LANDSCAPE);
    // On its side it is as high as the frame and 2/3 · 2/3 of it wide.
    expect(scale).toBeCloseTo(2 / 3, 12);
    const corner = onPhoto(view, LANDSCAPE, { x: (scale / LANDSCAPE) / 2 - 1e-9, y: -(scale * LANDSCAPE) / 2 + 1e-9 });
    expect([corner?.xPermille, corner?.yPermille].map((permille) => Math.round(permille ?? -1))).toEqual([0, 0]);
    expect(onPhoto(view, LANDSCAPE, { x: -0.4, y: 0 })).toBeNull();
  });

  test('four quarter turns are none', () => {
    expect(turned(turned(turned(turned(WHOLE))))).toEqual(WHOLE);
  });

  test('a step to the right on the screen goes up the photo that lies on its right side', () => {
    expect([0, 1, 2, 3].map((turns) => stepOnPhoto(turns, 1, 0).map((step) => step + 0))).toEqual([[1, 0], [0, -1], [-1, 0], [0, 1]]);
  });

  const aspects = fc.double({ min: 0.3, max: 3, noNaN: true });
  const places = fc.record({ x: fc.double({ min: -0.45, max: 0.45, noNaN: true }), y: fc.double({ min: -0.45, max: 0.45, noNaN: true }) });
  const views = fc.record({ zoom: fc.double({ min: 1, max: CLOSEST, noNaN: true }), turns: fc.integer({ min: 0, max: 3 }), x: fc.double({ min: -4, max: 4, noNaN: true }), y: fc.double({ min: -4, max: 4, noNaN: true }) });

  test('going closer keeps what lies under the hand there, unless the photo would leave its frame', () => {
    fc.assert(fc.property(aspects, places, fc.double({ min: 1, max: 3, noNaN: true }), (aspect, at, factor) => {
      const before = closer(WHOLE, aspect, 2, at);
      const under = onPhoto(before, aspect, at);
      const still = onPhoto(closer(before, aspect, factor, at), aspect, at);
      expect(still?.xPermille).toBeCloseTo(under?.xPermille ?? -1, 6);
      expect(still?.yPermille).toBeCloseTo(under?.yPermille ?? -1, 6);
    }));
  });

  test('the photo never leaves its frame, and never is smaller than whole nor closer than it can be', () => {
    fc.assert(fc.property(views, aspects, fc.double({ min: -2, max: 2, noNaN: true }), fc.double({ min: 0.01, max: 20, noNaN: true }), (view: View, aspect, far, factor) => {
      const after = closer(moved(kept(view, aspect), aspect, far, -far), aspect, factor);
      expect(after.zoom).toBeGreaterThanOrEqual(1);
      expect(after.zoom).toBeLessThanOrEqual(CLOSEST);
      const scale = scaleOf(after, aspect);
      const [wide, high] = after.turns % 2 === 0 ? [scale, scale] : [scale / aspect, scale * aspect];
      expect(Math.abs(after.x)).toBeLessThanOrEqual(Math.max(0, (wide - 1) / 2) + 1e-9);
      expect(Math.abs(after.y)).toBeLessThanOrEqual(Math.max(0, (high - 1) / 2) + 1e-9);
    }));
  });
});

describe('pins and words', () => {
  const after = (...events: Parameters<typeof answerAfter>[1][]): Answer => events.reduce(answerAfter, newAnswer('', []));
  const PUT = { kind: 'put', xPermille: 460, yPermille: 520, by: 'key' } as const;

  test('a pin put by key is in hand itself, one put by mouse asks for its words, one put by finger leaves the photo in sight', () => {
    expect((['key', 'mouse', 'touch'] as const).map((by) => after({ ...PUT, by }).reach)).toEqual(['pin', 'note', null]);
  });

  test('a pin moves by arrows and by dragging, but not off the photo', () => {
    const { notes } = after(PUT, { kind: 'nudge', index: 0, dx: 5, dy: -50 }, { kind: 'nudge', index: 0, dx: 900, dy: 0 });
    expect(notes).toEqual([{ words: '', xPermille: 1_000, yPermille: 470 }]);
    expect(after(PUT, { kind: 'place', index: 0, xPermille: 12.4, yPermille: -3 }).notes[0]).toEqual({ words: '', xPermille: 12, yPermille: 0 });
  });

  test('a phrase goes into the note that is chosen, else into the words to the student', () => {
    const phrase = 'Pluck and listen once more';
    const said = after(PUT, { kind: 'insert', phrase }, { kind: 'choose', index: -1 }, { kind: 'insert', phrase: 'Tension is even' }, { kind: 'insert', phrase });
    expect([said.words, said.notes[0]?.words]).toEqual(['Tension is even. Pluck and listen once more', phrase]);
  });

  test('there are at most twenty pins', () => {
    expect(after(...Array.from({ length: MOST_PINS + 3 }, () => PUT)).notes).toHaveLength(MOST_PINS);
  });

  test('a note taken out chooses none', () => {
    expect(after(PUT, PUT, { kind: 'take-out', index: 0 })).toMatchObject({ chosen: -1, notes: [{ xPermille: 460 }] });
  });
});

describe('keys', () => {
  test('each means one thing, and none is a digit', () => {
    const keys = BENCH_KEYS.map(({ key }) => key);
    expect(new Set(keys).size).toBe(keys.length);
    expect(keys.filter((key) => /[1-9]/.test(key))).toEqual([]);
  });

  test('capitals and the unshifted plus are understood', () => {
    expect(['W', '=', '+', 'x', 'Enter'].map(benchKeyOf)).toEqual(['w', '+', '+', undefined, undefined]);
  });
});
