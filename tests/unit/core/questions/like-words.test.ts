import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { enoughShared, stemsIn, stemsShared } from '#core/questions/like-words.ts';

describe('what is asked in like words', () => {
  test.each([
    ['How do I keep my selvedges straight?', ['selvedg', 'straight']],
    ['Warping: the warped ends, the warp', ['warp', 'end']],
    ['I do not know what to do', []],
    ['12 nails, 8/2 wool', ['nail', 'wool']],
    ['Überzüge aus Wolle', ['überzüg', 'aus', 'woll']],
    ['', []],
  ])('is told by the stems of its words: %s', (text, stems) => {
    expect(stemsIn(text)).toEqual(stems);
  });

  test('is found however the word ends, and not by a word that only holds it', () => {
    const stems = stemsIn('My edges are pulling in');
    expect(stemsShared(stems, 'Why does the edge pull in so far?')).toBe(2);
    expect(stemsShared(stems, 'A wedge, repulled')).toBe(0);
  });

  test('asks for every word of a short text, and for two in five of a long one', () => {
    expect([1, 2, 3, 5, 6, 12].map(enoughShared)).toEqual([1, 2, 2, 2, 3, 5]);
  });

  test('whatever is typed gives at most twelve plain words, none with a sign of the search’s own', () => {
    fc.assert(fc.property(fc.string({ unit: 'grapheme', maxLength: 300 }), (text) => {
      const stems = stemsIn(text);
      expect(stems.length).toBeLessThanOrEqual(12);
      for (const stem of stems) expect(stem).toMatch(/^[\p{L}\p{N}]{3,40}$/u);
    }));
  });
});
