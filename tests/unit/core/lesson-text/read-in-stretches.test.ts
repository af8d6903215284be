// A text read by stretches, with what was kept of an earlier text, must read exactly as the same text read at once.
import fc from 'fast-check';
import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { cutText, KeptReadings, readInStretches } from '#core/lesson-text/read-in-stretches.ts';
import { readMarkdown } from '#core/lesson-text/read-markdown.ts';

const folder = new URL('../../../../content/series/low-tide/', import.meta.url);
const lessons = readdirSync(folder).filter((name) => name.endsWith('.mdx')).map((name) => readFileSync(new URL(name, folder), 'utf8'));

/** Pieces that open, close or carry on something across empty lines, and some that look as if they did. */
const PIECES = [
  '## Heading', '# One', 'Words.', 'Words *stressed* and **strong**', '- item', '  more of the item', '1. first', '> quote', '>', '```', '~~~', '  ```', '    ```', '- ```', '> ```', '```js',
  '<Step id="a">', '</Step>', '<Tip>', '</Tip>', '<Step id="b">Go.</Step>', '<Step', 'id="c">', '<Step id="', '">', '<Amount of="warp"/>', 'Wind <Amount of="warp"/> ends', '<', '>x', '<3', '\\<Step>', '`<Step>`', '`', '``',
  '{', '}', '{1}', '| a | b |', '| - | - |', '---', '===', '***', '[r]: /a', '[r]', '[a](/b)', '![x](y)', '\\', '  ', '\t', '    four', '&lt;', '~~gone~~', 'import x', '* * *', '+ plus', '2) two', 'Z',
];
const text = fc.array(fc.tuple(fc.constantFrom(...PIECES), fc.constantFrom('\n', '\n\n', '\n\n', '\n\n', '\n\n\n', ' ')), { maxLength: 14 }).map((parts) => parts.map(([piece, gap]) => piece + gap).join(''));

type Read = ReturnType<typeof readMarkdown>;

/** The same tree with the same places; or refused by both. Of several errors the reading by stretches tells one no later in the text. */
function expectSame(byStretches: Read, atOnce: Read): void {
  expect(byStretches.ok).toBe(atOnce.ok);
  if (byStretches.ok && atOnce.ok) expect(JSON.parse(JSON.stringify(byStretches.root.children))).toEqual(JSON.parse(JSON.stringify(atOnce.root.children)));
  if (!byStretches.ok && !atOnce.ok) expect(byStretches.problem.line).toBeLessThanOrEqual(atOnce.problem.line);
}

describe('a text read by stretches', () => {
  test('reads as when read at once, whatever stands in it', () => {
    fc.assert(fc.property(text, (source) => {
      expectSame(readInStretches(source, new KeptReadings()), readMarkdown(source));
    }), { numRuns: 3_000 });
  });

  test('reads so after every edit, with what was kept of the text before', () => {
    const edit = fc.record({ at: fc.double({ min: 0, max: 1, noNaN: true }), out: fc.nat(60), put: text });
    fc.assert(fc.property(fc.constantFrom(...lessons), fc.array(edit, { minLength: 1, maxLength: 5 }), (lesson, edits) => {
      const kept = new KeptReadings();
      let source = lesson;
      parseLessonText(source, kept);
      for (const { at, out, put } of edits) {
        const place = Math.floor(at * source.length);
        source = source.slice(0, place) + put + source.slice(place + out);
        expectSame(readInStretches(source, kept), readMarkdown(source));
      }
    }), { numRuns: 25 });
  });

  test('is cut into stretches that are the text when joined', () => {
    fc.assert(fc.property(text, (source) => { expect(cutText(source).join('')).toBe(source); }));
  });

  test('is cut before headings, paragraphs and tags at the left edge', () => {
    expect(cutText('One.\n\n## Two\n\n<Step id="a">\nGo.\n\nOn.\n</Step>\n\nThree.')).toEqual(['One.\n\n', '## Two\n\n', '<Step id="a">\nGo.\n\nOn.\n</Step>\n\n', 'Three.']);
  });

  test.each([
    ['in a block of code', '```\none\n\n## two\n```\n'], ['within a tag that holds more', '<Step id="a">\n\nWords.\n\n</Step>'], ['where addresses are set apart', 'One [r].\n\nTwo.\n\n[r]: /a'],
    ['before the next item of a list', '- one\n\n- two'],
  ])('is not cut %s', (_where, source) => {
    expect(cutText(source)).toEqual([source]);
  });

  test('leaves a kept reading as it was: the same stretch further down has places of its own', () => {
    const kept = new KeptReadings();
    const before = parseLessonText('One {x}.\n\nTwo.', kept);
    const after = parseLessonText('Zero.\n\nOne {x}.\n\nTwo.', kept);
    expect([before, after].map(({ problems }) => problems.map(({ line }) => line))).toEqual([[1], [3]]);
  });
});
