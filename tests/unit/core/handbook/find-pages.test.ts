import { describe, expect, it } from 'vitest';
import { findPages, indexPages, type FoundPage } from '#core/handbook/find-pages.ts';
import { nearestWord, slipsBetween } from '#core/handbook/nearest-word.ts';
import { headingId, sectionsOf } from '#core/handbook/page-text.ts';
import { wordsAlike } from '#core/handbook/words-alike.ts';

const page = (id: string, title: string, summary: string, body: string) => ({ id, title, summary, sections: sectionsOf(body) });

const INDEX = indexPages([
  page('soumak', 'Soumak', 'A weft that is wrapped.', 'It makes ridges.\n\n## The cord\n\nSeveral strands together. The fork must not strike it.'),
  page('tabby', 'Tabby', 'Over one, under one.', 'Plain.\n\n## Butterflies and tails\n\nA butterfly holds 8 m. See [Soumak](/handbook/soumak).\n\n## A float\n\nAn end was missed.'),
  page('macrame', 'Basic knots of macramé', 'Lark’s head and square knot.', '## Square knot\n\nFour ends, two of them still.\n\n<Figure of="square-knot" caption="Two halves round two fillers."/>'),
]);
const ids = (found: readonly FoundPage[]): string[] => found.map(({ id, part }) => (part === undefined ? id : `${id}#${part.id}`));
const find = (text: string): string[] => ids(findPages(INDEX, text).found);

describe('a handbook page taken apart', () => {
  it('has a section for each heading, with the words that are read there', () => {
    expect(sectionsOf('Before.\n\n## One *thing*\n\n1. First [link](/x#y).\n- Second\n\n| a | b |\n| --- | --- |\n| c | d |\n\n### Two\n\n<Figure of="tabby" caption="Seen from above."/>\n<Reckoned of="wraps"/>')).toEqual([
      { id: undefined, heading: '', words: 'Before.' },
      { id: 'one-thing', heading: 'One thing', words: 'First link. Second a, b. c, d.' },
      { id: 'two', heading: 'Two', words: 'Seen from above.' },
    ]);
  });

  it('has headings whose addresses are small letters and hyphens', () => {
    expect(headingId('Lark’s head: putting cords on the rod')).toBe('larks-head-putting-cords-on-the-rod');
    expect(headingId('The card, and the row')).toBe('the-card-and-the-row');
  });
});

describe('searching the handbook', () => {
  it('puts the page that is called so before the one that only mentions it', () => {
    expect(find('soumak')[0]).toBe('soumak');
    expect(find('soumak')).toHaveLength(2);
  });

  it('leads to the section that says it, by its heading or its words', () => {
    expect(find('butterfly')).toEqual(['tabby#butterflies-and-tails']);
    expect(find('floats')).toEqual(['tabby#a-float']);
    expect(find('fillers')).toEqual(['macrame#square-knot']);
  });

  it('wants every word that is asked for, whatever stands between them', () => {
    expect(find('how many strands in the cord')).toEqual(['soumak#the-cord']);
    expect(find('cord and butterfly')).toEqual([]);
  });

  it('finds a word without its accents and endings, and a word that means the same', () => {
    expect(find('Macrame')).toEqual(['macrame']);
    expect(find('square knots')).toEqual(['macrame']);
    expect(find('plain weaving woof')).toEqual([]);
    expect(find('plain')[0]).toBe('tabby');
    expect(find('rope')).toContain('soumak#the-cord');
  });

  it('says which word it took for another, and finds by that', () => {
    const slip = findPages(INDEX, 'soumack');
    expect(slip.readAs).toEqual([{ typed: 'soumack', as: 'soumak' }]);
    expect(ids(slip.found)[0]).toBe('soumak');
    expect(findPages(INDEX, 'soumak').readAs).toEqual([]);
  });

  it('offers the closest pages where none has every word, and none where nothing is near', () => {
    const some = findPages(INDEX, 'soumak zeppelin');
    expect(some.found).toEqual([]);
    expect(ids(some.closest)).toContain('soumak');
    expect(findPages(INDEX, 'zeppelin')).toMatchObject({ found: [], closest: [], empty: false });
  });

  it('looks for nothing where only small words were typed, and bears whatever is typed', () => {
    expect(findPages(INDEX, 'how do I')).toMatchObject({ found: [], closest: [], empty: true });
    expect(findPages(INDEX, '')).toMatchObject({ empty: true });
    for (const text of ['((((', '%_\\', '<script>', '\u0000', 'x'.repeat(5000), '🧶 🧶']) expect(findPages(INDEX, text).readAs).toBeDefined();
  });

  it('shows the sentence that holds the words, and marks them in it', () => {
    const [hit] = findPages(INDEX, 'fork').found;
    expect(hit?.excerpt).toEqual([{ words: 'The ', asked: false }, { words: 'fork', asked: true }, { words: ' must not strike it.', asked: false }]);
  });
});

describe('the nearest word', () => {
  it('forgives one slip in a short word and two in a long one', () => {
    const known = ['soumak', 'selvedge', 'tabby', 'rya'];
    expect(nearestWord('selvige', known)).toBe('selvedge');
    expect(nearestWord('taby', known)).toBe('tabby');
    expect(nearestWord('tbaby', known)).toBe('tabby');
    expect(nearestWord('ryo', known)).toBeUndefined();
    expect(nearestWord('zeppelin', known)).toBeUndefined();
  });

  it('counts letters put in, left out, changed and swapped', () => {
    expect([slipsBetween('weft', 'weft'), slipsBetween('weft', 'wefts'), slipsBetween('weft', 'waft'), slipsBetween('weft', 'wetf'), slipsBetween('', 'abc')]).toEqual([0, 1, 1, 1, 3]);
  });
});

it('words alike lead to each other', () => {
  expect(wordsAlike('repair')).toContain('mend');
  expect(wordsAlike('mend')).toContain('repair');
  expect(wordsAlike('zeppelin')).toEqual([]);
});
