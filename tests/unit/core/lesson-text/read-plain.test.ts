// The short way must be no second way: what it reads, the Markdown parser reads so, place for place.
import fc from 'fast-check';
import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { cutText } from '#core/lesson-text/read-in-stretches.ts';
import { readMarkdown } from '#core/lesson-text/read-markdown.ts';
import { readPlain } from '#core/lesson-text/read-plain.ts';

const folder = new URL('../../../../content/series/low-tide/', import.meta.url);
const lessons = readdirSync(folder).filter((name) => name.endsWith('.mdx')).map((name) => readFileSync(new URL(name, folder), 'utf8'));

/** Lines that are plain, and such as look so. */
const LINES = [
  'Words.', 'Wind *gently* on.', '**Twice** round, *and* so (*on*).', 'Élan & ease', '66 ends', '1. first', '1) first', 'é*a*', '*a*b', '*a.* b', '*a.*b', '(*a*)', '**a*', '*a**', '*a **b***', '* a', '*a', '***', '*1*',
  '## Heading', '# One', '####### seven', '## Closed ##', '## 4 ends', '##none', '## *Stress*', '##  Wide', '- item', '- **Bold** item', '- [ ] task', '- ', '-', '- - a', '  more', '+ plus', '> quote', '---', '===', '| a |', '| - |', 'a | b', '- | -', '| a | b |', '| *a* | <Amount of="a"/> c |', '| --- | :-: |', '| - | --: |', '| a  | b |', '|a|b|', '| | b |', '| a | b', '| [a](/b) | - |', '| a | b |\n| - | :- |\n| c | d |', '| a |\n|:-|',
  '<Step id="a">', '</Step>', '<Tip>', '</Tip>', '<Step id="b" >', '<Tip title="a" id="b">', '<Figure of="a" caption="It\'s so."/>', '<Amount of="warp"/>', '<Amount of="warp" />', '<Amount of="a"/> ends', 'Wind <Amount of="warp"/>', 'Of <Amount of="a"/>, *so*', '<Step id="a">Go.</Step>',
  '<Step\tid="a">', '<a/>', '<Step id=\'a\'>', '<Step {a}>', '</Tip >', '<></>', '<A.b/>', 'a <b', '[a](/b)', 'See [the rest](https://a.example/b-c#d).', '![x](y)', 'Yes![a](/b)', '[a]', 'A[b](c)d', '[r]: /a', 'Of [r]', '[a](b c)', '`code`', '```', '~~gone~~', '{', 'a\\', 'a  ', 'a ', '\ta', '    a', '&amp;', 'a &lt; b', 'a_b_', '\u00a0a', 'a\u00a0', '', '', ' ',
];
const NEIGHBOURS = ['*', '**', 'a', '1', 'é', ' ', '.', '(', ')', '-', '!', '"', '\u00a0', '€', '[', ']', '](/a)', '<Amount of="a"/>', '&', '#', '🧶', '\n', ':', '\\', '_'];

const ofLines = fc.array(fc.constantFrom(...LINES), { maxLength: 9 }).map((lines) => lines.join('\n'));
const ofNeighbours = fc.array(fc.constantFrom(...NEIGHBOURS), { maxLength: 14 }).map((signs) => `Z ${signs.join('')}`);

/** The blocks of a text by the parser, as plain data. */
function byParser(source: string): unknown {
  const read = readMarkdown(source);
  return read.ok ? JSON.parse(JSON.stringify(read.root.children)) : 'refused';
}

describe('what is read plainly', () => {
  test.each([['lines', ofLines], ['neighbours', ofNeighbours]])('is read the same by the Markdown parser, of any %s', (_name, text) => {
    fc.assert(fc.property(text, (source) => {
      const plain = readPlain(source);
      if (plain !== undefined) expect(JSON.parse(JSON.stringify(plain.children))).toEqual(byParser(source));
    }), { numRuns: 6_000 });
  });

  test('is the same in real lessons, and more than 95 in a hundred characters of them', () => {
    const stretches = lessons.flatMap(cutText);
    const plain = stretches.filter((words) => {
      const tree = readPlain(words);
      if (tree !== undefined) expect(JSON.parse(JSON.stringify(tree.children))).toEqual(byParser(words));
      return tree !== undefined;
    });
    expect(plain.join('').length).toBeGreaterThan(0.95 * stretches.join('').length);
  });

  test.each([
    ['a list whose items stand apart', '- one\n\n- two'], ['a line that goes on with an item', '- one\ntwo'], ['a tag that is not closed', '<Step id="a">\nGo.'], ['tags that cross', '<Step id="a">\n<Tip>\nGo.\n</Step>\n</Tip>'],
    ['a break by two spaces', 'One  \ntwo'], ['stress within a word', 'un*believ*able'], ['braces', 'A {b}'], ['a picture', 'A ![b](c)'], ['an entity', 'A &lt; b'], ['a table', 'A | b\n- | -'], ['a table without its rule', '| a | b |'], ['a table with a rule of another width', '| a | b |\n| - |'], ['a row with more cells than its head', '| a |\n| - |\n| b | c |'],
  ])('does not hold %s', (_what, source) => {
    expect(readPlain(source)).toBeUndefined();
  });
});
