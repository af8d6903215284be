// A teacher's text is never run as code. These words are the only doors through which text becomes code in
// JavaScript; our own source must not hold one of them.
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

const source = new URL('../../../../src/', import.meta.url);
const files = readdirSync(source, { recursive: true, encoding: 'utf8' }).filter((name) => /\.(?:ts|tsx|mjs|js|astro)$/.test(name));

const contentOf = (name: string): string => readFileSync(new URL(name, source), 'utf8');

const DOORS: [string, RegExp][] = [
  ['the MDX compiler', /@mdx-js\/(?:mdx|react)/],
  ['eval', /\beval\s*[(`]|\beval:\s*true/],
  ['new Function', /\bnew\s+Function\b|\bFunction\s*\(/],
  ['node:vm', /['"](?:node:)?vm['"]/],
  ['raw HTML from Markdown', /rehype-raw/],
];

describe('our source', () => {
  test('has files to look at', () => {
    expect(files.length).toBeGreaterThan(10);
  });

  test.each(DOORS)('holds no %s', (_what, door) => {
    expect(files.filter((name) => door.test(contentOf(name)))).toEqual([]);
  });

  test('draws nothing of a lesson from a string of HTML but the figures, which are our own drawings', () => {
    const drawing = files.filter((name) => /^(?:components|islands)\/lesson\//.test(name));
    const fromStrings = drawing.filter((name) => /set:html|dangerouslySetInnerHTML|innerHTML|is:raw/.test(contentOf(name)));
    expect(fromStrings.filter((name) => name !== 'components/lesson/Figure.astro')).toEqual([]);
  });
});
